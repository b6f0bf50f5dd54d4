import type { AllowanceEvaluation, Evaluation } from '../../lib/budget/evaluation'
import type { Budget, Verdict } from '../../lib/budget/schema'
import { decibels, plainDecibels } from '../words/decibels'
import { cornerWords } from '../words/judged'
import { companionsOf, threeSigma } from './companions'
import type { Was } from './was'

export type LandingBar = {
  readonly id: string
  readonly verdict: Verdict
  readonly words: string
  readonly tone: 'signal' | 'corner'
  readonly x: number
  /** Where the bar lies; null where not even a part of the loss is known. */
  readonly y: number | null
  readonly figure: string
  /** Stands after the figure where it is no margin. */
  readonly suffix: '' | 'left'
  /** Upper and lower end of ±, px; null without tolerances. */
  readonly band: readonly [number, number] | null
  /** Undecided: from the bar to where it would touch the ground, the part that nobody knows. */
  readonly unknown: readonly [number, number] | null
}

export type LandingGeometry = {
  readonly width: number
  readonly height: number
  /** px per dB */
  readonly scale: number
  readonly surfaceY: number
  readonly requiredY: number | null
  readonly requiredWords: string
  readonly belowWords: string
  readonly bars: readonly LandingBar[]
  readonly was: { readonly x: number; readonly y: number; readonly words: string; readonly wordsY: number } | null
  /** Decibels above the ground at the upper and lower edge. */
  readonly span: readonly [number, number]
}

const MOST_BARS = 3

/**
 * The last decibels, enlarged: one bar for each judged condition of the same limit. Null where there is no limit.
 * @param size px; without words (the small picture of a list) the whole height is drawn
 */
export function layoutLanding(
  evaluation: Evaluation,
  budget: Budget,
  allowanceId: string,
  size: { readonly width: number; readonly height: number },
  was: Was | null = null,
): LandingGeometry | null {
  const allowance = evaluation.allowances.find((one) => one.id === allowanceId)
  if (!allowance || allowance.limitDb === null) return null
  const shown = [allowance, ...companionsOf(evaluation, allowance)].slice(0, MOST_BARS)
  const [high, low] = landingSpan(shown, was)
  const scale = size.height / (high - low)
  const y = (aboveGroundDb: number) => (high - aboveGroundDb) * scale
  const column = size.width / shown.length
  const bars = shown.map((one, at) =>
    barOf(one, budget, { x: column * (at + 0.32), tone: at === 0 ? 'signal' : 'corner', y }),
  )
  return {
    ...size,
    scale,
    surfaceY: y(0),
    requiredY: allowance.requiredMarginDb > 0 ? y(allowance.requiredMarginDb) : null,
    requiredWords: `${decibels(allowance.requiredMarginDb)} dB required`,
    belowWords: `below ${plainDecibels(allowance.limitDb)} dB`,
    bars,
    was: was && wasAt(was, bars[0], y(was.marginDb)),
    span: [high, low],
  }
}

/** Where a bar lies above the ground, or what is left where the loss is not whole. */
const standing = (allowance: AllowanceEvaluation) => allowance.marginDb ?? allowance.leftDb

/** Everything that must be seen, with air above and at least a seventh of ground. */
function landingSpan(shown: readonly AllowanceEvaluation[], was: Was | null): [number, number] {
  const edges = shown.flatMap((one) => {
    const at = standing(one)
    const sigma = one.marginDb === null ? 0 : (threeSigma(one) ?? 0)
    return at === null ? [] : [at - sigma, at + sigma]
  })
  const required = Math.max(0, ...shown.map((one) => one.requiredMarginDb))
  const highest = Math.max(required * 1.25, 0.5, was?.marginDb ?? 0, ...edges)
  const lowest = Math.min(0, was?.marginDb ?? 0, ...edges)
  const air = (highest - lowest) * 0.1
  return [highest + air, Math.min(lowest - air, -(highest - lowest) / 6)]
}

function barOf(
  allowance: AllowanceEvaluation,
  budget: Budget,
  at: { x: number; tone: LandingBar['tone']; y: (db: number) => number },
): LandingBar {
  const db = standing(allowance)
  const sigma = threeSigma(allowance)
  const whole = allowance.marginDb !== null
  return {
    id: allowance.id,
    verdict: allowance.verdict,
    words: cornerWords(allowance, budget),
    tone: at.tone,
    x: at.x,
    y: db === null ? null : at.y(db),
    figure: db === null ? '?' : decibels(db),
    suffix: db === null || whole ? '' : 'left',
    band: db !== null && whole && sigma !== null && sigma > 0 ? [at.y(db + sigma), at.y(db - sigma)] : null,
    unknown: db !== null && !whole ? [at.y(db), db > 0 ? at.y(0) : at.y(db) + 24] : null,
  }
}

/** The words keep clear of the figure that stands beside the bar. */
function wasAt(was: Was, bar: LandingBar | undefined, y: number): NonNullable<LandingGeometry['was']> {
  const barY = bar?.y ?? null
  const away = barY === null || Math.abs(y - barY) >= 22 ? y : y >= barY ? barY + 22 : barY - 22
  return { x: bar?.x ?? 0, y, words: `was ${decibels(was.marginDb)}`, wordsY: away + 4 }
}
