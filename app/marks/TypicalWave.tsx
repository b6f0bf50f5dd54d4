import { Mark } from './Mark'
import css from './marks.module.css'

/** 'Typical': a value that could swell. Stands before the word, or alone over the number. */
export function TypicalWave({ named = false }: { named?: boolean }) {
  return (
    <Mark className={css.wave} width={14} height={8} label={named ? 'typical, not a maximum' : null}>
      <path d={WAVE} />
    </Mark>
  )
}

/** Path of the wave in a box of 14 × 8 px. */
export const WAVE = 'M1 5.6C3 1 5 1.4 7 4s4 3.4 6-1.6'
