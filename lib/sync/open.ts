import type { Server } from 'node:http'
import type { Sessions } from '../access/service'
import type { Store } from '../records/types'
import { Reader } from './budgets/reader'
import { finishBudgets } from './budgets/recover'
import { createBudgetService } from './budgets/service'
import { createCatalogueService } from './catalogues'
import { type Clock, type Log, systemTimers, type Timers } from './clock'
import { Committer } from './committer'
import type { Evaluator } from './evaluator'
import { createAttachments, createEvidenceService } from './evidence'
import { Rooms } from './rooms'
import type { Services } from './services'
import { Snapshots } from './snapshots'
import { attachCollab, type Collab } from './socket/attach'
import { createSubmit } from './submit'

export type SyncOptions = {
  readonly store: Store
  readonly sessions: Sessions
  /** Scheme, host and port that browsers see: a socket with a cookie must come from a page of this origin. */
  readonly publicUrl: string
  /** Version of the evaluation, kept with every entry. */
  readonly engine: string
  readonly evaluator: Evaluator
  /** Milliseconds since 1970. */
  readonly clock: () => number
  readonly log: Log
  /** Replaced by tests that hold time. */
  readonly timers?: Timers
}

export type Sync = Pick<Services, 'budgets' | 'evidence' | 'catalogues' | 'submit'> & {
  /** Takes the worksheet's sockets of this server; other upgrades are left to the server's other listeners. */
  attach(server: Server): void
  /** Takes no more, commits and answers what was accepted, lets everybody go, and makes snapshots. */
  close(): Promise<void>
}

/** Opens the shared editing of budgets over a store. It finishes first what a stop has left half made. */
export async function openSync(options: SyncOptions): Promise<Sync> {
  const { store, sessions, publicUrl, engine, evaluator, log } = options
  const { journal, records } = store
  const clock: Clock = { ...(options.timers ?? systemTimers), now: options.clock }
  await finishBudgets(journal, records, log)
  const committer = new Committer(journal, clock, log)
  const snapshots = new Snapshots(journal, log)
  const problems = new Map(store.problems.map(({ budget, what }) => [budget, what]))
  const rooms = new Rooms({ journal, records, sessions, committer, snapshots, clock, log, engine, evaluator, problems })
  const attachments = createAttachments(store.evidence, records, clock.now)
  const reader = new Reader(journal, rooms, evaluator)
  const collabs: Collab[] = []
  const stopListening = sessions.onRevoked((revoked) => {
    if ('session' in revoked) for (const room of rooms.all()) room.closeSession(revoked.session)
    else rooms.peek(revoked.budget)?.membershipChanged(revoked.person)
  })

  return {
    budgets: createBudgetService(
      { journal, records, committer, now: clock.now, engine, evaluator, log },
      records,
      reader,
      rooms,
      attachments,
    ),
    evidence: createEvidenceService(store.evidence, records, attachments, (budget) => reader.forget(budget)),
    catalogues: createCatalogueService(records, clock.now),
    submit: createSubmit(rooms),
    attach(server) {
      collabs.push(attachCollab(server, { rooms, sessions, journal, clock, log, publicUrl }))
    },
    async close() {
      for (const collab of collabs) collab.pause()
      await rooms.close()
      for (const collab of collabs) collab.close()
      await committer.idle()
      await snapshots.idle()
      stopListening()
    },
  }
}
