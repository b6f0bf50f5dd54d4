import type { Network } from '../channel/networks/network'
import type { FlagDraft, Severity } from './flags'
import type { Basis, Grade, Owner, Statistic, Verdict } from './schema'

/** What evaluate() returns. Losses are positive decibels; null means unknown, never zero. */
export type Evaluation = {
  readonly engine: string
  readonly signalling: SignallingEvaluation
  /** Channel order: lines and the planes between them. */
  readonly rows: readonly ({ readonly plane: string } | { readonly line: string })[]
  readonly lines: Readonly<Record<string, LineEvaluation>>
  readonly allowances: readonly AllowanceEvaluation[]
  /** The worst of the allowances in the order over, undecided, tight, inside; undecided with none. */
  readonly verdict: Verdict
  readonly flags: readonly Flag[]
}

export type SignallingEvaluation = {
  readonly lineRate: number | null
  readonly bitsPerSymbol: number | null
  readonly symbolRate: number | null
  readonly unitInterval: number | null
  readonly nyquist: number | null
  /** What the rate includes, in words. */
  readonly statement: string
}

/** One line, at the Nyquist frequency of the budget and beside each allowance's sum. */
export type LineEvaluation = {
  readonly id: string
  /** In the lane where this line is worst, in the reference corner. */
  readonly loss: LossAt
  /** The lane where this line is worst; null: a lane without a value of its own. */
  readonly lane: number | null
  readonly owner: Owner | null
  readonly basis: Basis | null
  readonly grade: Grade
  /** Physical length in metres where the line has one, for drawing. */
  readonly lengthM: number | null
  readonly group: string
}

/** A loss at one frequency, or why there is none. */
export type LossAt = {
  readonly atHz: number | null
  readonly nominalDb: number | null
  readonly lowDb: number | null
  readonly highDb: number | null
  /** How the number got to this frequency. */
  readonly by: 'stated' | 'moved' | 'table' | 'computed' | null
}

export type AllowanceEvaluation = {
  readonly id: string
  readonly name: string
  readonly limitDb: number | null
  readonly atHz: number | null
  readonly requiredMarginDb: number
  readonly judged: {
    /** Id of the corner, or 'reference corner'. */
    readonly corner: string
    readonly statistic: Statistic
    /** The lane that the figures are of: the worst, unless the allowance names one; null where all lanes are alike. */
    readonly lane: number | null
    readonly lanes: number
  }
  readonly verdict: Verdict
  /** The verdict in words, as every screen and document shows it. */
  readonly words: string
  readonly reasons: readonly string[]
  /** Planes found in the budget, in channel order, or null. */
  readonly from: string | null
  readonly to: string | null
  /** Sum of the lines that have a number, in the judged conditions; overlap lines subtract. 0 where a plane is missing. */
  readonly knownDb: number
  /** The whole loss in the judged conditions; null while a line between the planes has no number. */
  readonly lossDb: number | null
  readonly marginDb: number | null
  /** What is left of the limit for the lines that have no number yet. */
  readonly leftDb: number | null
  readonly undecidedLines: readonly string[]
  readonly nominalDb: number | null
  readonly worstDb: number | null
  /** Three standard deviations of the sum, grouped. */
  readonly rssDb: number | null
  readonly byBasis: Readonly<Record<Basis | 'unsaid', number>>
  /** Lines between the planes in channel order, with what each counts here. */
  readonly lines: readonly CountedLine[]
  readonly shares: readonly ShareUse[]
}

export type CountedLine = {
  readonly id: string
  /** Signed: what it adds to the sum. An overlap line is negative. Null: unknown. */
  readonly countedDb: number | null
  readonly lowDb: number | null
  readonly highDb: number | null
}

export type ShareUse = {
  readonly id: string
  readonly of: { readonly kind: 'assembly' | 'line' | 'discipline'; readonly ref: string }
  readonly shareDb: number
  readonly usedDb: number
  /** What is left of it; negative: past the share. */
  readonly freeDb: number
  readonly undecidedLines: readonly string[]
}

/** Something to know about a record: a closed list of codes (flags.ts), with what to do. */
export type Flag = FlagDraft & { readonly severity: Severity }

/**
 * The networks in the evidence files, by SHA-256, for evaluate(): read beforehand, off the main thread. A file that could not
 * be read says why in one sentence; one that is not in the map has not been read yet.
 */
export type EvidenceData = ReadonlyMap<string, EvidenceNetwork>
export type EvidenceNetwork = { readonly network: Network } | { readonly problem: string }
