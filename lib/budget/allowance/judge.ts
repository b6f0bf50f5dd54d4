import { holdsAt } from '../../channel/lines'
import { formatScaled } from '../../channel/units'
import type { Context } from '../context'
import type { AllowanceEvaluation } from '../evaluation'
import { basisOf, type LineItem } from '../lineItem'
import { LOSS, typedValue } from '../quantities'
import { nameOf } from '../record'
import type { Allowance, Basis } from '../schema'
import { buildsOf } from './builds'
import { type JudgedConditions, judgedConditions } from './conditions'
import { type CornerMoves, movesOf } from './cornerMoves'
import { type LaneSum, laneSums } from './laneSums'
import { type Limit, limitOf } from './limit'
import { type OverFrequency, overFrequency } from './overFrequency'
import { sensitivityOf } from './sensitivity'
import { sharesOf } from './shares'
import { type Span, spanOf } from './span'
import { type Counted, countedLine, judgedHigh, judgedLow } from './sum'
import { compareVerdicts, type Facts, type Judgement, verdictOf } from './verdict'

/** An allowance judged, and what the checks want to know about it beside its evaluation. */
export type Judged = {
  readonly allowance: Allowance
  readonly evaluation: AllowanceEvaluation
  readonly span: Span
  readonly limit: Limit
  readonly conditions: JudgedConditions
  /** The lane that decides. */
  readonly lane: LaneSum
  readonly lanes: readonly LaneSum[]
  /** What the corner did in that lane; null in the reference corner. */
  readonly moved: CornerMoves | null
}

export function judge(context: Context, id: string, allowance: Allowance): Judged {
  const limit = limitOf(allowance, context.signalling.evaluation.nyquist)
  const span = spanOf(context, allowance)
  const conditions = judgedConditions(context, allowance)
  const lanes = laneSums(context, allowance, span, conditions, limit.atHz)
  const facts = commonFacts(context, allowance, span, conditions, limit)
  const judged = lanes.map((lane) => ({ lane, judgement: verdictOf(laneFacts(facts, lane, conditions)) }))
  const { lane } = judged.reduce((worst, next) => (worse(next, worst, conditions) ? next : worst))
  const shortest = lanes.reduce((least, next) => (next.sum.nominal < least.sum.nominal ? next : least))
  const swept =
    span.from === null
      ? { channel: null, missed: [], unknown: unknownBeside(allowance) }
      : overFrequency(context, allowance, limit, conditions, lane, shortest)
  const judgement = verdictOf({ ...laneFacts(facts, lane, conditions), missed: swept.missed, unknown: swept.unknown })
  const moved = movesOf(context, conditions.corner, lane, limit.atHz)
  const parts: Parts = { span, conditions, lane, lanes, shortest, judgement, facts, swept, moved, limit }
  return {
    allowance,
    evaluation: evaluationOf(context, id, allowance, parts),
    span,
    limit,
    conditions,
    lane,
    lanes,
    moved,
  }
}

type InLane = { readonly lane: LaneSum; readonly judgement: Judgement }

function worse(a: InLane, b: InLane, { statistic }: JudgedConditions): boolean {
  const order = compareVerdicts(a.judgement.verdict, b.judgement.verdict)
  if (order !== 0) return order < 0
  return judgedHigh(a.lane.sum, statistic) > judgedHigh(b.lane.sum, statistic)
}

/** What is the same in every lane. */
type CommonFacts = Omit<Facts, 'known' | 'lowest' | 'undecidedLines' | 'overlapUndecided' | 'blocked'> & {
  readonly blocked: readonly string[]
}

function commonFacts(
  context: Context,
  allowance: Allowance,
  span: Span,
  conditions: JudgedConditions,
  { db, atHz, blocked }: Limit,
): CommonFacts {
  const nyquist = context.signalling.evaluation.nyquist
  const atNyquist = atHz !== null && nyquist !== null && holdsAt(nyquist, atHz)
  return {
    limit: db,
    requiredMargin: typedValue(LOSS, allowance.requiredMargin) ?? 0,
    leastLoss: typedValue(LOSS, allowance.leastLoss),
    blocked: [
      ...span.problems.map(({ reason }) => reason),
      ...(conditions.problem === null ? [] : [conditions.problem]),
      ...(atHz === null ? ['neither the allowance nor the link says a frequency'] : []),
      ...(blocked === null ? [] : [blocked]),
    ],
    missed: [],
    unknown: [],
    where: atNyquist || atHz === null ? 'at Nyquist' : `at ${formatScaled(atHz, 'frequency')}`,
    atNyquist,
  }
}

function unknownBeside(allowance: Allowance): string[] {
  const curve = (allowance.curve?.trim() ?? '') !== ''
  return [...(curve ? ['limit curve'] : []), ...(allowance.returnLossFloor === null ? [] : ['return loss'])]
}

function laneFacts(common: CommonFacts, { sum, cornerUnknown }: LaneSum, { statistic }: JudgedConditions): Facts {
  return {
    ...common,
    blocked: cornerUnknown === null ? common.blocked : [...common.blocked, cornerUnknown],
    known: judgedHigh(sum, statistic),
    lowest: judgedLow(sum, statistic),
    undecidedLines: sum.undecided.length,
    overlapUndecided: sum.overlapUndecided,
  }
}

type Parts = {
  readonly span: Span
  readonly conditions: JudgedConditions
  readonly lane: LaneSum
  readonly lanes: readonly LaneSum[]
  readonly shortest: LaneSum
  readonly judgement: Judgement
  readonly facts: CommonFacts
  readonly swept: OverFrequency
  readonly moved: CornerMoves | null
  readonly limit: Limit
}

function evaluationOf(context: Context, id: string, allowance: Allowance, parts: Parts): AllowanceEvaluation {
  const { span, conditions, lane, lanes, shortest, judgement, facts, swept, moved } = parts
  const { atHz } = parts.limit
  const { sum } = lane
  const known = judgedHigh(sum, conditions.statistic)
  const whole = span.from !== null && sum.undecided.length === 0 && atHz !== null
  const inCorner = conditions.problem === null && lane.cornerUnknown === null
  const comparable = facts.blocked.length === 0 && inCorner
  const { limit } = facts
  return {
    id,
    name: allowance.name?.trim() ?? '',
    limitDb: limit,
    atHz,
    requiredMarginDb: facts.requiredMargin,
    judged: {
      corner: allowance.judgedCorner ?? 'reference corner',
      statistic: conditions.statistic,
      lane: conditions.lane ?? (lanes.length > 1 ? lane.number : null),
      lanes: context.lanes.count,
      shortestLane: lanes.length > 1 ? shortest.number : null,
      movedDb: moved?.movedDb ?? null,
      unmovedDb: moved?.unmovedDb ?? null,
    },
    verdict: judgement.verdict,
    words: judgement.words,
    reasons: reasonsOf(judgement, lane, swept.unknown),
    from: span.from,
    to: span.to,
    knownDb: known,
    lossDb: whole && inCorner ? known : null,
    marginDb: whole && comparable && limit !== null ? limit - known : null,
    leftDb: comparable && limit !== null && sum.undecided.length > 0 ? limit - known : null,
    undecidedLines: sum.undecided,
    nominalDb: whole ? sum.nominal : null,
    worstDb: whole ? sum.worst : null,
    rssDb: whole ? sum.rssUp : null,
    channel: swept.channel,
    builds: buildsOf(context, parts.limit, conditions, lane, comparable),
    sensitivity: sensitivityOf(context, lane, atHz),
    byBasis: byBasis(lane.lines),
    lines: lane.lines.map(countedLine),
    shares: sharesOf(context.budget, id, lane.lines),
  }
}

/** The verdict's own reasons, the lines without a number, and what is not judged, as half sentences. */
function reasonsOf(judgement: Judgement, lane: LaneSum, unknown: readonly string[]): string[] {
  const open = lane.lines.filter(({ item }) => lane.sum.undecided.includes(item.id))
  return [
    ...judgement.reasons,
    ...open.map(({ item }) => `${nameOf('lines', item.id, item.line)} has no number`),
    ...unknown.map((what) => `the ${what} is not known: not every line has data over the band`),
  ]
}

/** Nominal decibels by where they come from; overlaps subtract. */
function byBasis(lines: readonly Counted[]): Record<Basis | 'unsaid', number> {
  const sums: Record<Basis | 'unsaid', number> = {
    target: 0,
    estimate: 0,
    simulated: 0,
    datasheet: 0,
    measured: 0,
    unsaid: 0,
  }
  for (const { item, sign, loss } of lines) sums[basisKey(item)] += sign * (loss.nominal ?? 0)
  return sums
}

function basisKey(item: LineItem): Basis | 'unsaid' {
  return basisOf(item) ?? 'unsaid'
}
