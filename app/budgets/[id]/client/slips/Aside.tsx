'use client'
import type { Present } from '../../../../../lib/sheet/wire'
import { Pennant, personColour } from '../../../../marks/Pennant'
import css from './slips.module.css'
import type { Slip } from './useSlip'

/** Under a slip: why it was not taken, and what another person has made of it meanwhile. `floating`: over the rows below. */
export function Aside({ slip, id, floating = false }: { slip: Slip; id: string; floating?: boolean }) {
  const reason = slip.draft?.reason ?? null
  if (reason === null && slip.meanwhile === null) return null
  return (
    <span id={id} className={`${css.aside} ${floating ? css.floating : ''}`}>
      {reason !== null && (
        <span role="alert" className={css.reason}>
          {reason}
        </span>
      )}
      {slip.meanwhile !== null && (
        <span className={css.meanwhile}>
          {slip.meanwhile === '' ? 'Somebody has emptied it meanwhile.' : `Meanwhile it says: ${slip.meanwhile}`}
        </span>
      )}
    </span>
  )
}

/** The pennant of whoever stands on the slip; it hangs outside, so that it never covers what is typed. */
export function Standing({ others }: { others: readonly Present[] }) {
  const first = others[0]
  if (!first) return null
  return (
    <span className={css.pennants} data-colour={personColour(first.colour)}>
      {others.slice(0, 3).map((person) => (
        <Pennant key={person.connection} person={person} />
      ))}
    </span>
  )
}

/** Colour of the outline of an occupied slip, for `data-standing`. */
export function standingColour(others: readonly Present[]): number | undefined {
  return others[0] && personColour(others[0].colour)
}
