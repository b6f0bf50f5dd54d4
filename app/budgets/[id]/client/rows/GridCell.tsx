'use client'
import { type KeyboardEvent, type ReactNode, useId, useRef } from 'react'
import { flushSync } from 'react-dom'
import { Aside, Standing, standingColour } from '../slips/Aside'
import { Control } from '../slips/Control'
import slips from '../slips/slips.module.css'
import type { SlipSpec } from '../slips/spec'
import { useSlip } from '../slips/useSlip'
import { Cell } from './parts'
import css from './rows.module.css'
import { useCurrent } from './useCurrent'

type Props = {
  readonly spec: SlipSpec
  /** Name of the record, for those who do not see the row. */
  readonly of: string
  /** What the cell shows when nobody types in it; else the text as typed. */
  readonly children?: ReactNode
  readonly className?: string
  /** A white slip, or text that opens when it is asked to. */
  readonly look: 'slip' | 'text'
}

/** One cell of the rows: shows, and turns into a control on Enter, F2, a click or the first letter typed. */
export function GridCell({ spec, of, children, className = '', look }: Props) {
  const slip = useSlip(spec)
  const cell = useRef<HTMLDivElement>(null)
  const current = useCurrent(spec.key)
  const aside = `${useId()}-aside`

  const begin = (text: string, caret: 'all' | 'end') => {
    if (!slip.canWrite) return
    flushSync(() => slip.type(text))
    const control = cell.current?.querySelector<HTMLInputElement | HTMLSelectElement>('input, select')
    control?.focus()
    if (control instanceof HTMLInputElement) {
      control.setSelectionRange(caret === 'all' ? 0 : text.length, text.length)
    } else if (caret === 'all') openList(control)
  }

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'Tab') slip.commit()
    if (event.target !== event.currentTarget) return
    if (event.key === 'Enter' || event.key === 'F2') begin(spec.text, 'all')
    else if (event.key === 'Backspace' || event.key === 'Delete') begin('', 'end')
    else if (isTyped(event)) begin(spec.kind === 'choice' ? spec.text : event.key, 'end')
    else return
    event.preventDefault()
  }

  return (
    <Cell
      ref={cell}
      tabIndex={current ? 0 : -1}
      className={`${css.cell} ${css[look]} ${slips.standing} ${className}`}
      data-target={spec.places[0].field}
      data-place={spec.key}
      data-standing={standingColour(slip.others)}
      data-editing={slip.draft ? '' : undefined}
      data-unsaved={slip.unsaved ? '' : undefined}
      aria-readonly={!slip.canWrite}
      onKeyDown={onKeyDown}
      onClick={(event) => {
        if (!slip.draft && event.target instanceof Node && cell.current?.contains(event.target)) begin(spec.text, 'all')
      }}
    >
      {slip.draft ? (
        <Control
          spec={spec}
          slip={slip}
          name={`${spec.label} of ${of}`}
          describedBy={aside}
          onDone={() => cell.current?.focus()}
        />
      ) : (
        <>
          <span className="unseen">{spec.label} </span>
          <span className={css.value}>
            {children ?? (spec.text || <span className={css.empty}>{spec.label}</span>)}
          </span>
        </>
      )}
      <Standing others={slip.others} />
      <Aside slip={slip} id={aside} floating />
    </Cell>
  )
}

const isTyped = (event: KeyboardEvent) =>
  event.key.length === 1 && event.key !== ' ' && !event.ctrlKey && !event.metaKey && !event.altKey

/** Not every browser can open a native list by itself; there it opens at the next key or click. */
function openList(control: HTMLSelectElement | null | undefined) {
  try {
    control?.showPicker()
  } catch {
    control?.focus()
  }
}
