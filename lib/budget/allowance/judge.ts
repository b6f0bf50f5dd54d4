import { holdsAt } from '../../channel/lines'
import { formatScaled } from '../../channel/units'
import type { Context } from '../context'
import type { AllowanceEvaluation } from '../evaluation'
import { basisOf, type LineItem } from '../lineItem'
import { FREQUENCY, LOSS, typedValue } from '../quantities'
import { nameOf } from '../record'
import type { Allowance, Basis } from '../schema'
import { type JudgedConditions, judgedConditions } from './conditions'
import { type LaneSum, laneSums } from './laneSums'
import { sharesOf } from './shares'
import { type Span, spanOf } from './span'
import { type Counted, countedLine, judgedHigh, judgedLow } from './sum'
import { compareVerdicts, type Facts, type Judgement, verdictOf } from './verdict'

/** An allowance judged, and what the checks want to know about it beside its evaluation. */
export type Judged = {
  readonly allowance: Allowance
  readonly evaluation: AllowanceEvaluation
  readonly span: Span
  readonly conditions: JudgedConditions
  /** The lane that decides. */
  readonly lane: LaneSum
  readonly lanes: readonly LaneSum[]
}

export function judge(context: Context, id: string, allowance: Allowance): Judged {
  const nyquist = context.signalling.evaluation.nyquist
  const ownHz = typedValue(FREQUENCY, allowance.at)
  const atHz = ownHz ?? nyquist
  const span = spanOf(context, allowance)
  const conditions = judgedConditions(context, allowance)
  const lanes = laneSums(context, allowance, span, conditions, atHz)
  const facts = commonFacts(context, allowance, span, conditions, atHz)
  const judged = lanes.map((lane) => ({ lane, judgement: verdictOf(laneFacts(facts, lane, conditions)) }))
  const { lane, judgement } = judged.reduce((worst, next) => (worse(next, worst, conditions) ? next : worst))
  const evaluation = evaluationOf(context, id, allowance, { span, conditions, lane, lanes, judgement, facts, atHz })
  return { allowance, evaluation, span, conditions, lane, lanes }
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
  atHz: number | null,
): CommonFacts {
  const nyquist = context.signalling.evaluation.nyquist
  const blocked = [
    ...span.problems.map(({ reason }) => reason),
    ...(conditions.problem === null ? [] : [conditions.problem]),
    ...(atHz === null ? ['neither the allowance nor the link says a frequency'] : []),
  ]
  const atNyquist = atHz !== null && nyquist !== null && holdsAt(nyquist, atHz)
  const curve = (allowance.curve?.trim() ?? '') !== ''
  return {
    limit: typedValue(LOSS, allowance.limit),
    requiredMargin: typedValue(LOSS, allowance.requiredMargin) ?? 0,
    leastLoss: typedValue(LOSS, allowance.leastLoss),
    blocked,
    unknown: [...(curve ? ['limit curve'] : []), ...(allowance.returnLossFloor === null ? [] : ['return loss'])],
    where: atNyquist || atHz === null ? 'at Nyquist' : `at ${formatScaled(atHz, 'frequency')}`,
    atNyquist,
  }
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
  readonly judgement: Judgement
  readonly facts: CommonFacts
  readonly atHz: number | null
}

function evaluationOf(context: Context, id: string, allowance: Allowance, parts: Parts): AllowanceEvaluation {
  const { span, conditions, lane, lanes, judgement, facts, atHz } = parts
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
    },
    verdict: judgement.verdict,
    words: judgement.words,
    reasons: reasonsOf(judgement, lane, facts.unknown),
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
    ...unknown.map((what) => `the ${what} is not judged in this version`),
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
