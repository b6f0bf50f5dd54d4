'use client'
import { useLook } from '../state/contexts'
import css from '../whole/whole.module.css'
import type { Lacking } from './lacking'

/** Lines that lack data, with what to give and the way there; nothing where none does. */
export function LackingList({ title, lines }: { title: string; lines: readonly Lacking[] }) {
  const { goTo } = useLook()
  if (lines.length === 0) return null
  return (
    <div>
      <h3 className={css.part}>{title}</h3>
      <ul className={css.lines}>
        {lines.map(({ id, name, give }) => (
          <li key={id}>
            <button
              type="button"
              className={css.plainButton}
              onClick={() => goTo({ section: 'lines', id, field: 'model' })}
            >
              {name}
            </button>
            : {give}
          </li>
        ))}
      </ul>
    </div>
  )
}
