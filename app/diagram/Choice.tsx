import type { KeyboardEvent } from 'react'
import { pieceWords } from './describe'
import css from './diagram.module.css'
import type { LevelGeometry } from './geometry'
import { px } from './path'

type Props = {
  readonly geometry: LevelGeometry
  readonly selected: string | null
  readonly onSelect: (line: string) => void
  /** px of the picture that it lies over */
  readonly width: number
}

const STEP: Readonly<Record<string, number>> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 }

/** The lines as one choice over the drawing: a click or the arrow keys select; one stop for the Tab key. */
export function Choice({ geometry, selected, onSelect, width }: Props) {
  const { pieces, height } = geometry
  if (pieces.length === 0) return null
  const stop = Math.max(
    pieces.findIndex((piece) => piece.id === selected),
    0,
  )

  const move = (event: KeyboardEvent<HTMLDivElement>) => {
    const to =
      event.key === 'Home'
        ? 0
        : event.key === 'End'
          ? pieces.length - 1
          : event.key in STEP
            ? stop + (STEP[event.key] ?? 0)
            : null
    const piece = to === null ? undefined : pieces[Math.min(Math.max(to, 0), pieces.length - 1)]
    if (event.key === 'Enter' || event.key === ' ') onSelect(pieces[stop]?.id ?? '')
    else if (!piece) return
    else {
      onSelect(piece.id)
      event.currentTarget.querySelector<SVGGElement>(`[data-line="${piece.id}"]`)?.focus()
    }
    event.preventDefault()
  }

  return (
    <div
      className={css.overlay}
      role="listbox"
      aria-label="Lines, from the transmitter"
      aria-orientation="horizontal"
      tabIndex={-1}
      onKeyDown={move}
    >
      <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="presentation">
        {pieces.map((piece, at) => (
          <g
            key={piece.id}
            data-line={piece.id}
            role="option"
            aria-selected={piece.id === selected}
            aria-label={pieceWords(piece)}
            tabIndex={at === stop ? 0 : -1}
            className={css.choice}
            onClick={() => onSelect(piece.id)}
          >
            <title>{pieceWords(piece)}</title>
            <rect x={px(piece.from.x)} y={22} width={px(Math.max(piece.to.x - piece.from.x, 1))} height={height - 24} />
          </g>
        ))}
      </svg>
    </div>
  )
}
