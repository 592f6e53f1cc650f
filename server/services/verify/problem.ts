/** One thing that is not as the leaves say. `where` names table, row and column as a person would look them up. */
export interface Problem { part: 'triggers' | 'chain' | 'body' | 'facts' | 'standing' | 'search', where: string, says: string }

/** Collects problems up to a limit: a file that is wrong everywhere need not be described everywhere. */
export class Problems {
  readonly list: Problem[] = []
  count = 0
  constructor(private readonly limit = 50) {}

  add(part: Problem['part'], where: string, says: string): void {
    this.count++
    if (this.list.length < this.limit) this.list.push({ part, where, says })
  }
}
