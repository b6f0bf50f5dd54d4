import type { Verdict } from '../schema'
import { linesWord, plainDb } from './words'

/** What the verdict of an allowance in one lane rests on. Decibels, in the judged conditions. */
export type Facts = {
  readonly limit: number | null
  readonly requiredMargin: number
  /** Least loss; null: none asked for. */
  readonly leastLoss: number | null
  /** The known losses; the lowest of them, for the least loss. */
  readonly known: number
  readonly lowest: number
  readonly undecidedLines: number
  readonly overlapUndecided: boolean
  /** Why nothing can be compared with the limit, in sentences. */
  readonly blocked: readonly string[]
  /** What is missed beside the loss (a limit curve, a return-loss floor), as half sentences. */
  readonly missed: readonly string[]
  /** What cannot be judged beside the loss: 'limit curve', 'return loss'. */
  readonly unknown: readonly string[]
  /** 'at 12.8906 GHz' where the limit does not stand at the Nyquist frequency, else 'at Nyquist'. */
  readonly where: string
  readonly atNyquist: boolean
}

export type Judgement = { readonly verdict: Verdict; readonly words: string; readonly reasons: readonly string[] }

/** Sums of decimal fractions are off by some 1e-14 dB. */
const EXACT = 1e-9

/** The verdict of design rule and word list: over, else undecided, else tight, else inside. */
export function verdictOf(facts: Facts): Judgement {
  const { limit, known, undecidedLines, blocked } = facts
  const place = facts.atNyquist ? '' : ` ${facts.where}`
  if (limit === null || blocked.length > 0) {
    const reasons = blocked.length > 0 ? blocked : ['the allowance has no limit']
    return { verdict: 'undecided', words: `undecided: ${reasons[0]}`, reasons }
  }
  if (known > limit + EXACT && !facts.overlapUndecided) {
    const although =
      undecidedLines === 0
        ? ''
        : ` although ${linesWord(undecidedLines)} ${undecidedLines === 1 ? 'is' : 'are'} undecided`
    return { verdict: 'over', words: `over by ${plainDb(known - limit)} dB${place}${although}`, reasons: [] }
  }
  if (undecidedLines > 0) {
    const left = `${plainDb(known)} of ${plainDb(limit)} dB used, ${plainDb(limit - known)} dB left for ${linesWord(undecidedLines)}`
    const overlap = `${plainDb(known)} of ${plainDb(limit)} dB used before an overlap without a number`
    return { verdict: 'undecided', words: `undecided${place}: ${known > limit + EXACT ? overlap : left}`, reasons: [] }
  }
  return decided(facts, limit - known, place)
}

function decided(facts: Facts, margin: number, place: string): Judgement {
  const { requiredMargin, leastLoss, lowest, unknown } = facts
  const unknownWords = unknown.length === 0 ? '' : `; ${unknown.join(' and ')} unknown`
  const missed: string[] = []
  if (margin < requiredMargin - EXACT) {
    missed.push(`${plainDb(margin)} dB left where ${plainDb(requiredMargin)} dB are required`)
  }
  if (leastLoss !== null && lowest < leastLoss - EXACT) {
    missed.push(`${plainDb(leastLoss - lowest)} dB under the least loss of ${plainDb(leastLoss)} dB`)
  }
  missed.push(...facts.missed)
  if (missed.length > 0) {
    return { verdict: 'tight', words: `tight${place}: ${missed.join('; ')}${unknownWords}`, reasons: missed }
  }
  const where = unknown.length > 0 || !facts.atNyquist ? ` ${facts.where}` : ''
  return { verdict: 'inside', words: `inside${where}${unknownWords}`, reasons: [] }
}

const WORST_FIRST: readonly Verdict[] = ['over', 'undecided', 'tight', 'inside']

/** Negative where a is worse than b. */
export function compareVerdicts(a: Verdict, b: Verdict): number {
  return WORST_FIRST.indexOf(a) - WORST_FIRST.indexOf(b)
}

/** The worst of the allowances; undecided with none. */
export function worstVerdict(verdicts: readonly Verdict[]): Verdict {
  return [...verdicts].sort(compareVerdicts)[0] ?? 'undecided'
}
