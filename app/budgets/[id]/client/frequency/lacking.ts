import type { AllowanceEvaluation } from '../../../../../lib/budget/evaluation'
import type { Budget, Line } from '../../../../../lib/budget/schema'
import { byTerms } from '../typed/modelParameters'
import { recordName } from '../words/say'

/** A line that keeps the cascade from saying all, and what to give. */
export type Lacking = { readonly id: string; readonly name: string; readonly give: string }

/** Lines that are not in the cascade: a number at one frequency is none over the band. */
export function withoutBand(budget: Budget, allowance: AllowanceEvaluation): readonly Lacking[] {
  const { channel, lines } = allowance
  const ids = channel?.withoutBand ?? lines.map(({ id }) => id).filter((id) => holdsAtOneFrequency(budget, id))
  return ids.map((id) => lacking(budget, id, bandWords))
}

/** Lines that are in it by their attenuation only. */
export function withoutReflection(budget: Budget, { channel }: AllowanceEvaluation): readonly Lacking[] {
  return (channel?.withoutReflection ?? []).map((id) => lacking(budget, id, reflectionWords))
}

/** Why there is no return loss, with every line that it fails on by name. */
export function noReflectionWords(budget: Budget, allowance: AllowanceEvaluation): string {
  const { channel } = allowance
  const ids = [...(channel?.withoutBand ?? []), ...(channel?.withoutReflection ?? [])]
  const names = ids.map((id) => recordName(budget, 'lines', id))
  return `Unknown: ${names.length === 1 ? 'this line has' : 'these lines have'} no reflection data: ${names.join(', ')}.`
}

function lacking(budget: Budget, id: string, wordsOf: (budget: Budget, line: Line) => string): Lacking {
  const line = budget.lines[id]
  return { id, name: recordName(budget, 'lines', id), give: line ? wordsOf(budget, line) : 'it was taken out' }
}

function holdsAtOneFrequency(budget: Budget, id: string): boolean {
  const line = budget.lines[id]
  if (!line || line.kind === 'reserve' || line.kind === 'overlap') return false
  switch (line.model) {
    case null:
    case 'stated':
      return true
    case 'class':
      return !classHasPoints(budget, line)
    case 'per-length':
      return !byTerms(line)
    case 'cable':
      return !byTerms(line) || hasEnds(line)
    default:
      return false
  }
}

const classHasPoints = (budget: Budget, { lossClass }: Line) =>
  lossClass !== null && (budget.lossClasses[lossClass]?.points?.trim() ?? '') !== ''

const hasEnds = ({ endLossA, endLossB }: Line) => endLossA !== null || endLossB !== null

function bandWords(budget: Budget, line: Line): string {
  if (line.kind === 'overlap') return 'a part that is counted twice is no piece of the channel'
  switch (line.model) {
    case null:
      return 'say how its loss is found'
    case 'stated':
      return 'its number holds at one frequency; give points over frequency, a network file, or a model that computes it'
    case 'class':
      return classHasPoints(budget, line)
        ? 'the points of its loss class do not reach over the band; add some below and above'
        : 'its loss class holds at one frequency; give the class points over frequency'
    case 'per-length':
      return byTerms(line)
        ? 'its terms do not reach over the band'
        : 'its number holds at one frequency; give √f and f terms with the range that they hold in'
    case 'cable':
      if (byTerms(line) && hasEnds(line)) return 'its ends hold at one frequency; make a line of each end'
      return 'its number holds at one frequency; give terms with the range that they hold in, and a line for each end'
    case 'table':
      return 'its points do not reach over the band; add some below and above'
    case 'network':
      return 'its file is not read, or does not reach over the band'
    default:
      return 'its model gives no number, or does not hold over the band; see what is flagged on it'
  }
}

function reflectionWords(_budget: Budget, line: Line): string {
  switch (line.model) {
    case 'class':
    case 'per-length':
    case 'table':
      return 'give its impedance, delay and length'
    case 'cable':
      return 'give its impedance and delay, and a line for each end'
    case 'network':
      return 'loss per length knows no reflections; give a cross-section, or the file as a long uniform line'
    default:
      return 'its model knows no reflections'
  }
}
