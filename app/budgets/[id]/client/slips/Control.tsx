'use client'
import { type KeyboardEvent, useRef } from 'react'
import { useReading } from '../state/contexts'
import { optionsOf } from './options'
import css from './slips.module.css'
import type { SlipSpec } from './spec'
import type { Slip } from './useSlip'

type Props = {
  readonly spec: SlipSpec
  readonly slip: Slip
  readonly id?: string
  /** Named here where no visible label stands beside it. */
  readonly name?: string
  readonly describedBy?: string
  /** After Enter or Escape: where the focus goes is the surroundings' matter. */
  readonly onDone?: () => void
}

/** What is typed into: one line, a choice or a note. Taken on Enter or on leaving it, restored on Escape; never per key. */
export function Control(props: Props) {
  if (props.spec.kind === 'choice') return <Choice {...props} />
  return props.spec.kind === 'note' ? <Note {...props} /> : <OneLine {...props} />
}

function shared({ slip, id, name, describedBy }: Props) {
  return {
    id,
    'aria-label': name,
    'aria-describedby': describedBy,
    'aria-invalid': slip.draft?.reason ? true : undefined,
    'data-unsaved': slip.unsaved ? '' : undefined,
  }
}

/** Enter takes and Escape restores, in every control; `stop` keeps the rows from acting on the same key. */
function doneKeys({ slip, onDone }: Props, event: KeyboardEvent): boolean {
  if (event.nativeEvent.isComposing) return false
  if (event.key !== 'Enter' && event.key !== 'Escape') return false
  event.preventDefault()
  event.stopPropagation()
  if (event.key === 'Escape') slip.restore()
  if (event.key === 'Escape' || slip.commit()) onDone?.()
  return true
}

function OneLine(props: Props) {
  const { slip } = props
  return (
    <input
      {...shared(props)}
      className={css.input}
      type="text"
      value={slip.text}
      spellCheck={false}
      autoComplete="off"
      enterKeyHint="done"
      onChange={(event) => slip.type(event.target.value)}
      onKeyDown={(event) => doneKeys(props, event)}
      onBlur={() => slip.commit()}
    />
  )
}

function Note(props: Props) {
  const { slip } = props
  return (
    <textarea
      {...shared(props)}
      className={css.note}
      rows={3}
      value={slip.text}
      onChange={(event) => slip.type(event.target.value)}
      onKeyDown={(event) => {
        if (event.key !== 'Enter' || event.ctrlKey || event.metaKey) doneKeys(props, event)
      }}
      onBlur={() => slip.commit()}
    />
  )
}

/**
 * A native list. Chosen with the pointer it is taken at once; with the arrow keys, which change a closed list at each
 * press, it is taken on Enter or on leaving.
 */
function Choice(props: Props) {
  const { spec, slip } = props
  const { budget } = useReading()
  const byKeys = useRef(false)
  const place = spec.places[0]
  const [section, field] =
    place.section === 'laneValues'
      ? (['lines', place.field.split('/')[1] ?? ''] as const)
      : ([place.section, place.field] as const)
  return (
    <select
      {...shared(props)}
      className={css.select}
      value={slip.text}
      onPointerDown={() => {
        byKeys.current = false
      }}
      onKeyDown={(event) => {
        if (!doneKeys(props, event)) byKeys.current = true
      }}
      onChange={(event) => {
        slip.type(event.target.value)
        if (!byKeys.current && slip.commit()) props.onDone?.()
      }}
      onBlur={() => slip.commit()}
    >
      {optionsOf(budget, section, field, slip.text).map(({ value, label }) => (
        <option key={value} value={value}>
          {label}
        </option>
      ))}
    </select>
  )
}
