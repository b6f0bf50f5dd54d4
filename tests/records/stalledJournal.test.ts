import { join } from 'node:path'
import { expect, onTestFinished, test } from 'vitest'
import { openJournal } from '../../lib/records/journal/open'
import { chain } from './journal/chain'
import { stalledJournal } from './stalledJournal'
import { temporaryDirectory } from './temporary'

test('the stalled journal stores nothing before it is released, and nothing of a call that it fails', async () => {
  const real = await openJournal(join(await temporaryDirectory(), 'journal.sqlite'))
  onTestFinished(() => real.close())
  const journal = stalledJournal(real)
  const rows = chain(2)

  const first = journal.append(rows.slice(0, 1))
  await journal.untilWaiting(1)
  expect(await journal.head('b1')).toBeNull()
  await journal.release()
  await first
  expect((await journal.head('b1'))?.seq).toBe(1)

  const second = journal.append(rows.slice(1))
  journal.fail(new Error('disk full'))
  await expect(second).rejects.toThrow('disk full')
  expect((await journal.head('b1'))?.seq).toBe(1)
  expect(journal.waiting()).toBe(0)
})
