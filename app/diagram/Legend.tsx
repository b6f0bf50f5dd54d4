import type { Evaluation } from '../../lib/budget/evaluation'
import { StrokePath } from '../marks/BasisStroke'
import { decibels } from '../words/decibels'
import { BASIS_WORD } from '../words/terms'
import { basisRows } from './basisRows'
import css from './diagram.module.css'
import type { Box, LevelGeometry } from './geometry'
import { LEGEND_ROW } from './layoutLevels'
import { px } from './path'

const BAR = 130

/** Decibels by basis in the free sky, each in its own stroke, to one scale. */
export function Legend({
  box,
  geometry,
  evaluation,
  allowance,
}: {
  box: Box
  geometry: LevelGeometry
  evaluation: Evaluation
  allowance: string
}) {
  const rows = basisRows(evaluation, allowance)
  const most = Math.max(...rows.map((row) => row.db))
  const right = box.x + box.width
  return (
    <>
      {rows.map(({ basis, db }, at) => {
        const y = box.y + (at + 0.7) * LEGEND_ROW
        const length = Math.max((db / most) * BAR, 3)
        return (
          <g key={basis}>
            <text x={px(box.x)} y={px(y)} className={css.legend}>
              {BASIS_WORD[basis]}
            </text>
            <text x={px(right - BAR - 14)} y={px(y)} className={css.legendFigure}>
              {decibels(db)} dB
            </text>
            <StrokePath
              basis={basis === 'unsaid' ? null : basis}
              d={`M${px(right - BAR)} ${px(y - 4.5)}h${px(length)}`}
              length={length}
            />
          </g>
        )
      })}
      {geometry.companions.map((one, at) => {
        const y = box.y + (rows.length + at + 0.7) * LEGEND_ROW
        return (
          <g key={one.id}>
            <text x={px(box.x)} y={px(y)} className={css.legend}>
              {one.words}
            </text>
            <path d={`M${px(right - BAR)} ${px(y - 4.5)}h40`} className={css.companion} />
          </g>
        )
      })}
    </>
  )
}
