import type { AllowanceEvaluation } from '../../../../../lib/budget/evaluation'
import css from './builds.module.css'
import { layoutSpread, SPREAD, type SpreadColumn } from './layoutSpread'

const TITLE: Readonly<Record<SpreadColumn['key'], string>> = {
  nominal: 'nominal',
  rss: 'RSS, 3 σ',
  worst: 'worst case',
  random: 'random',
}

/** The landing once more: how deep the level lies by each way to look at the tolerances. The table beside it says the same. */
export function SpreadDrawing({ allowance }: { allowance: AllowanceEvaluation }) {
  const spread = layoutSpread(allowance)
  if (spread === null) return null
  const { columns, groundY } = spread
  const half = SPREAD.barWidth / 2
  return (
    <svg className={css.spread} viewBox={`0 0 ${SPREAD.width} ${SPREAD.height}`} aria-hidden="true" focusable="false">
      {groundY !== null && groundY < SPREAD.height && (
        <>
          <rect x={0} y={groundY} width={SPREAD.width} height={SPREAD.height - groundY} className={css.ground} />
          <path d={`M0 ${groundY}H${SPREAD.width}`} className={css.surface} />
          <text x={2} y={Math.min(groundY + 14, SPREAD.height - 3)} className={css.limit}>
            limit
          </text>
        </>
      )}
      {columns.map(({ key, x, band, bars }) => (
        <g key={key}>
          <text x={x} y={14} className={css.columnTitle}>
            {TITLE[key]}
          </text>
          {band && (
            <rect
              x={x - half / 2}
              y={band.top}
              width={half}
              height={Math.max(band.bottom - band.top, 1)}
              className={css.band}
            />
          )}
          {bars.map(({ y }, at) => (
            <path
              key={`${key} ${y}`}
              d={`M${x - half} ${y}h${SPREAD.barWidth}`}
              className={key === 'random' && at < bars.length - 1 ? css.tick : css.bar}
            />
          ))}
        </g>
      ))}
    </svg>
  )
}
