import type { Budget } from '../../../../../lib/budget/schema'
import { EvidenceReader } from './reader'
import { EvaluationThread, type StartThread } from './thread'
import { WholeEvaluation } from './whole'

/** What the page has done off its main thread for one budget. */
export type Evaluator = {
  readonly evidence: EvidenceReader
  readonly whole: WholeEvaluation
  /** Follows the budget: its files are read, and it is evaluated in full while somebody looks. */
  show(budget: Budget): void
  close(): void
}

export function openEvaluator(budgetId: string, start: StartThread): Evaluator {
  const thread = new EvaluationThread(budgetId, start)
  const evidence = new EvidenceReader((file) => thread.read(file))
  const whole = new WholeEvaluation((budget) => thread.evaluate(budget))
  let shown: Budget | null = null
  const follow = () => {
    if (shown) whole.show(shown, evidence.getSnapshot())
  }
  const unsubscribe = evidence.subscribe(follow)
  return {
    evidence,
    whole,
    show(budget) {
      shown = budget
      evidence.show(budget)
      follow()
    },
    close() {
      unsubscribe()
      whole.stopPause()
      thread.close()
    },
  }
}
