import { type ChildProcess, spawn } from 'node:child_process'
import { once } from 'node:events'
import { readdir, stat, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { describe, expect, onTestFinished, test } from 'vitest'
import { connect } from '../../lib/records/journal/connection'
import { DirectoryInUse } from '../../lib/records/lock'
import { openStore } from '../../lib/records/open'
import type { BudgetRecord } from '../../lib/records/types'
import { chain, lastOf } from './journal/chain'
import { temporaryDirectory } from './temporary'

async function freshDirectory(): Promise<string> {
  return join(await temporaryDirectory(), 'deep', 'data')
}

/** Another process that has the store open. */
async function openElsewhere(directory: string): Promise<ChildProcess> {
  const script = fileURLToPath(new URL('./openStore.child.ts', import.meta.url))
  const child = spawn(process.execPath, ['--import', 'tsx', script, directory], {
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  const said: string[] = []
  child.stderr.on('data', (data) => said.push(String(data)))
  onTestFinished(() => {
    child.kill('SIGKILL')
  })
  await Promise.race([
    once(child.stdout, 'data'),
    once(child, 'close').then(([code]) => {
      throw new Error(`The other process ended with ${code}: ${said.join('')}`)
    }),
  ])
  return child
}

async function killed(child: ChildProcess): Promise<void> {
  child.kill('SIGKILL')
  await once(child, 'exit')
}

test('a new directory is made for its owner alone, with everything in it', async () => {
  const directory = await freshDirectory()
  const store = await openStore(directory)
  expect((await stat(directory)).mode & 0o777).toBe(0o700)
  for (const entry of await readdir(directory, { withFileTypes: true })) {
    const mode = (await stat(join(directory, entry.name))).mode & 0o777
    expect(mode, entry.name).toBe(entry.isDirectory() ? 0o700 : 0o600)
  }
  expect(store.problems).toEqual([])
  expect(await store.records.people.count()).toBe(0)
  expect(await store.journal.budgets()).toEqual([])
  await store.close()
  expect((await readdir(directory)).sort()).toEqual(['evidence', 'journal.sqlite', 'lock', 'records.sqlite'])
})

test('what was written is there when it is opened again', async () => {
  const directory = await freshDirectory()
  const store = await openStore(directory)
  const rows = chain(3)
  await store.journal.append(rows)
  await store.records.settings.set('key', 'value')
  const { sha256 } = await store.evidence.store(
    (async function* () {
      yield new Uint8Array([1, 2, 3])
    })(),
    3,
  )
  await store.close()
  await store.close()

  const again = await openStore(directory)
  onTestFinished(again.close)
  expect(await again.journal.rows('b1', 0)).toEqual(rows)
  expect(await again.records.settings.get('key')).toBe('value')
  expect(await again.evidence.has(sha256)).toBe(true)
})

describe('[W6.13] one process at a time', () => {
  test('a second store of the same directory is refused, and the first one still holds it', async () => {
    const directory = await freshDirectory()
    const store = await openStore(directory)
    await expect(openStore(directory)).rejects.toThrow(DirectoryInUse)
    await expect(openElsewhere(directory)).rejects.toThrow(`is in use by process ${process.pid}`)
    await store.close()
    await (await openStore(directory)).close()
  })

  test('the refusal names the process; after kill -9 the directory is free at once', async () => {
    const directory = await freshDirectory()
    const child = await openElsewhere(directory)
    await expect(openStore(directory)).rejects.toThrow(
      `The data directory ${directory} is in use by process ${child.pid}; stop it first`,
    )
    await killed(child)
    expect(await readdir(directory)).toContain('lock.pid')
    const store = await openStore(directory)
    onTestFinished(store.close)
    expect(await store.records.people.count()).toBe(0)
  })

  test('a process id that is left over names nobody, even where it runs again as something else', async () => {
    const directory = await freshDirectory()
    await (await openStore(directory)).close()
    await writeFile(join(directory, 'lock.pid'), String(process.pid))
    await (await openStore(directory)).close()
  })
})

test('when opening fails half-way, everything is closed again', async () => {
  const directory = await freshDirectory()
  await (await openStore(directory)).close()
  const journal = join(directory, 'journal.sqlite')
  const change = async (script: string) => {
    const raw = await connect(journal, 'write')
    await raw.exec(script)
    await raw.close()
  }
  await change('PRAGMA user_version = 9')
  await expect(openStore(directory)).rejects.toThrow('written by a newer version')
  await change('PRAGMA user_version = 1')
  await (await openStore(directory)).close()
})

describe('[W7.1] records that name a head which the journal lacks', () => {
  const record = (id: string, headSeq: number, headHash: string): BudgetRecord => ({
    id,
    name: id,
    createdAt: 1,
    createdBy: 'p1',
    state: 'made',
    headSeq,
    headHash,
  })

  test('are reported with what to do, and do not keep the others from being served', async () => {
    const directory = await freshDirectory()
    const store = await openStore(directory)
    const rows = chain(3)
    await store.journal.append(rows)
    const hash = lastOf(rows).hash
    await store.records.budgets.create(record('b1', 1, rows[0]?.entry.hash ?? ''), 'p1')
    await store.records.budgets.create(record('b2', 1, hash), 'p1')
    await store.journal.append(chain(2, { budget: 'b3' }))
    await store.records.budgets.create(record('b3', 2, hash), 'p1')
    await store.journal.append(chain(2, { budget: 'b4' }))
    await store.records.budgets.create(record('b4', 3, hash), 'p1')
    await store.records.budgets.create({ ...record('b5', 1, hash), state: 'abandoned' }, 'p1')
    await store.close()

    const again = await openStore(directory)
    onTestFinished(again.close)
    expect(again.problems.map(({ budget }) => budget)).toEqual(['b2', 'b3', 'b4'])
    expect(again.problems[0]?.what).toContain('The journal ends before entry 1')
    expect(again.problems[1]?.what).toContain('Entry 2 of the journal is not the one')
    expect(again.problems[2]?.what).toContain('The journal ends before entry 3')
  })
})
