import type { Present } from '../../lib/sheet/wire'
import { Mark } from './Mark'
import css from './marks.module.css'

type Person = Pick<Present, 'name' | 'initials' | 'colour' | 'me'>

/** Five colours, repeated from the sixth person on: the initials are the code. */
export const personColour = (colour: number): 1 | 2 | 3 | 4 | 5 =>
  ((((Math.trunc(colour) % 5) + 5) % 5) + 1) as 1 | 2 | 3 | 4 | 5

/** A person, as a pennant with initials; own initials are underlined. */
export function Pennant({ person, named = true }: { person: Person; named?: boolean }) {
  const name = person.me ? `${person.name} (you)` : person.name
  return (
    <Mark className={css.pennant} width={34} height={20} label={named ? name : null}>
      {named && <title>{name}</title>}
      <PennantShape person={person} />
    </Mark>
  )
}

/** The bare flag in a box of 34 × 20 px, for drawings that place it themselves. */
export function PennantShape({ person }: { person: Person }) {
  return (
    <g className={css[`p-${personColour(person.colour)}`]}>
      <path d="M0 0h34l-6 10 6 10H0z" fill="currentColor" />
      <text
        x={14}
        y={14.4}
        textAnchor="middle"
        className={css.initials}
        textDecoration={person.me ? 'underline' : undefined}
      >
        {person.initials}
      </text>
    </g>
  )
}
