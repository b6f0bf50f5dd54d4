'use client'
import type { SectionName } from '../../../../../lib/budget/schema'
import { useLook, useReading } from '../state/contexts'
import { labelOf } from '../words/labels'
import css from './detail.module.css'

/** What to look at on one record, with what to do about it. */
export function FlagList({ section, id }: { section: SectionName; id: string }) {
  const { evaluation } = useReading()
  const { goTo } = useLook()
  const flags = evaluation.flags.filter((flag) => flag.section === section && flag.id === id)
  if (flags.length === 0) return null
  return (
    <ul
      className={css.flagList}
      data-place={`${section}/${id}/flags`}
      tabIndex={-1}
      aria-label="To look at on this row"
    >
      {flags.map((flag) => (
        <li key={`${flag.code} ${flag.field} ${flag.message}`} data-severity={flag.severity}>
          <strong>{flag.severity}</strong> {flag.message} {flag.todo}
          {flag.field !== null && (
            <button type="button" className={css.plainButton} onClick={() => goTo({ section, id, field: flag.field })}>
              Go to {labelOf(section, flag.field)}
            </button>
          )}
        </li>
      ))}
    </ul>
  )
}
