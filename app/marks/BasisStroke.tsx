import type { Basis } from '../../lib/budget/schema'
import { BASIS_WORD } from '../words/terms'
import { Mark } from './Mark'
import css from './marks.module.css'
import { strokeShape } from './strokes'

type Props = {
  readonly basis: Basis | null
  /** px */
  readonly length?: number
  /** Names itself; leave false where the word stands beside it. */
  readonly named?: boolean
}

/** One stroke of a basis, level, as it stands in rows, in decibels by basis and in the legend. */
export function BasisStroke({ basis, length = 28, named = false }: Props) {
  const word = BASIS_WORD[basis ?? 'unsaid']
  return (
    <Mark className={css.stroke} width={length} height={8} label={named ? word : null}>
      <StrokePath basis={basis} d={`M0 4H${length}`} length={length} />
    </Mark>
  )
}

/** The same stroke along any path; a hollow one is the thick stroke with its core taken out. */
export function StrokePath({ basis, d, length }: { basis: Basis | null; d: string; length: number }) {
  const shape = strokeShape(basis, length)
  const line = {
    d,
    fill: 'none',
    strokeWidth: shape.width,
    strokeDasharray: shape.dash?.join(' '),
    strokeLinecap: shape.round ? ('round' as const) : ('butt' as const),
  }
  return (
    <>
      <path {...line} className={css.line} />
      {shape.hollow && <path d={d} fill="none" strokeWidth={shape.width - 3} className={css.core} />}
    </>
  )
}
