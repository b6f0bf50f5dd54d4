import type { Asked } from '../../budget/context'
import type { Evaluation } from '../../budget/evaluation'
import type { Budget } from '../../budget/schema'
import type { Evaluator } from '../../sync/evaluator'
import { answer } from './answer'
import { EvidenceLibrary } from './library'
import type { Answer, Question } from './message'
import { EvaluationQueue } from './queue'

export type OpenEvaluator = Evaluator & {
  /** Without the files of this server: of a budget that is stored nowhere, nobody knows whose files it names. */
  evaluateAlone(budget: Budget, asked: Asked): Promise<Evaluation>
  close(): Promise<void>
}

/** The thread's bundle lies beside the server's. */
const BUNDLE = 'evaluation.mjs'

/** @param directory of the evidence files */
export function openEvaluator(directory: string): OpenEvaluator {
  const bundled = import.meta.url.endsWith('.mjs')
  return bundled ? new EvaluationQueue(new URL(BUNDLE, import.meta.url), directory) : inProcess(directory)
}

/** From its sources, as tests start the server, there is no bundle for a thread. */
function inProcess(directory: string): OpenEvaluator {
  const library = new EvidenceLibrary(directory)
  const ask = async (question: Omit<Question, 'id'>): Promise<Answer> => {
    const found = await answer(library, { ...question, id: 0 })
    if ('failed' in found) throw new Error(found.failed)
    return found
  }
  const whole = async (budget: Budget, asked: Asked, files: boolean) => {
    const found = await ask({ budget, asked, files })
    if (!('evaluation' in found)) throw new Error('No evaluation came.')
    return found.evaluation
  }
  return {
    evaluate: (budget, asked) => whole(budget, asked, true),
    evaluateAlone: (budget, asked) => whole(budget, asked, false),
    async margins(budget) {
      const found = await ask({ budget, asked: null, files: true })
      if (!('margins' in found)) throw new Error('No margins came.')
      return found.margins
    },
    async close() {},
  }
}
