import type { AllowanceEvaluation } from '../../lib/budget/evaluation'
import { StrokePath } from '../marks/BasisStroke'
import { decibels } from '../words/decibels'
import { BASIS_WORD, PROOF_ORDER } from '../words/terms'
import css from './diagram.module.css'
import { px } from './path'

const HEIGHT = 18
const AIR = 3

/** Decibels by basis, end to end in their strokes, against a post where the limit stands; the figures under it. */
export function BasisStrip({ allowance, width }: { allowance: AllowanceEvaluation; width: number }) {
  const rows = PROOF_ORDER.map((basis) => ({ basis, db: allowance.byBasis[basis] })).filter((row) => row.db > 0)
  if (rows.length === 0) return null
  const sum = rows.reduce((total, row) => total + row.db, 0)
  const scale = (width - 6) / Math.max(sum, allowance.limitDb ?? 0)
  let x = 0
  return (
    <div className={css.strip}>
      <svg width={width} height={HEIGHT} viewBox={`0 0 ${width} ${HEIGHT}`} aria-hidden="true">
        {rows.map(({ basis, db }) => {
          const from = x
          x += db * scale
          const length = Math.max(db * scale - AIR, 1.5)
          return (
            <StrokePath
              key={basis}
              basis={basis === 'unsaid' ? null : basis}
              d={`M${px(from)} ${HEIGHT / 2}h${px(length)}`}
              length={length}
            />
          )
        })}
        {allowance.limitDb !== null && (
          <path d={`M${px(allowance.limitDb * scale + 1.5)} 0V${HEIGHT}`} className={css.limitPost} />
        )}
      </svg>
      <p>{rows.map(({ basis, db }) => `${decibels(db)} ${BASIS_WORD[basis]}`).join(' · ')}</p>
    </div>
  )
}
