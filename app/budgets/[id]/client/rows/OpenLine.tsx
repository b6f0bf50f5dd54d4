'use client'
import { type FormEvent, useId, useState } from 'react'
import { addRow } from '../deeds/channel'
import { inOrder } from '../deeds/records'
import { useBench, useLook, useReading, useView } from '../state/contexts'
import { type OpenLineContext, readOpenLine } from '../typed/openLine'
import { recordName } from '../words/say'
import css from './openLine.module.css'
import { statedAt } from './statedAt'

/** The last row: typed as one would say it, understood or asked back before it is added. */
export function OpenLine() {
  const { budget, evaluation } = useReading()
  const { canWrite, edit, read } = useBench()
  const { selected, allowance } = useView()
  const { select } = useLook()
  const [typed, setTyped] = useState('')
  const [refused, setRefused] = useState<string | null>(null)
  const id = useId()
  if (!canWrite) return null

  const above = selected && !budget[selected.section][selected.id]?.removed ? selected : null
  const context: OpenLineContext = {
    assemblies: named(budget.assemblies),
    lossClasses: named(budget.lossClasses),
    at: statedAt(budget, evaluation, allowance),
    assembly: above?.section === 'lines' ? (budget.lines[above.id]?.assembly ?? null) : null,
  }
  const line = typed.trim() === '' ? null : readOpenLine(typed, context)
  const where = above ? `below ${recordName(budget, above.section, above.id)}` : 'at the end of the channel'

  const add = (event: FormEvent) => {
    event.preventDefault()
    if (!line) return
    if ('reason' in line) return setRefused(line.reason)
    const added = addRow(read(), above?.id ?? null, line.row)
    const reason = edit(added.operations)
    setRefused(reason)
    if (reason !== null) return
    setTyped('')
    select({ section: line.row.section, id: added.id })
  }

  return (
    <form className={css.form} onSubmit={add}>
      <label htmlFor={id} className={css.label}>
        New line or plane, {where}
      </label>
      <div className={css.row}>
        <input
          id={id}
          className={css.input}
          value={typed}
          placeholder="via 0.60 dB · trace 5 in × 0.95 dB/in · reserve 1 dB temperature · plane RX ball"
          spellCheck={false}
          autoComplete="off"
          enterKeyHint="done"
          aria-invalid={refused !== null || undefined}
          aria-describedby={`${id}-says`}
          onChange={(event) => {
            setTyped(event.target.value)
            setRefused(null)
          }}
          onKeyDown={(event) => {
            if (event.key === 'Escape') setTyped('')
          }}
        />
        <button type="submit" className={css.add}>
          Add
        </button>
      </div>
      <p id={`${id}-says`} className={css.says} data-refused={refused !== null || undefined}>
        {refused ?? (line === null ? '' : 'says' in line ? `Adds ${line.says}.` : line.reason)}
      </p>
    </form>
  )
}

function named(records: Readonly<Record<string, { order: string; removed: boolean; name: string | null }>>) {
  return inOrder(records).map(([id, record]) => ({ id, name: record.name ?? '' }))
}
