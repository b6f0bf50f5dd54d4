'use client'
import { type ReactNode, useId } from 'react'
import type { AllowanceEvaluation, Evaluation } from '../../../../../lib/budget/evaluation'
import { judgedWords } from '../../../../words/judged'
import { useReading, useView } from '../state/contexts'
import { useWhole } from '../state/useWhole'
import css from './whole.module.css'
import { wholeWords } from './wholeWords'

type Props = {
  readonly title: string
  /** Of the allowance in view, as the full evaluation has it. */
  readonly children: (allowance: AllowanceEvaluation, evaluation: Evaluation) => ReactNode
}

/** A part of the worksheet that shows the full evaluation of the allowance in view, with where that evaluation stands. */
export function WholePanel({ title, children }: Props) {
  const { budget } = useReading()
  const { allowance: inView } = useView()
  const whole = useWhole()
  const id = useId()
  const allowance = whole.evaluation?.allowances.find((each) => each.id === inView)
  const words = wholeWords(whole)
  return (
    <section className={css.panel} aria-labelledby={id} aria-busy={whole.working}>
      <h2 id={id}>{title}</h2>
      {inView === null && (
        <p className={css.quiet}>There is no allowance yet, so there are no planes to look between.</p>
      )}
      {inView !== null && words !== null && (
        <p
          className={whole.failed === null ? css.quiet : css.failed}
          role={whole.failed === null ? undefined : 'alert'}
        >
          {words}
        </p>
      )}
      {whole.evaluation && allowance && (
        <>
          <p className={css.quiet}>{[allowance.name, judgedWords(allowance, budget)].filter(Boolean).join(' · ')}</p>
          {children(allowance, whole.evaluation)}
        </>
      )}
    </section>
  )
}
