import { mkdtemp, rm } from 'node:fs/promises'
import { createServer, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { onTestFinished } from 'vitest'
import { ENGINE } from '../../../lib/budget/engine'
import { type Budget, budgetSchema } from '../../../lib/budget/schema'
import { openJournal } from '../../../lib/records/journal/open'
import type { Journal } from '../../../lib/records/journal/types'
import type { StoreProblem } from '../../../lib/records/types'
import type { Timers } from '../../../lib/sync/clock'
import { evaluatorHere } from '../../../lib/sync/evaluator'
import { openSync, type Sync } from '../../../lib/sync/open'
import type { holdableDisk } from './disk'
import { memoryRecords } from './memoryRecords'
import { fakeSessions, PEOPLE } from './sessions'

export const PUBLIC_URL = 'http://worksheet.test:8080'

export type WorldOptions = {
  /** Stands between the server and its journal. */
  readonly disk?: ReturnType<typeof holdableDisk>
  readonly timers?: Timers
  readonly now?: () => number
  readonly problems?: readonly StoreProblem[]
}

/** A server of shared editing over a journal on disk, records in memory and sessions that a test can end. */
export async function openWorld(options: WorldOptions = {}) {
  const directory = await mkdtemp(join(tmpdir(), 'halfbaud-sync-'))
  const records = memoryRecords(PEOPLE)
  const logged: string[] = []
  const closing: (() => Promise<unknown>)[] = []
  onTestFinished(async () => {
    for (const close of closing.reverse()) await close()
    await rm(directory, { recursive: true, force: true })
  })

  /** @param over what stands between the server and its journal */
  async function start(over: (journal: Journal) => Journal = (journal) => options.disk?.over(journal) ?? journal) {
    const onDisk = await openJournal(join(directory, 'journal.sqlite'))
    const journal = over(onDisk)
    const sessions = fakeSessions(records)
    const store = { records, journal, evidence: NO_FILES, problems: options.problems ?? [], close: async () => {} }
    const sync = await openSync({
      store,
      sessions,
      publicUrl: PUBLIC_URL,
      engine: ENGINE,
      evaluator: evaluatorHere(new Map()),
      clock: options.now ?? Date.now,
      ...(options.timers ? { timers: options.timers } : {}),
      log: (message, error) => logged.push(`${message}${error === undefined ? '' : `: ${error}`}`),
    })
    const server = createServer()
    sync.attach(server)
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
    const { port } = server.address() as AddressInfo
    let isStopped = false
    const stop = async () => {
      if (isStopped) return
      isStopped = true
      // Stopping waits for what is being written.
      await options.disk?.letGo()
      await sync.close()
      await closed(server)
      await onDisk.close()
    }
    closing.push(stop)
    const url = `ws://127.0.0.1:${port}/collab/`
    return { sync, sessions, server, journal: onDisk, url, stop, createBudget: () => createBudget(sync, records) }
  }

  const first = await start()
  return { ...first, records, logged, start }
}

export type World = Awaited<ReturnType<typeof openWorld>>

/** A budget of Ann's, which Ben may change and Vera may read. */
async function createBudget(sync: Sync, records: ReturnType<typeof memoryRecords>): Promise<string> {
  const { id } = await sync.budgets.create(PEOPLE.ann, 'screen', smallBudget())
  await records.members.set(id, 'ben', 'editor')
  await records.members.set(id, 'vera', 'viewer')
  return id
}

/** Two lines between two planes, 5 dB and undecided, under an allowance of 10 dB. */
export function smallBudget(): Budget {
  return budgetSchema.parse({
    head: {
      schemaVersion: 1,
      name: 'Backplane, 32 lanes',
      bitRate: '56 Gb/s',
      rateType: 'line',
      code: 'PAM4',
      reference: '100 Ω',
      laneCount: 2,
    },
    assemblies: { board: { order: 'a0', name: 'Board', kind: 'board', owner: 'hardware' } },
    lines: {
      trace: {
        order: 'a1',
        name: 'Trace',
        kind: 'trace',
        assembly: 'board',
        model: 'stated',
        loss: '5 dB',
        at: '14 GHz',
      },
      cable: {
        order: 'a2',
        name: 'Cable',
        kind: 'cable',
        assembly: 'board',
        model: 'stated',
        loss: '2 dB',
        at: '14 GHz',
      },
    },
    planes: {
      start: { order: 'a0', code: 'tx-ball' },
      end: { order: 'a3', code: 'rx-ball' },
    },
    allowances: {
      whole: { order: 'a0', name: 'Ball to ball', limit: '10 dB', at: '14 GHz', from: 'start', to: 'end' },
    },
    laneValues: { 'trace/1/length': null },
  })
}

const NO_FILES = {
  store: () => Promise.reject(new Error('No evidence files in this test.')),
  open: async () => null,
  has: async () => false,
}

function closed(server: Server): Promise<void> {
  server.closeAllConnections()
  return new Promise((resolve) => server.close(() => resolve()))
}
