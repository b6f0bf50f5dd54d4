'use client'
import { useEffect, useState, useSyncExternalStore } from 'react'
import type { EvidenceData } from '../../../../../lib/budget/evaluation'
import type { Budget } from '../../../../../lib/budget/schema'
import { type Evaluator, openEvaluator } from '../evaluation/evaluator'
import { NOTHING_READ } from '../evaluation/reader'
import { startWorker } from '../evaluation/startWorker'
import type { WholeEvaluation } from '../evaluation/whole'

type Evaluating = {
  /** The networks in the budget's files, as far as they have been read. */
  readonly networks: EvidenceData
  /** Null until the page lives. */
  readonly whole: WholeEvaluation | null
}

const noSubscription = () => () => {}
const nothing = () => NOTHING_READ

/** Keeps a worker beside the page that follows the budget. */
export function useEvaluator(budgetId: string, budget: Budget): Evaluating {
  const [evaluator, setEvaluator] = useState<Evaluator | null>(null)
  useEffect(() => {
    const opened = openEvaluator(budgetId, startWorker)
    setEvaluator(opened)
    return () => {
      setEvaluator(null)
      opened.close()
    }
  }, [budgetId])
  useEffect(() => evaluator?.show(budget), [evaluator, budget])
  const { evidence, whole } = evaluator ?? { evidence: null, whole: null }
  const { networks } = useSyncExternalStore(
    evidence?.subscribe ?? noSubscription,
    evidence?.getSnapshot ?? nothing,
    nothing,
  )
  return { networks, whole }
}
