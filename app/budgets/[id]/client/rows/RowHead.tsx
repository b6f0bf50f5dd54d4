'use client'
import type { KeyboardEvent, ReactNode } from 'react'
import { Standing, standingColour } from '../slips/Aside'
import slips from '../slips/slips.module.css'
import { type Selected, useBench, useLook } from '../state/contexts'
import { usePlace } from '../state/usePlace'
import { RowHeader } from './parts'
import css from './rows.module.css'
import { useCurrent } from './useCurrent'

type Props = Selected & {
  readonly label: string
  readonly children: ReactNode
  readonly onRemove: () => void
}

/** The head of a row: selects it, opens its detail, and removes it on Delete. */
export function RowHead({ section, id, label, children, onRemove }: Props) {
  const { canWrite, standing } = useBench()
  const { openDetail, select } = useLook()
  const key = rowKey({ section, id })
  const others = usePlace(standing, key) ?? []
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'Delete' && canWrite) onRemove()
    else if (event.key === 'Enter' || event.key === ' ') openDetail(true)
    else return
    event.preventDefault()
  }
  return (
    <RowHeader
      tabIndex={useCurrent(key) ? 0 : -1}
      className={`${css.cell} ${css.head} ${slips.standing}`}
      data-target=""
      data-place={key}
      data-standing={standingColour(others)}
      onKeyDown={onKeyDown}
      onClick={() => {
        select({ section, id })
        openDetail(true)
      }}
    >
      <span className="unseen">{label}</span>
      <span aria-hidden="true">{children}</span>
      <span aria-hidden="true" className={css.more}>
        detail
      </span>
      <Standing others={others} />
    </RowHeader>
  )
}

/** The place of a row as a whole: a record without a field. */
export const rowKey = ({ section, id }: Selected) => `${section}/${id}/`
