import type { Role } from '../sheet/wire'
import type { Journal } from './journal/types'

/** Everything that lasts: people and records (Prisma), the journal (sqlite3), evidence files. One data directory. */
export type Store = {
  readonly records: Records
  readonly journal: Journal
  readonly evidence: EvidenceFiles
  /** Budgets whose record and journal do not agree: lock them and raise the alarm (write path, rule 7). */
  readonly problems: readonly StoreProblem[]
  close(): Promise<void>
}

/** `what` says what is wrong and what to do. */
export type StoreProblem = { readonly budget: string; readonly what: string }

/** The records file. Plain values in and out; no driver type leaves lib/records. */
export type Records = {
  readonly people: PeopleRecords
  readonly budgets: BudgetRecords
  readonly members: MemberRecords
  readonly tokens: TokenRecords
  readonly evidence: EvidenceRecords
  readonly catalogues: CatalogueRecords
  readonly settings: SettingRecords
  /** The account library's own storage (users, sessions, accounts, verifications), opaque to everybody else. */
  readonly accountStorage: unknown
}

export type Person = {
  readonly id: string
  readonly name: string
  readonly email: string
  readonly administrator: boolean
}
export type PeopleRecords = {
  count(): Promise<number>
  byId(id: string): Promise<Person | null>
  byEmail(email: string): Promise<Person | null>
  byIds(ids: readonly string[]): Promise<Map<string, Person>>
  all(): Promise<Person[]>
  setAdministrator(id: string, administrator: boolean): Promise<void>
}

export type BudgetRecord = {
  readonly id: string
  readonly name: string
  readonly createdAt: number
  readonly createdBy: string
  /** 'made': entry 1 is synced and the record stands; 'abandoned': found without its record at start and not finished. */
  readonly state: 'made' | 'abandoned'
  /** The head that this record knows of; the journal must hold it. */
  readonly headSeq: number
  readonly headHash: string
}
export type BudgetRecords = {
  /** Makes the record and its first owner in one transaction. */
  create(record: BudgetRecord, owner: string): Promise<void>
  byId(id: string): Promise<BudgetRecord | null>
  all(): Promise<BudgetRecord[]>
  /** The budgets that stand ('made') and that the person is a member of, oldest first. */
  forPerson(person: string): Promise<{ record: BudgetRecord; role: Role }[]>
  rename(id: string, name: string): Promise<void>
}

export type MemberRecords = {
  role(person: string, budget: string): Promise<Role | null>
  list(budget: string): Promise<{ person: string; role: Role }[]>
  /** In one transaction: refuses to leave a budget without an owner. */
  set(budget: string, person: string, role: Role | null): Promise<'done' | 'last-owner'>
}

export type TokenRecord = {
  readonly id: string
  readonly person: string
  readonly name: string
  /** SHA-256 of the token; the token itself is never kept. */
  readonly sha256: string
  readonly createdAt: number
  readonly expiresAt: number | null
  readonly lastUsedAt: number | null
}
export type TokenRecords = {
  create(token: TokenRecord): Promise<void>
  bySha256(sha256: string): Promise<TokenRecord | null>
  forPerson(person: string): Promise<TokenRecord[]>
  touch(id: string, time: number): Promise<void>
  remove(person: string, id: string): Promise<boolean>
}

export type EvidenceRecord = {
  readonly budget: string
  readonly sha256: string
  readonly name: string
  readonly mediaType: string
  readonly size: number
  readonly person: string
  readonly time: number
}
export type EvidenceRecords = {
  /** Describing the same file of a budget twice keeps the first description. */
  describe(record: EvidenceRecord): Promise<EvidenceRecord>
  list(budget: string): Promise<EvidenceRecord[]>
  find(budget: string, sha256: string): Promise<EvidenceRecord | null>
}

/** An entry that somebody added to a catalogue of this server; `entry` is JSON, judged by whoever reads it. */
export type CatalogueRecord = {
  readonly id: string
  readonly kind: string
  readonly entry: string
  readonly person: string
  readonly time: number
}
export type CatalogueRecords = {
  add(record: CatalogueRecord): Promise<void>
  byId(id: string): Promise<CatalogueRecord | null>
  /** Oldest first. */
  all(): Promise<CatalogueRecord[]>
  remove(id: string): Promise<boolean>
}

/** Single values that must survive a restart, such as the hash of the first owner's code. */
export type SettingRecords = {
  get(key: string): Promise<string | null>
  set(key: string, value: string): Promise<void>
  remove(key: string): Promise<void>
}

/** Evidence by SHA-256: written aside, synced, renamed; never changed. */
export type EvidenceFiles = {
  /** @throws EvidenceTooLarge past the limit; nothing stays behind. */
  store(bytes: AsyncIterable<Uint8Array>, limit: number): Promise<{ sha256: string; size: number }>
  /** Null where there is no such file. */
  open(sha256: string): Promise<ReadableStream<Uint8Array> | null>
  has(sha256: string): Promise<boolean>
}
