'use client'
import { BasisStroke } from '../../../../marks/BasisStroke'
import { TypicalWave } from '../../../../marks/TypicalWave'
import { decibels } from '../../../../words/decibels'
import { BASIS_WORD, PROOF_ORDER } from '../../../../words/terms'
import { useLook, useReading, useView } from '../state/contexts'
import css from './head.module.css'

/** How proven the loss of the allowance in view is: decibels by basis, and the lines that are only typical, by name. */
export function Proof() {
  const { budget, evaluation } = useReading()
  const { allowance: inView } = useView()
  const { goTo } = useLook()
  const allowance = evaluation.allowances.find(({ id }) => id === inView)
  if (!allowance) return null
  const shown = PROOF_ORDER.filter((basis) => allowance.byBasis[basis] !== 0)
  const typical = allowance.lines.filter(({ id }) => evaluation.lines[id]?.grade === 'typical')
  return (
    <dl className={css.proof} aria-label="How proven the numbers are">
      {shown.map((basis) => (
        <div key={basis}>
          <dt>
            <BasisStroke basis={basis === 'unsaid' ? null : basis} />
            {BASIS_WORD[basis]}
          </dt>
          <dd>{decibels(allowance.byBasis[basis])} dB</dd>
        </div>
      ))}
      {typical.length > 0 && (
        <div className={css.typical}>
          <dt>
            <TypicalWave />
            typical, not a maximum
          </dt>
          {typical.map(({ id }) => (
            <dd key={id}>
              <button
                type="button"
                className={css.plainButton}
                onClick={() => goTo({ section: 'lines', id, field: 'grade' })}
              >
                {budget.lines[id]?.name ?? 'line without a name'}
              </button>
            </dd>
          ))}
        </div>
      )}
    </dl>
  )
}
