import type { CSSProperties, ReactNode } from 'react'
import type { Evaluation } from '../../lib/budget/evaluation'
import { StrokePath } from '../marks/BasisStroke'
import { PennantShape, personColour } from '../marks/Pennant'
import { Basement } from './Basement'
import css from './diagram.module.css'
import type { LevelGeometry, Piece, Point } from './geometry'
import { Labels } from './Labels'
import { Legend } from './Legend'
import { pathOf, px } from './path'
import { Shelves } from './Shelves'
import { Staffs } from './Staffs'
import type { Was } from './was'

type Props = {
  readonly id: string
  readonly geometry: LevelGeometry
  readonly evaluation: Evaluation
  readonly allowance: string
  readonly was: Was | null
}

/** The level diagram's marks, back to front; what it says is in the group around it. */
export function LevelDrawing({ id, geometry, evaluation, allowance, was }: Props) {
  const { plot, selected, required, band, pieces, joints, gaps, flags, surface } = geometry
  const within = pieces.filter((piece) => piece.place === 'inside')
  return (
    <>
      {selected && <rect {...selected} className={css.selected} />}
      {required && <rect {...required} fill={`url(#${id}-air)`} />}
      <Basement id={id} geometry={geometry} />
      {surface &&
        joints.map(({ x, y }) => <path key={x} d={`M${px(x)} ${px(y)}V${px(surface.y)}`} className={css.drop} />)}
      {band.length > 0 && <path d={pathOf(band, true)} className={css.band} />}
      <Shelves shelves={geometry.shelves} />
      {geometry.companions.map((one) => (
        <path key={one.id} d={pathOf(one.points)} className={css.companion} />
      ))}
      {geometry.was && (
        <g key={was?.words} className={`${css.leaving} ${css[`p-${personColour(was?.colour ?? 0)}`]}`}>
          <path d={pathOf(geometry.was.points)} className={css.was} />
          {geometry.was.wordsAt && <Words lines={geometry.was.words} at={geometry.was.wordsAt} />}
        </g>
      )}
      {gaps.map((gap) => (
        <g key={gap.id}>
          <rect x={px(gap.x)} y={px(gap.y)} width={px(gap.width)} height={px(gap.height)} fill={`url(#${id}-gap)`} />
          <path
            d={`M${px(gap.x)} ${px(gap.y)}v${px(gap.height)}m${px(gap.width)} 0v${px(-gap.height)}`}
            className={css.gapEdge}
          />
          <text x={px(gap.mark.x)} y={px(gap.mark.y)} className={css.unknown}>
            ?
          </text>
        </g>
      ))}
      {pieces.map((piece) => (
        <Moved key={`${piece.id} ${was?.marginDb}`} from={geometry.was?.before.get(piece.id)}>
          <Stretch piece={piece} />
        </Moved>
      ))}
      <Staffs geometry={geometry} />
      {joints.map(({ x, y }, at) => (
        <circle key={x} cx={px(x)} cy={px(y)} r={at === 0 || at === within.length ? 3.6 : 3} className={css.joint} />
      ))}
      <Labels labels={geometry.labels} selected={pieces.find((piece) => piece.id === chosen(geometry))?.id ?? null} />
      {geometry.legend && (
        <Legend box={geometry.legend} geometry={geometry} evaluation={evaluation} allowance={allowance} />
      )}
      {flags.map((flag) => (
        <g key={flag.person.connection} className={css[`p-${personColour(flag.person.colour)}`]}>
          <path d={pathOf(flag.staff)} className={css.pole} />
          <g transform={`translate(${px(flag.x)} ${px(flag.y)})`}>
            <PennantShape person={flag.person} />
          </g>
        </g>
      ))}
      {within.length === 0 && (
        <text x={px(plot.x + plot.width / 2)} y={px(plot.y + plot.height / 2)} className={css.empty}>
          No lines between the planes yet
        </text>
      )}
    </>
  )
}

const chosen = (geometry: LevelGeometry) =>
  geometry.pieces.find((piece) => geometry.selected !== null && piece.from.x === geometry.selected.x)?.id ?? null

/** One line of the level in the stroke of its basis; outside the allowance it is pale and thin. */
function Stretch({ piece }: { piece: Piece }) {
  if (piece.countedDb === null) return null
  const d = pathOf([piece.from, piece.to])
  if (piece.place !== 'inside') return <path d={d} className={css.outside} />
  return (
    <StrokePath basis={piece.basis} d={d} length={Math.hypot(piece.to.x - piece.from.x, piece.to.y - piece.from.y)} />
  )
}

/** After another person's change the level settles from where it was; own edits leave no trace and do not move. */
function Moved({ from, children }: { from: string | undefined; children: ReactNode }) {
  if (from === undefined) return children
  return (
    <g className={css.settling} style={{ '--before': from } as CSSProperties}>
      {children}
    </g>
  )
}

function Words({ lines, at }: { lines: readonly string[]; at: Point }) {
  return lines.map((line, row) => (
    <text key={line} x={px(at.x)} y={px(at.y + row * 15)} className={css.wasWords}>
      {line}
    </text>
  ))
}
