'use client'
import { useState } from 'react'
import type { SectionName } from '../../../../../lib/budget/schema'
import type { RefusedEdit } from '../../../../../lib/sheet/session/types'
import { useReading } from '../state/contexts'
import { labelOf } from '../words/labels'
import { recordName } from '../words/say'
import css from './refused.module.css'

/** Values that the server did not take, with what was typed and why: to be entered again or let go. */
export function RefusedList({ refused }: { refused: readonly RefusedEdit[] }) {
  if (refused.length === 0) return null
  return (
    <section className={css.panel} aria-label="Not taken">
      <h2>Not taken</h2>
      <ul className={css.list}>
        {refused.map((edit) => (
          <RefusedItem key={edit.id} edit={edit} />
        ))}
      </ul>
    </section>
  )
}

function RefusedItem({ edit }: { edit: RefusedEdit }) {
  const { budget } = useReading()
  const [again, setAgain] = useState<string | null>(null)
  const enter = () => {
    const result = edit.enterAgain()
    setAgain(result.ok ? null : result.reason)
  }
  return (
    <li>
      {edit.parts.slice(0, 4).map(({ place, typed }) => {
        const section: 'head' | SectionName = place.section === 'laneValues' ? 'lines' : place.section
        return (
          <p key={`${place.section} ${place.id} ${place.field}`}>
            <strong>{recordName(budget, section, place.id)}</strong>, {labelOf(place.section, place.field)}: you typed{' '}
            <q>{typed || 'nothing'}</q>
          </p>
        )
      })}
      <p>{again ?? edit.reason}</p>
      <button type="button" onClick={enter}>
        Enter again
      </button>
      <button type="button" onClick={() => edit.dismiss()}>
        Let it go
      </button>
    </li>
  )
}
