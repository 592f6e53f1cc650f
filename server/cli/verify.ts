import { existsSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import { openReader } from '#server/database/connection'
import { verifyFirm } from '#server/services/verify/verify-firm'

/** `npm run verify [-- firm…]`: every firm's file recomputed, beside a running server. Exit 0 good, 1 not as the leaves say, 2 no file. */
const folder = join(process.env.NUXT_DATA_DIR ?? '.data', 'firms')
const asked = process.argv.slice(2)
const all = existsSync(folder) ? readdirSync(folder).filter(name => name.endsWith('.sqlite')).map(name => name.replace(/\.sqlite$/, '')).sort() : []
const slugs = asked.length > 0 ? asked : all
let status = slugs.length > 0 ? 0 : 2
if (slugs.length === 0) console.error(`There is no firm in ${folder}.`)

for (const slug of slugs) {
  const path = join(folder, `${slug}.sqlite`)
  if (!existsSync(path)) {
    console.error(`There is no file ${path}.`)
    status = 2
    continue
  }
  const raw = openReader(path)
  const verdict = verifyFirm(raw)
  raw.close()
  if (verdict.good) {
    console.log(`${slug}: good. ${verdict.leaves} leaves, every body, row and standing as written; chain head ${verdict.head}`)
    continue
  }
  status = 1
  console.log(`${slug}: NOT as written. ${verdict.leaves} leaves, ${verdict.count} differences:`)
  for (const { part, where, says } of verdict.problems) console.log(`  ${part}: ${where}: ${says}`)
  if (verdict.count > verdict.problems.length) console.log(`  and ${verdict.count - verdict.problems.length} more`)
}
process.exitCode = status
