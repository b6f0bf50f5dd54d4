import type { AllowanceEvaluation } from '../../../../../lib/budget/evaluation'
import type { Budget } from '../../../../../lib/budget/schema'
import { fieldsOf } from '../../../../../lib/sheet/layout'
import { plainDecibels } from '../../../../words/decibels'
import { labelOf } from '../words/labels'
import { recordName } from '../words/say'

export type Builds = NonNullable<AllowanceEvaluation['builds']>
type Fraction = NonNullable<Builds['fractionInside']>

/** How many builds stay inside, of whole builds and not of lanes, with what the number of trials leaves open. */
export function insideWords({ fractionInside, lanes }: Builds, limitDb: number | null): string {
  if (fractionInside === null || limitDb === null) return 'There is no limit that builds could be held against.'
  const who = lanes > 1 ? `Of one build, all ${lanes} lanes stay` : 'A build stays'
  return `${who} within ${plainDecibels(limitDb)} dB in ${fractionWords(fractionInside)}.`
}

/** The lane that alone is inside least often; empty where there is one lane, or no limit. */
export function worstLaneWords({ worstLane, lanes }: Builds): string {
  if (worstLane === null || lanes < 2) return ''
  return `Lane ${worstLane.lane} alone, the one least often inside: ${fractionWords(worstLane.fractionInside)}.`
}

export function trialsWords({ trials, seed, unknown }: Builds): string {
  const drawn = `${grouped(trials)} builds drawn at random, seed ${seed}: the same seed draws the same builds.`
  return unknown === 0 ? drawn : `${drawn} ${grouped(unknown)} of them gave no number and count as not inside.`
}

/** Why no builds were drawn. */
export function noBuildsWords({ undecidedLines, reasons, atHz, lines }: AllowanceEvaluation): string {
  if (lines.length === 0) return 'No builds: there is no line between the planes.'
  if (undecidedLines.length > 0) {
    const count = undecidedLines.length
    return `No builds: ${count} ${count === 1 ? 'line has' : 'lines have'} no number yet, and a build needs all of them.`
  }
  if (atHz === null) return 'No builds: the frequency is not known.'
  return `No builds: ${reasons[0] ?? 'a line has no number in one of the lanes'}.`
}

/** 'Backplane', 'pair gap of Backplane', 'stub of BGA via': what is drawn, by what it is drawn for. */
export function sourceWords(budget: Budget, source: string): string {
  const [, holder = source, field = null] = /^(.*): ([A-Za-z0-9]+)$/.exec(source) ?? []
  const known = field !== null && fieldsOf('lines').includes(field)
  const name = groupName(budget, known ? holder : source)
  return known ? `${labelOf('lines', field)} of ${name}` : name
}

function groupName(budget: Budget, group: string): string {
  if (budget.assemblies[group]) return recordName(budget, 'assemblies', group)
  return budget.lines[group] ? recordName(budget, 'lines', group) : `group '${group}'`
}

/** @returns such as '98.63 % of builds (95 % interval 98.56 to 98.70 %)' */
export function fractionWords({ value, low, high }: Fraction): string {
  return `${percent(value)} % of builds (95 % interval ${percent(low)} to ${percent(high)} %)`
}

/** Two decimals; what is not all of it never reads as all of it, nor what is something as nothing. */
function percent(share: number): string {
  const text = (100 * share).toFixed(2)
  if (share < 1 && text === '100.00') return 'over 99.99'
  return share > 0 && text === '0.00' ? 'under 0.01' : text
}

/** A count in groups of three, parted by spaces that do not break: a comma could be a decimal one. */
export function grouped(count: number): string {
  return String(count).replace(/\B(?=(\d{3})+$)/g, '\u00a0')
}
