import type { Evaluation } from '../../lib/budget/evaluation'
import { BasisStroke } from '../marks/BasisStroke'
import { decibels } from '../words/decibels'
import { BASIS_WORD } from '../words/terms'
import { basisRows } from './basisRows'
import css from './diagram.module.css'

/** Decibels by basis as a list beside or under a drawing. */
export function BasisList({ evaluation, allowance }: { evaluation: Evaluation; allowance: string }) {
  const rows = basisRows(evaluation, allowance)
  if (rows.length === 0) return null
  const most = Math.max(...rows.map((row) => row.db))
  return (
    <dl className={css.basisList}>
      {rows.map(({ basis, db }) => (
        <div key={basis}>
          <dt>{BASIS_WORD[basis]}</dt>
          <dd>
            <span>{decibels(db)} dB</span>
            <BasisStroke
              basis={basis === 'unsaid' ? null : basis}
              length={Math.max(Math.round((db / most) * 110), 3)}
            />
          </dd>
        </div>
      ))}
    </dl>
  )
}
