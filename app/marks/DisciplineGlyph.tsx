import type { Owner } from '../../lib/budget/schema'
import { OWNER_WORD } from '../words/terms'
import { Mark } from './Mark'
import css from './marks.module.css'

/** Outlines in a box of 14 × 14 px, so that no discipline is told by its colour alone. */
export const GLYPH_PATH: Readonly<Record<Owner, string>> = {
  system: 'M7 1.5l4.8 2.75v5.5L7 12.5 2.2 9.75v-5.5z',
  hardware: 'M2.2 2.2h9.6v9.6H2.2z',
  silicon: 'M7 1.2L12.8 7 7 12.8 1.2 7z',
  package: 'M7 1.8l5.6 10H1.4z',
  layout: 'M12.2 7A5.2 5.2 0 1 1 1.8 7a5.2 5.2 0 0 1 10.4 0z',
  interconnect: 'M5 1.6h4V5h3.4v4H9v3.4H5V9H1.6V5H5z',
  test: 'M12.2 7A5.2 5.2 0 1 1 1.8 7a5.2 5.2 0 0 1 10.4 0zM9.4 7A2.4 2.4 0 1 0 4.6 7a2.4 2.4 0 0 0 4.8 0z',
  supplier: 'M1.8 8.6a5.2 5.2 0 0 1 10.4 0z',
}

type Props = {
  readonly owner: Owner
  /** Filled: signed or answering. Outline: not yet. */
  readonly filled?: boolean
  readonly size?: number
  readonly named?: boolean
}

export function DisciplineGlyph({ owner, filled = true, size = 14, named = false }: Props) {
  return (
    <Mark className={css.glyph} width={size} height={size} box={[14, 14]} label={named ? OWNER_WORD[owner] : null}>
      <GlyphShape owner={owner} filled={filled} />
    </Mark>
  )
}

/** The bare shape, for drawings that place it themselves. */
export function GlyphShape({ owner, filled = true }: { owner: Owner; filled?: boolean }) {
  return (
    <path
      d={GLYPH_PATH[owner]}
      fillRule="evenodd"
      className={`${filled ? css.filled : css.outline} ${css[`d-${owner}`]}`}
    />
  )
}
