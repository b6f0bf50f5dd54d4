import { evaluate, WHOLE } from '../../../../../lib/budget/evaluate'
import type { EvidenceNetwork } from '../../../../../lib/budget/evaluation'
import type { EvidenceLibrary } from './library'
import type { Answer, Question } from './message'

/** Answers one question; an error is told and stops nothing. */
export async function answer(library: EvidenceLibrary, question: Question): Promise<Answer> {
  const { id, budgetId } = question
  try {
    if ('file' in question) return { id, network: copyOf(await library.find(budgetId, question.file)) }
    return { id, evaluation: evaluate(question.budget, await library.of(budgetId, question.budget), WHOLE) }
  } catch (error) {
    return { id, failed: error instanceof Error ? error.message : String(error) }
  }
}

/** What can be handed over to the page with an answer instead of being copied there. */
export function handedOver(given: Answer): ArrayBuffer[] {
  if (!('network' in given) || !given.network || 'problem' in given.network) return []
  const { hz, s, reference } = given.network.network
  return [hz, s, reference].map(({ buffer }) => buffer).filter((buffer) => buffer instanceof ArrayBuffer)
}

/** The page's own copy: the worker keeps one to evaluate with. */
function copyOf(read: EvidenceNetwork | null): EvidenceNetwork | null {
  if (read === null || 'problem' in read) return read
  const { ports, hz, s, reference } = read.network
  return { network: { ports, hz: hz.slice(), s: s.slice(), reference: reference.slice() } }
}
