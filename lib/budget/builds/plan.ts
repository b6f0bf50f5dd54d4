import { sigmaOf } from '../../channel/statistics'
import { type BuildLine, ownLines, type Variation } from './buildLine'
import type { Response } from './response'
import { BLOCK, type CommonSources, type LaneSources, type Source } from './source'

/** Standard deviations in dB of what follows one source, towards more loss of the whole and towards less. */
export type Term = { readonly source: Source; readonly rectangular: boolean; up: number; down: number }

/** A response with the source of each parameter, and what its change is multiplied by: the line's sign is in it. */
export type Change = { readonly response: Response; readonly sources: readonly Source[]; readonly times: number }

/** What makes up the loss of one lane: a constant, what it has in common with the other lanes, and what is its own. */
export type LanePlan = {
  readonly lane: number
  readonly constant: number
  readonly commonTerms: readonly Term[]
  readonly commonChanges: readonly Change[]
  readonly ownSources: readonly Source[]
  readonly ownTerms: readonly Term[]
  readonly ownChanges: readonly Change[]
}

/** Fields that every hole has for itself; any other parameter is one process, common to its group. */
const DRAWN_PER_LANE: ReadonlySet<string> = new Set(['stub'])

export function lanePlan(lines: readonly BuildLine[], lane: number, common: CommonSources, own: LaneSources): LanePlan {
  const alone = ownLines(lines)
  let constant = 0
  let squares = 0
  const commonTerms = new Map<string, Term>()
  const ownTerms: Term[] = []
  const commonChanges: Change[] = []
  const ownChanges: Change[] = []
  for (const line of lines) {
    const variation = line.lanes.get(lane) ?? line
    constant += line.sign * variation.nominalDb
    const sigma = sigmasOf(variation, line.sign)
    const rectangular = variation.meaning === 'anywhere'
    if (sigma.up > 0 || sigma.down > 0) {
      if (!alone.has(line.id)) addTerm(commonTerms, common.get(line.group), line.group, rectangular, sigma)
      else if (sigma.up === sigma.down && !rectangular) {
        // Normal deviates that nothing else follows add up to one normal deviate.
        squares += sigma.up * sigma.up
        own.mention(line.id)
      } else ownTerms.push(termOf(own.get(line.id), rectangular, sigma))
    }
    if (variation.response === null) continue
    const { of: response, times } = variation.response
    let onlyCommon = true
    const sources = response.varied.map(({ field }) => {
      const perLane = alone.has(line.id) || DRAWN_PER_LANE.has(field)
      if (perLane) onlyCommon = false
      return perLane ? own.get(`${line.id}: ${field}`) : common.get(`${line.group}: ${field}`)
    })
    const changes = onlyCommon ? commonChanges : ownChanges
    changes.push({ response, sources, times: line.sign * times })
  }
  if (squares > 0) {
    const together = Math.sqrt(squares)
    ownTerms.push(termOf(own.together(), false, { up: together, down: together }))
  }
  const terms = [...commonTerms.values()]
  return { lane, constant, commonTerms: terms, commonChanges, ownSources: own.all, ownTerms, ownChanges }
}

/** Whether anything is drawn for this lane alone. */
export function variesAlone(plan: LanePlan): boolean {
  return plan.ownTerms.length > 0 || plan.ownChanges.length > 0
}

type Sigmas = { readonly up: number; readonly down: number }

/** Of the whole: an overlap that is smaller than it should be takes less away. */
function sigmasOf({ minusDb, plusDb, meaning, spreadDb }: Variation, sign: 1 | -1): Sigmas {
  const low = sigmaOf(minusDb, meaning) + spreadDb / 3
  const high = sigmaOf(plusDb, meaning) + spreadDb / 3
  return sign > 0 ? { up: high, down: low } : { up: low, down: high }
}

/** Inside a group everything follows the same deviate, so the standard deviations add up. */
function addTerm(terms: Map<string, Term>, source: Source, group: string, rectangular: boolean, sigma: Sigmas): void {
  const key = `${rectangular}/${group}`
  const known = terms.get(key)
  if (!known) {
    terms.set(key, termOf(source, rectangular, sigma))
    return
  }
  known.up += sigma.up
  known.down += sigma.down
}

function termOf(source: Source, rectangular: boolean, { up, down }: Sigmas): Term {
  if (rectangular) source.rectangular ??= new Float64Array(BLOCK)
  return { source, rectangular, up, down }
}
