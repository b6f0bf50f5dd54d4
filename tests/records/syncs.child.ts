import { connect } from '../../lib/records/journal/connection'
import { journalOver, openJournal } from '../../lib/records/journal/open'
import { chain } from './journal/chain'

/** Appends rows, one commit after the other, and prints a line for each that was acknowledged. NORMAL: the control. */
const [, , file = '', count, level] = process.argv
await (await openJournal(file)).close()
const writing = await connect(file, 'write')
if (level === 'NORMAL') await writing.exec('PRAGMA synchronous = NORMAL')
const journal = journalOver(writing, await connect(file, 'read'))
for (const row of chain(Number(count))) {
  await journal.append([row])
  process.stdout.write(`acknowledged ${row.entry.seq}\n`)
}
await journal.close()
