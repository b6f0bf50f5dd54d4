import type { Identity } from '../access/identity'
import type { AccessService } from '../access/service'
import type { OwnEntry } from '../budget/catalogues/ownEntry'
import type { Asked } from '../budget/context'
import type { Evaluation } from '../budget/evaluation'
import type { Budget, Verdict } from '../budget/schema'
import type { Operation } from '../sheet/change'
import type { Acknowledged, Door, Refused, Role, TrailEntry } from '../sheet/wire'

export type { AccessService, PersonSummary, TokenSummary } from '../access/service'

/**
 * What lib/server publishes on globalThis for the route handlers and pages of app: Next's bundle and the server's share no
 * modules, so this one object is the only bridge (write path, rule 9).
 */
export type Services = {
  readonly publicUrl: string
  readonly demo: boolean
  readonly engine: string
  readonly access: AccessService
  readonly budgets: BudgetService
  readonly evidence: EvidenceService
  readonly catalogues: CatalogueService
  readonly examples: ExampleService
  /** Evaluates a budget that is stored nowhere, and so without files. */
  evaluate(budget: Budget, asked: Asked): Promise<Evaluation>
  /** Null where both databases answer, else what is wrong, in words that may be shown to anybody. */
  ready(): Promise<string | null>
  /** The way in for everything but a worksheet's socket: same gate, journal and fan-out. */
  submit(budget: string, identity: Identity, door: Door, edit: SubmittedEdit): Promise<Acknowledged | Refused>
}

export type SubmittedEdit = {
  /** Idempotency key: the same id with the same operations is answered with the same seq. */
  readonly editId: string
  readonly operations: readonly Operation[]
  /** Refused with 'conflict' if the budget has moved past this seq. */
  readonly expectedSeq?: number
}

export type BudgetService = {
  list(identity: Identity): Promise<BudgetSummary[]>
  /**
   * Stores the files, makes journal entry 1, then the record; the person becomes the owner. The files come first, so that already
   * the first margins count by them.
   */
  create(identity: Identity, door: Door, budget: Budget, files?: readonly AttachedFile[]): Promise<{ id: string }>
  read(budget: string): Promise<{ budget: Budget; epoch: number; seq: number; head: string } | null>
  evaluation(budget: string): Promise<{ evaluation: Evaluation; seq: number } | null>
  /** after: oldest first, for programs; latest: newest first, for people. Null where the budget does not exist. */
  trail(
    budget: string,
    range: { after: number; limit: number } | { before?: number; limit: number },
  ): Promise<TrailEntry[] | null>
}

export type BudgetSummary = {
  readonly id: string
  readonly name: string
  readonly description: string
  readonly role: Role
  readonly verdict: Verdict
  /** The allowance that decides the verdict, with its words and margin. */
  readonly evaluation: Evaluation
  readonly seq: number
  readonly lastChange: { readonly personName: string; readonly time: number } | null
  /** Set where the budget cannot be served (a damaged or missing journal), with what to do. */
  readonly locked: string | null
}

export type EvidenceService = {
  /** Stores the bytes once by hash (write aside, sync, rename) and describes them for this budget. */
  store(budget: string, identity: Identity, file: AttachedFile): Promise<StoredEvidence>
  list(budget: string): Promise<StoredEvidence[]>
  open(budget: string, sha256: string): Promise<{ evidence: StoredEvidence; stream: ReadableStream<Uint8Array> } | null>
}

export type AttachedFile = {
  readonly name: string
  readonly mediaType: string
  readonly bytes: AsyncIterable<Uint8Array>
}

export type StoredEvidence = {
  readonly sha256: string
  readonly name: string
  readonly mediaType: string
  readonly size: number
  readonly person: string
  readonly time: number
}

/** The invented links that a budget can start from. */
export type ExampleService = {
  /** With the verdict that its files give. */
  list(): Promise<readonly Example[]>
  /** A new budget with the example's files attached. Null where there is no such example. */
  make(identity: Identity, door: Door, id: string): Promise<{ id: string } | null>
}

export type Example = {
  readonly id: string
  readonly name: string
  readonly description: string
  readonly verdict: Verdict
  readonly words: string
}

/** What people added to the catalogues of this server: whoever is signed in reads it and may add to it. */
export type CatalogueService = {
  /** Oldest first. */
  list(identity: Identity): Promise<CatalogueItem[]>
  add(identity: Identity, own: OwnEntry): Promise<{ id: string }>
  /** Only who added it, or the administrator. */
  remove(identity: Identity, id: string): Promise<'done' | 'no-such-entry' | 'not-yours'>
}

export type CatalogueItem = OwnEntry & {
  readonly id: string
  readonly person: string
  readonly personName: string
  readonly time: number
  /** Whether who asks may remove it. */
  readonly mayRemove: boolean
}
