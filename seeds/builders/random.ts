/**
 * A small generator of our own choosing, so that a seed gives the same firm on every machine and Node: sfc32 (Chris Doty-Humphrey's PractRand;
 * public domain), started from the text by FNV-1a. Never for keys or sessions.
 */
export class Dice {
  private state: [number, number, number, number]

  constructor(seed: string) {
    let hash = 0x811c9dc5
    for (const character of seed) hash = Math.imul(hash ^ (character.codePointAt(0) ?? 0), 0x01000193)
    this.state = [hash | 0, 0x9e3779b9 | 0, 0x243f6a88 | 0, 1]
    for (let n = 0; n < 16; n++) this.word()
  }

  private word(): number {
    const [a, b, c, d] = this.state
    const sum = (a + b + d) | 0
    this.state = [b ^ (b >>> 9), (c + (c << 3)) | 0, ((c << 21) | (c >>> 11)) + sum | 0, (d + 1) | 0]
    return sum >>> 0
  }

  /** From 0 up to, not including, 1. */
  next(): number {
    return this.word() / 2 ** 32
  }

  /** A whole number from `low` to `high`, both possible. */
  between(low: number, high: number): number {
    return low + Math.floor(this.next() * (high - low + 1))
  }

  chance(share: number): boolean {
    return this.next() < share
  }

  pick<T>(list: readonly T[]): T {
    const one = list[Math.floor(this.next() * list.length)]
    if (one === undefined) throw new Error('nothing to pick from')
    return one
  }

  bytes(size: number): Uint8Array {
    return Uint8Array.from({ length: size }, () => this.word() & 0xff)
  }
}
