'use client'
import { decibels, frequencyWords } from '../../../../words/decibels'
import { useReading, useView } from '../state/contexts'
import css from './detail.module.css'

/** The line's decibels, as they count in the allowance in view; outside it, at the Nyquist frequency. */
export function LineFigure({ id }: { id: string }) {
  const { evaluation } = useReading()
  const { allowance: inView } = useView()
  const allowance = evaluation.allowances.find((each) => each.id === inView)
  const counted = allowance?.lines.find((line) => line.id === id)
  const loss = evaluation.lines[id]?.loss
  const db = counted ? counted.countedDb : (loss?.nominalDb ?? null)
  const atHz = counted ? (allowance?.atHz ?? null) : (loss?.atHz ?? null)
  const lane = counted ? (allowance?.judged.lane ?? null) : null
  return (
    <p className={css.figure}>
      {db === null ? '?' : decibels(db)}
      {db !== null && <span className={css.unit}> dB</span>}
      <span className={css.at}>
        {[atHz !== null && frequencyWords(atHz), lane !== null && `lane ${lane}`].filter(Boolean).join(' · ')}
      </span>
    </p>
  )
}
