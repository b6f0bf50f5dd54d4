import { WAVE } from '../marks/TypicalWave'
import css from './diagram.module.css'
import type { Label } from './geometry'
import { pathOf, px } from './path'
import { FIGURE_SIZE } from './placeLabels'

/** Decibels over their stretch of the level. */
export function Labels({ labels, selected }: { labels: readonly Label[]; selected: string | null }) {
  return (
    <>
      {labels.map((label) => {
        const top = label.y - FIGURE_SIZE[label.size]
        return (
          <g key={label.id}>
            {label.leader && <path d={pathOf(label.leader)} className={css.leader} />}
            <text
              x={px(label.x)}
              y={px(label.y)}
              className={`${css.figure_} ${css[label.size]} ${label.id === selected ? css.chosen : ''}`}
            >
              {label.figure}
            </text>
            {label.typical && (
              <path d={WAVE} transform={`translate(${px(label.x - 7)} ${px(top - 5)})`} className={css.wave} />
            )}
            {label.name && (
              <text x={px(label.x)} y={px(top - (label.typical ? 10 : 2))} className={css.name}>
                {label.name}
              </text>
            )}
          </g>
        )
      })}
    </>
  )
}
