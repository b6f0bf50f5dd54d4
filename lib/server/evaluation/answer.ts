import { AT_NYQUIST, evaluate } from '../../budget/evaluate'
import { margins } from '../../budget/margins'
import type { EvidenceLibrary } from './library'
import type { Answer, Question } from './message'

/** Evaluates one budget with its files; an error is told and stops nothing. */
export async function answer(library: EvidenceLibrary, { id, budget, asked, files }: Question): Promise<Answer> {
  try {
    const evidence = files ? await library.of(budget) : new Map()
    if (asked === null) return { id, margins: margins(evaluate(budget, evidence, AT_NYQUIST)) }
    return { id, evaluation: evaluate(budget, evidence, asked) }
  } catch (error) {
    return { id, failed: error instanceof Error ? (error.stack ?? error.message) : String(error) }
  }
}
