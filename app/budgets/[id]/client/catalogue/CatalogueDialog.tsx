'use client'
import { type KeyboardEvent, type ReactNode, useEffect, useId, useRef, useState } from 'react'
import css from './catalogue.module.css'
import { EntryItem } from './EntryItem'
import { type CatalogueRow, matching } from './row'

type Props<E> = {
  readonly title: string
  /** What holds for every entry. */
  readonly caution: string
  readonly rows: readonly CatalogueRow<E>[]
  readonly problem: string | null
  /** @returns whether it was taken; the catalogue then closes */
  readonly onTake: (entry: E) => boolean
  readonly onRemove: (id: string) => void
  /** After it has closed, with the focus back where it was opened. */
  readonly onClosed: (taken: boolean) => void
}

/** A catalogue to choose from, over the page. Typing filters; the arrow keys go through what is left; Escape closes. */
export function CatalogueDialog<E>({ title, caution, rows, problem, onTake, onRemove, onClosed }: Props<E>): ReactNode {
  const dialog = useRef<HTMLDialogElement>(null)
  const input = useRef<HTMLInputElement>(null)
  const taken = useRef(false)
  const [filter, setFilter] = useState('')
  const id = useId()
  useEffect(() => {
    if (!dialog.current?.open) dialog.current?.showModal()
    input.current?.focus()
  }, [])
  const found = matching(rows, filter)
  const take = (entry: E) => {
    taken.current = onTake(entry)
    if (taken.current) dialog.current?.close()
  }
  const onKeyDown = (event: KeyboardEvent) => {
    // What is typed here is no key of the worksheet.
    event.stopPropagation()
    const step = event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0
    if (step === 0) return
    event.preventDefault()
    const stops = [...event.currentTarget.querySelectorAll<HTMLElement>('input, [data-take]')]
    const at = stops.indexOf(document.activeElement as HTMLElement)
    stops[Math.min(stops.length - 1, Math.max(0, at + step))]?.focus()
  }
  return (
    <dialog
      ref={dialog}
      className={css.dialog}
      aria-labelledby={`${id}-title`}
      onKeyDown={onKeyDown}
      onClose={() => onClosed(taken.current)}
    >
      <div className={css.head}>
        <h2 id={`${id}-title`}>{title}</h2>
        <button type="button" className={css.button} onClick={() => dialog.current?.close()}>
          Close
        </button>
        <p className={css.quiet}>{caution}</p>
        <div className={css.filter}>
          <label htmlFor={`${id}-filter`}>Filter by any words</label>
          <input
            ref={input}
            id={`${id}-filter`}
            type="search"
            autoComplete="off"
            value={filter}
            onChange={(event) => setFilter(event.target.value)}
          />
          <p className={css.quiet} role="status">
            {found.length} of {rows.length} entries
          </p>
        </div>
        {problem !== null && (
          <p className={css.problem} role="alert">
            {problem}
          </p>
        )}
      </div>
      <ul className={css.list}>
        {found.map((row) => (
          <EntryItem key={row.id} row={row} onTake={() => take(row.entry)} onRemove={() => onRemove(row.id)} />
        ))}
      </ul>
    </dialog>
  )
}
