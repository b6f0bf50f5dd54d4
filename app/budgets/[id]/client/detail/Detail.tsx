'use client'
import { useReading, useView } from '../state/contexts'
import css from './detail.module.css'
import { LineDetail } from './LineDetail'
import { PlaneDetail } from './PlaneDetail'

/** Everything about the selected line or plane: beside the rows, or a sheet from below where there is no room. */
export function Detail() {
  const { budget } = useReading()
  const { selected, detailOpen, openDetail } = useView()
  const line = selected?.section === 'lines' ? budget.lines[selected.id] : undefined
  const plane = selected?.section === 'planes' ? budget.planes[selected.id] : undefined
  return (
    <section className={css.detail} data-open={detailOpen || undefined} aria-label="Detail of the selected row">
      <button type="button" className={css.close} onClick={() => openDetail(false)}>
        Close the detail
      </button>
      {selected && line && <LineDetail key={selected.id} id={selected.id} line={line} />}
      {selected && plane && <PlaneDetail key={selected.id} id={selected.id} plane={plane} />}
      {!line && !plane && <p className={css.hint}>Select a row to see everything about it here.</p>}
    </section>
  )
}
