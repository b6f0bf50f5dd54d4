import type { Verdict } from '../../lib/budget/schema'
import { VERDICT_WORD } from '../words/terms'
import { Mark } from './Mark'
import css from './marks.module.css'
import colour from './verdictColour.module.css'

type Props = {
  readonly verdict: Verdict
  /** Height of the mark in px; the word is set by its surroundings. */
  readonly size?: number
  /** Without the word beside it, the mark names itself. */
  readonly word?: boolean | string
  readonly stacked?: boolean
}

const GROUND = <path d="M1 13h26v2H1zM5 15l-2 3M24 15l-2 3" className={css.ground} />
const SHAPE: Readonly<Record<Verdict, React.ReactNode>> = {
  inside: (
    <>
      <path d="M8 1h12v6H8z" />
      {GROUND}
    </>
  ),
  tight: (
    <>
      <path d="M8 7h12v6H8z" />
      {GROUND}
    </>
  ),
  over: (
    <>
      <path d="M1 7h26v2H1zM5 9l-2 3M24 9l-2 3" className={css.ground} />
      <path d="M8 9h12v6H8z" />
    </>
  ),
  undecided: (
    <>
      <path d="M1 13h7v2H1zM20 13h7v2h-7zM12 13h4v2h-4z" />
      <path d="M11.2 4.6c0-3.8 5.6-3.8 5.6-.6 0 1.9-2.8 2-2.8 4.2M14 9.9v1.5" className={css.question} />
    </>
  ),
}

/** Where the bar lies: clear of the ground, resting on it, under it; or the ground is broken. */
export function VerdictMark({ verdict, size = 18, word = true, stacked = false }: Props) {
  const text = typeof word === 'string' ? word : VERDICT_WORD[verdict]
  return (
    <span className={`${css.verdict} ${colour[verdict]} ${stacked ? css.stacked : ''}`}>
      <Mark
        label={word === false ? text : null}
        width={(size * 28) / 18}
        height={size}
        box={[28, 18]}
        fill="currentColor"
      >
        {SHAPE[verdict]}
      </Mark>
      {word !== false && <span className={css.word}>{text}</span>}
    </span>
  )
}
