import { holdsAt } from '../../channel/lines'
import { formatScaled } from '../../channel/units'
import type { Judged } from '../allowance/judge'
import type { FlagDraft } from '../flags'
import { LOSS, typedValue } from '../quantities'
import { nameOf } from '../record'
import type { Check } from './check'

/** What keeps an allowance from being judged, and what is judged away from the Nyquist frequency. */
export const allowances: Check = function* ({ context, judged }) {
  if (judged.length === 0) {
    yield {
      code: 'no-allowance',
      section: 'head',
      id: null,
      field: null,
      message: 'The link has no allowance, so there is nothing to judge its loss against.',
      todo: 'Add an allowance: a limit between two planes, with its source.',
    }
  }
  for (const one of judged) {
    yield* undecidable(one)
    yield* frequency(one, context.signalling.evaluation.nyquist, context.signalling.mistake)
    yield* beside(one)
  }
}

function* undecidable(one: Judged): Generator<FlagDraft> {
  const { span, conditions, evaluation, lane } = one
  if (evaluation.limitDb === null) {
    yield flag(one, 'limit-missing', 'limit', 'has no limit.', 'Type the loss allowed in dB.')
  }
  for (const { code, field, reason, todo } of span.problems)
    yield flag(one, code, field, `cannot be judged: ${reason}.`, todo)
  if (conditions.problem !== null && conditions.problemField === 'judgedLane') {
    yield flag(
      one,
      'judged-lane-missing',
      'judgedLane',
      `cannot be judged: ${conditions.problem}.`,
      'Choose a lane of the link, or leave it empty for the worst.',
    )
    return
  }
  const corner = conditions.problem ?? lane.cornerUnknown
  if (corner !== null) {
    yield flag(
      one,
      'corner-not-judged',
      'judgedCorner',
      `cannot be judged in its corner: ${corner}. The decibels shown are those of the reference corner.`,
      'Complete the corner (such as 65 °C and 0.12 %/K), or judge in the reference corner.',
    )
  }
}

function* frequency(one: Judged, nyquist: number | null, mistake: (hz: number) => string | null): Generator<FlagDraft> {
  const { allowance, evaluation } = one
  const { atHz } = evaluation
  if (allowance.at === null) {
    const taken = nyquist === null ? '' : `; the Nyquist frequency of ${formatScaled(nyquist, 'frequency')} is taken`
    yield flag(
      one,
      'allowance-frequency-missing',
      'at',
      `does not say its frequency${taken}.`,
      'Type the frequency that its source states it at.',
    )
    return
  }
  if (atHz === null || nyquist === null || holdsAt(nyquist, atHz)) return
  const [at, budget] = [formatScaled(atHz, 'frequency'), formatScaled(nyquist, 'frequency')]
  yield flag(
    one,
    'allowance-at-other-frequency',
    'at',
    `is judged at its own ${at}; the Nyquist frequency of the link is ${budget}.`,
    'Check that the limit belongs to this link and its rate.',
  )
  const what = mistake(atHz)
  if (what !== null) {
    yield flag(
      one,
      'usual-wrong-frequency',
      'at',
      `stands at ${at}: this is ${what}.`,
      'Look the frequency up in the source, and correct it if it was mistaken.',
    )
  }
}

function* beside(one: Judged): Generator<FlagDraft> {
  for (const { code, field, message, todo } of one.limit.remarks) yield flag(one, code, field, message, todo)
  const { channel } = one.evaluation
  const lacking = channel === null ? [] : [...channel.withoutBand, ...channel.withoutReflection]
  const which =
    lacking.length === 0
      ? 'its lines have no data over the band'
      : `${lacking.length} of its lines lack data over the band`
  if ((one.allowance.curve?.trim() ?? '') !== '' && !channel?.curve?.whole && !channel?.curve?.missed) {
    yield flag(
      one,
      'curve-not-judged',
      'curve',
      `has a limit curve that cannot be judged: ${which}.`,
      'Give every line between its planes a model or a file that reaches over the curve.',
    )
  }
  const { whole, worstDb = null } = channel?.returnLoss ?? { whole: false }
  const missesFloor = worstDb !== null && worstDb < (typedValue(LOSS, one.allowance.returnLossFloor) ?? 0)
  if (one.allowance.returnLossFloor !== null && !whole && !missesFloor) {
    yield flag(
      one,
      'floor-not-judged',
      'returnLossFloor',
      `asks for a return loss that cannot be judged: ${which}, reflections included.`,
      'Give every line between its planes a model or a file that knows its reflections.',
    )
  }
  yield* sumAgainstFit(one)
}

/** Sum and fitted cascade of the same lines may differ by this much before it is said (design rule of the comparison). */
const DIFFERS_DB = 0.5
const DIFFERS_SHARE = 0.03

function* sumAgainstFit(one: Judged): Generator<FlagDraft> {
  const { channel } = one.evaluation
  if (channel === null || channel.fittedDb === null) return
  const difference = channel.fittedDb - channel.coveredDb
  if (Math.abs(difference) <= Math.max(DIFFERS_DB, DIFFERS_SHARE * channel.coveredDb)) return
  yield flag(
    one,
    'cascade-differs',
    'limit',
    `adds up to ${channel.coveredDb.toFixed(2)} dB over the lines that can be joined, and their cascade, fitted, loses ${channel.fittedDb.toFixed(2)} dB.`,
    'Look for a resonance or a mismatch; the larger of the two is the careful one.',
  )
}

function flag(one: Judged, code: FlagDraft['code'], field: string, message: string, todo: string): FlagDraft {
  const { id } = one.evaluation
  return {
    code,
    section: 'allowances',
    id,
    field,
    message: `${nameOf('allowances', id, one.allowance)} ${message}`,
    todo,
  }
}
