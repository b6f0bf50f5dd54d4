import type { AllowanceEvaluation } from '../../lib/budget/evaluation'
import type { Budget } from '../../lib/budget/schema'
import { decibels, plainDecibels, signedDecibels } from './decibels'
import { STATISTIC_WORD } from './terms'

type Judged = Pick<AllowanceEvaluation, 'id' | 'judged'>

/** The corner's name, or the temperature of the reference corner: a margin never stands without it. */
export function cornerWords(allowance: Judged, budget: Budget): string {
  const corner = budget.corners[allowance.judged.corner]
  if (corner) return [corner.name?.trim() || 'corner', corner.temperature].filter(Boolean).join(', ')
  return budget.head.referenceTemperature ?? allowance.judged.corner
}

/** Such as 'lane 11, the worst of 16'; empty where the link has one lane. */
export function laneWords(allowance: Judged, budget: Budget): string {
  const { lane, lanes } = allowance.judged
  if (lanes <= 1) return ''
  if (lane === null) return `all ${lanes} lanes alike`
  const chosen = budget.allowances[allowance.id]?.judgedLane ?? null
  return chosen === null ? `lane ${lane}, the worst of ${lanes}` : `lane ${lane} of ${lanes}`
}

/** Corner, statistic and lane, as they stand beside every verdict. */
export function judgedWords(allowance: Judged, budget: Budget): string {
  const parts = [
    cornerWords(allowance, budget),
    STATISTIC_WORD[allowance.judged.statistic],
    laneWords(allowance, budget),
  ]
  return parts.filter(Boolean).join(' · ')
}

/** What the judged corner did to the sum, and what of it no corner can move; empty in the reference corner. */
export function movedWords({ judged }: Judged): string {
  const { movedDb, unmovedDb } = judged
  if (movedDb === null) return ''
  const moved = `the corner moves ${signedDecibels(movedDb)} dB`
  return unmovedDb === null || unmovedDb === 0 ? moved : `${moved}; ${decibels(unmovedDb)} dB cannot be moved`
}

export type Headline = { readonly figure: string; readonly unit: string; readonly sentence: string }

/** The number of an allowance with what it is: a margin, or what is left for the lines that have no number yet. */
export function headline(allowance: AllowanceEvaluation): Headline {
  const { limitDb, marginDb, leftDb, knownDb, undecidedLines, lines } = allowance
  if (limitDb === null) return { figure: '?', unit: '', sentence: 'This allowance has no limit yet.' }
  const limit = plainDecibels(limitDb)
  if (marginDb !== null) {
    const loss = decibels(allowance.lossDb ?? knownDb)
    return { figure: decibels(marginDb), unit: 'dB margin', sentence: `${loss} of ${limit} dB used` }
  }
  const missing = undecidedLines.length
  const known = lines.length - missing
  const without = `${missing} ${missing === 1 ? 'line' : 'lines'} without a number`
  if (leftDb === null) return { figure: '?', unit: '', sentence: missing > 0 ? without : 'No number can be given yet.' }
  const used = `${decibels(knownDb)} of ${limit} dB used by the other ${known}`
  const sentence = missing > 0 ? `${without}; ${used}` : `${decibels(knownDb)} of ${limit} dB used`
  return leftDb < 0
    ? { figure: decibels(leftDb), unit: 'dB, and more to come', sentence }
    : { figure: decibels(leftDb), unit: 'dB left', sentence }
}
