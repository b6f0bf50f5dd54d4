'use client'
import type { KeyboardEvent, ReactNode } from 'react'
import { useLook } from '../state/contexts'
import { Cell } from './parts'
import css from './rows.module.css'
import { useCurrent } from './useCurrent'

type Props = {
  readonly id: string
  /** Field of the line, or 'flags'. */
  readonly field: string
  readonly label: string
  readonly className?: string
  readonly children: ReactNode
}

/** A cell that shows what the detail holds; Enter or a click leads there. */
export function GoCell({ id, field, label, className = '', children }: Props) {
  const { goTo } = useLook()
  const key = `lines/${id}/${field}@row`
  const go = () => goTo({ section: 'lines', id, field })
  return (
    <Cell
      tabIndex={useCurrent(key) ? 0 : -1}
      className={`${css.cell} ${css.text} ${className}`}
      data-target={field}
      data-place={key}
      onClick={go}
      onKeyDown={(event: KeyboardEvent) => {
        if (event.key !== 'Enter' && event.key !== ' ' && event.key !== 'F2') return
        event.preventDefault()
        go()
      }}
    >
      <span className="unseen">{label} </span>
      <span className={css.value}>{children}</span>
    </Cell>
  )
}
