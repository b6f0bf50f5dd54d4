'use client'
import { besideWords } from '../../../../words/beside'
import { frequencyWords } from '../../../../words/decibels'
import { useReading } from '../state/contexts'
import css from './detail.module.css'

/** How a line's loss was found, and what is to be seen beside it without counting, at the Nyquist frequency. */
export function Beside({ id }: { id: string }) {
  const { evaluation } = useReading()
  const line = evaluation.lines[id]
  if (!line || line.loss.nominalDb === null || line.loss.atHz === null) return null
  const { loss, lane } = line
  return (
    <section aria-label="Beside the loss" className={css.aside}>
      <p className={css.quiet}>
        {[`At ${frequencyWords(line.loss.atHz)}`, lane !== null && `lane ${lane}`].filter(Boolean).join(', ')}
      </p>
      <dl className={css.terms}>
        {besideWords(loss).map(({ term, value }) => (
          <div key={term}>
            <dt>{term}</dt>
            <dd>{value}</dd>
          </div>
        ))}
      </dl>
    </section>
  )
}
