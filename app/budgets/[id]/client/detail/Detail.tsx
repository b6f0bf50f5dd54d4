'use client'
import { type KeyboardEvent, useEffect, useRef } from 'react'
import { useLook, useReading, useView } from '../state/contexts'
import css from './detail.module.css'
import { LineDetail } from './LineDetail'
import { PlaneDetail } from './PlaneDetail'

/** Everything about the selected line or plane: beside the rows, or a sheet from below where there is no room. */
export function Detail() {
  const { budget } = useReading()
  const { selected, detailOpen } = useView()
  const { openDetail, goTo } = useLook()
  const sheet = useRef<HTMLElement>(null)
  useEffect(() => {
    if (detailOpen && isSheet(sheet.current)) sheet.current?.focus()
  }, [detailOpen])
  const close = () => {
    openDetail(false)
    if (selected) goTo({ ...selected, field: null })
  }
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key !== 'Escape' || event.defaultPrevented || !isSheet(sheet.current)) return
    event.preventDefault()
    close()
  }
  const line = selected?.section === 'lines' ? budget.lines[selected.id] : undefined
  const plane = selected?.section === 'planes' ? budget.planes[selected.id] : undefined
  return (
    <section
      ref={sheet}
      className={css.detail}
      data-open={detailOpen || undefined}
      aria-label="Detail of the selected row"
      tabIndex={-1}
      onKeyDown={onKeyDown}
    >
      <button type="button" className={css.close} onClick={close}>
        Close the detail
      </button>
      {selected && line && <LineDetail key={selected.id} id={selected.id} line={line} />}
      {selected && plane && <PlaneDetail key={selected.id} id={selected.id} plane={plane} />}
      {!line && !plane && <p className={css.hint}>Select a row to see everything about it here.</p>}
    </section>
  )
}

/** Whether the detail lies over the page just now: then the focus goes in with it, and Escape closes it. */
const isSheet = (element: HTMLElement | null) => element !== null && getComputedStyle(element).position === 'fixed'
