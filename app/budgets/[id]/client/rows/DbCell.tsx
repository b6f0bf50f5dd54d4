'use client'
import { BasisStroke } from '../../../../marks/BasisStroke'
import { TypicalWave } from '../../../../marks/TypicalWave'
import { decibels } from '../../../../words/decibels'
import { Cell } from './parts'
import type { LineFacts } from './rowFacts'
import css from './rows.module.css'

/** Longest bar, px. */
const BAR = 64

/** Decibels with a bar in their own stroke, all to one scale: the longest broken bar is the line to attack. */
export function DbCell({ facts, scaleDb }: { facts: LineFacts; scaleDb: number }) {
  const { basis, db, grade, outside } = facts
  if (db === null) {
    return (
      <Cell className={`${css.db} ${css.unknown}`}>
        <span className={css.figure} aria-hidden="true">
          ?
        </span>
        <span className={css.under}>no number</span>
      </Cell>
    )
  }
  const length = scaleDb > 0 ? Math.max(4, Math.round((Math.abs(db) / scaleDb) * BAR)) : 4
  return (
    <Cell className={css.db}>
      <span className={css.figure}>
        {grade === 'typical' && <TypicalWave named />}
        {outside ? `(${decibels(db)})` : decibels(db)}
        <span className="unseen"> dB</span>
      </span>
      <BasisStroke basis={basis} length={length} />
    </Cell>
  )
}
