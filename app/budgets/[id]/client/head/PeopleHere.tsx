'use client'
import type { Present } from '../../../../../lib/sheet/wire'
import { Pennant } from '../../../../marks/Pennant'
import css from './head.module.css'
import { onePerPerson } from './onePerPerson'

/** Who has the budget open now, oneself last. */
export function PeopleHere({ people }: { people: readonly Present[] }) {
  const here = onePerPerson(people)
  if (here.length === 0) return null
  return (
    <ul aria-label="People here" className={css.people}>
      {here.map((person) => (
        <li key={person.connection}>
          <Pennant person={person} />
        </li>
      ))}
    </ul>
  )
}
