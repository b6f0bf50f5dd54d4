'use client'
import { useId, useMemo, useState } from 'react'
import type { TrailEntry } from '../../../../../lib/sheet/wire'
import { useReading, useView } from '../state/contexts'
import { recordName } from '../words/say'
import { EntryItem } from './EntryItem'
import { MarginTrend } from './MarginTrend'
import css from './trail.module.css'
import { touches } from './trailWords'
import { useTrail } from './useTrail'

/** Who changed what and what it did to the margin: newest first, of the budget or of the selected row. */
export function TrailPanel({ recent }: { recent: readonly TrailEntry[] }) {
  const { budget } = useReading()
  const { selected } = useView()
  const trail = useTrail(recent)
  const [ofRow, setOfRow] = useState(false)
  const id = useId()
  const written = useMemo(() => trail.entries.filter((entry) => entry.kind !== 'bind'), [trail.entries])
  const shown = ofRow && selected ? written.filter((entry) => touches(entry, selected.section, selected.id)) : written
  return (
    <section className={css.panel} aria-labelledby={id}>
      <h2 id={id}>Trail</h2>
      <label className={css.filter}>
        <input
          type="checkbox"
          checked={ofRow && selected !== null}
          disabled={selected === null}
          onChange={(event) => setOfRow(event.target.checked)}
        />
        {selected ? `only ${recordName(budget, selected.section, selected.id)}` : 'only the selected row'}
      </label>
      <MarginTrend entries={written} />
      {shown.length === 0 && <p className={css.none}>Nothing in the part of the trail that is loaded.</p>}
      <ol className={css.entries}>
        {shown.map((entry) => (
          <EntryItem key={entry.seq} entry={entry} />
        ))}
      </ol>
      {trail.problem && (
        <p role="alert" className={css.problem}>
          {trail.problem}
        </p>
      )}
      {!trail.complete && (
        <button type="button" className={css.more} onClick={trail.more} disabled={trail.asking}>
          {trail.asking ? 'Reading older entries' : 'Show more'}
        </button>
      )}
    </section>
  )
}
