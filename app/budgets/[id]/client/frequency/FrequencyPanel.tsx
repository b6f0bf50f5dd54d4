'use client'
import type { AllowanceEvaluation, Evaluation } from '../../../../../lib/budget/evaluation'
import { useReading } from '../state/contexts'
import { WholePanel } from '../whole/WholePanel'
import css from '../whole/whole.module.css'
import { LackingList } from './LackingList'
import { withoutBand } from './lacking'
import { nothingWords } from './nothingWords'
import { OverFrequency } from './OverFrequency'

/** The allowance in view over frequency: the two-ports between its planes, joined. */
export function FrequencyPanel() {
  return (
    <WholePanel title="Over frequency">
      {(allowance, evaluation) =>
        allowance.channel === null ? (
          <Nothing allowance={allowance} evaluation={evaluation} />
        ) : (
          <OverFrequency allowance={allowance} channel={allowance.channel} evaluation={evaluation} />
        )
      }
    </WholePanel>
  )
}

function Nothing({ allowance, evaluation }: { allowance: AllowanceEvaluation; evaluation: Evaluation }) {
  const { budget } = useReading()
  const lacking = withoutBand(budget, allowance)
  return (
    <div className={css.words}>
      <p>{nothingWords(budget, evaluation, allowance, lacking.length)}</p>
      <LackingList title="Without data over the band" lines={lacking} />
    </div>
  )
}
