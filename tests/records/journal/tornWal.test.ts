import { copyFile, mkdir, readFile, truncate } from 'node:fs/promises'
import { join } from 'node:path'
import fc from 'fast-check'
import { expect, onTestFinished, test } from 'vitest'
import { openJournal } from '../../../lib/records/journal/open'
import { verifyEntries } from '../../../lib/records/journal/verify'
import { temporaryDirectory } from '../temporary'
import { chain } from './chain'

test('[W5.7] a write-ahead log cut at any byte opens to a prefix of the commits, never to half of one', async () => {
  const directory = await temporaryDirectory()
  const file = join(directory, 'journal.sqlite')
  const journal = await openJournal(file)
  onTestFinished(() => journal.close())
  const rows = chain(60)
  for (let index = 0; index < rows.length; index += 3) await journal.append(rows.slice(index, index + 3))
  const length = (await readFile(`${file}-wal`)).byteLength

  let copies = 0
  const lengths = new Set<number>()
  await fc.assert(
    fc.asyncProperty(fc.integer({ min: 0, max: length }), async (cut) => {
      const copy = join(directory, `copy-${copies++}`)
      await mkdir(copy)
      await copyFile(file, join(copy, 'journal.sqlite'))
      await copyFile(`${file}-wal`, join(copy, 'journal.sqlite-wal'))
      await truncate(join(copy, 'journal.sqlite-wal'), cut)
      const opened = await openJournal(join(copy, 'journal.sqlite'))
      try {
        const read = await opened.rows('b1', 0)
        expect(read).toEqual(rows.slice(0, read.length))
        expect(read.length % 3).toBe(0)
        // The chain cannot tell: it is sound although acknowledged rows are gone (write path, rule 8: anchors do).
        expect(verifyEntries(read)).toBeNull()
        if (cut === length) expect(read.length).toBe(60)
        lengths.add(read.length)
        await opened.append(rows.slice(read.length, read.length + 1))
      } finally {
        await opened.close()
      }
    }),
    // fast-check prints the seed of a failing run.
    { numRuns: 30, examples: [[0], [length], [length - 1]] },
  )
  expect(lengths.size).toBeGreaterThan(3)
})
