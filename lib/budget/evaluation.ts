import type { Network } from '../channel/networks/network'
import type { Builds } from './builds'
import type { FlagDraft, Severity } from './flags'
import type { Beside } from './models/piece'
import type { Basis, Grade, Owner, Statistic, Verdict } from './schema'
import type { Sensitivity } from './sensitivity'

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
  readonly by: 'stated' | 'moved' | 'table' | 'computed' | 'measured' | null
  /** Other ways to look at it, where the line's model knows its two-port. */
  readonly beside: readonly Beside[]
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
    /** The lane with the least loss; null where all lanes are alike. */
    readonly shortestLane: number | null
    /** dB that the corner moved the sum by, and dB of lines that it could not move; null in the reference corner. */
    readonly movedDb: number | null
    readonly unmovedDb: number | null
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
  /** The cascade of the two-ports beside the sum; null where it was not asked for or a plane is missing. */
  readonly channel: ChannelEvaluation | null
  /** Random builds; null where they were not asked for or a line has no number. */
  readonly builds: Builds | null
  /** Decibels per tolerance of each input, the largest first; null where they were not asked for. */
  readonly sensitivity: readonly Sensitivity[] | null
  readonly byBasis: Readonly<Record<Basis | 'unsaid', number>>
  /** Lines between the planes in channel order, with what each counts here. */
  readonly lines: readonly CountedLine[]
  readonly shares: readonly ShareUse[]
}

/** The two-ports between the planes joined, in the judged lane and corner. Null is unknown, never passed. */
export type ChannelEvaluation = {
  readonly fromHz: number
  readonly toHz: number
  /** dB of the sum whose lines are in the cascade; of those, with reflection data. */
  readonly coveredDb: number
  readonly reflectingDb: number
  /** Lines without data over the band: not in the cascade; lines that enter it as matched attenuation. */
  readonly withoutBand: readonly string[]
  readonly withoutReflection: readonly string[]
  /** At the allowance's frequency: insertion loss of the cascade, and its fitted loss. The sum of the same lines is coveredDb. */
  readonly lossDb: number | null
  readonly fittedDb: number | null
  /** a0, a1, a2, a4 of a0 + a1·√f + a2·f + a4·f², f in GHz. */
  readonly fit: readonly number[] | null
  /** Insertion loss less its fit; null where a line between the planes has no reflection data. */
  readonly deviation: { readonly rmsDb: number; readonly maxDb: number; readonly rippleDb: number } | null
  /** The lesser of both ends, up to the Nyquist frequency. */
  readonly returnLoss: {
    /** False: the data do not reach from 0.05 GHz to the Nyquist frequency, so that what is not missed is unknown. */
    readonly whole: boolean
    readonly atNyquistDb: number | null
    /** Null: nothing comes back. */
    readonly worstDb: number | null
    readonly worstAtHz: number
  } | null
  readonly curve: CurveEvaluation | null
  readonly trace: {
    readonly hz: readonly number[]
    /** Null where nothing passes, or nothing comes back. */
    readonly lossDb: readonly (number | null)[]
    readonly returnLossDb: readonly (number | null)[] | null
    readonly limitDb: readonly (number | null)[] | null
  }
}

/** A limit curve against the cascade. */
export type CurveEvaluation = {
  /** False: not every line has data over the curve's range, so that what is not missed is unknown. */
  readonly whole: boolean
  readonly missed: {
    readonly fromHz: number
    readonly toHz: number
    readonly worstDb: number
    readonly worstAtHz: number
  } | null
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
