import { join } from 'node:path'
import { beforeEach, expect, onTestFinished, test } from 'vitest'
import { migrateRecords } from '../../lib/records/migrate'
import { AlreadyRecorded } from '../../lib/records/prisma/errors'
import { openRecords } from '../../lib/records/prisma/open'
import type { CatalogueRecord, Records } from '../../lib/records/types'
import { temporaryDirectory } from './temporary'

let file: string
let records: Records

beforeEach(async () => {
  file = join(await temporaryDirectory(), 'records.sqlite')
  await migrateRecords(file)
  const opened = await openRecords(file)
  records = opened.records
  onTestFinished(opened.close)
})

const record = (id: string, changes: Partial<CatalogueRecord> = {}): CatalogueRecord => ({
  id,
  kind: 'allowance',
  entry: '{"name":"Ω backplane"}',
  person: 'p1',
  time: 1_700_000_000_123,
  ...changes,
})

test('catalogue entries are listed oldest first, found, and there after opening again', async () => {
  await records.catalogues.add(record('b', { time: 2 }))
  await records.catalogues.add(record('a', { time: 3, kind: 'laminate' }))
  await records.catalogues.add(record('c', { time: 2 }))
  expect((await records.catalogues.all()).map(({ id }) => id)).toEqual(['b', 'c', 'a'])
  expect(await records.catalogues.byId('a')).toEqual(record('a', { time: 3, kind: 'laminate' }))
  expect(await records.catalogues.byId('nothing')).toBeNull()
  const again = await openRecords(file)
  onTestFinished(again.close)
  expect(await again.records.catalogues.byId('b')).toEqual(record('b', { time: 2 }))
})

test('a catalogue entry is added once, and removed once', async () => {
  await records.catalogues.add(record('a'))
  await expect(records.catalogues.add(record('a', { entry: '{}' }))).rejects.toThrow(AlreadyRecorded)
  expect(await records.catalogues.all()).toEqual([record('a')])
  expect(await records.catalogues.remove('a')).toBe(true)
  expect(await records.catalogues.remove('a')).toBe(false)
  expect(await records.catalogues.all()).toEqual([])
})

test('an entry outlives the person who added it', async () => {
  await records.catalogues.add(record('a', { person: 'nobody-any-more' }))
  expect((await records.catalogues.all()).map(({ person }) => person)).toEqual(['nobody-any-more'])
})
