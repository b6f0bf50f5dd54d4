'use client'
import { COVER_CODES, COVERS, type Line, sortedSet } from '../../../../../lib/budget/schema'
import { setField } from '../deeds/records'
import { Standing, standingColour } from '../slips/Aside'
import slips from '../slips/slips.module.css'
import { useBench } from '../state/contexts'
import { usePlace } from '../state/usePlace'
import { wordOf } from '../words/choices'
import css from './detail.module.css'
import { Group } from './Group'

/** What the number includes, from the set of its kind. Nothing ticked can mean 'nothing else', and that must be said. */
export function Covers({ id, line }: { id: string; line: Line }) {
  const bench = useBench()
  const { canWrite, act } = bench
  const key = `lines/${id}/covers`
  const others = usePlace(bench.standing, key) ?? []
  const unsaved = usePlace(bench.unsaved, key)
  const known: readonly string[] = line.kind ? COVERS[line.kind] : []
  const ticked = line.covers?.split(' ').filter(Boolean) ?? []
  const codes = [...known, ...ticked.filter((code) => !known.includes(code))]
  const write = (value: string | null) => act([setField('lines', id, 'covers', value)])
  const toggle = (code: string) =>
    write(sortedSet(ticked.includes(code) ? ticked.filter((each) => each !== code) : [...ticked, code], COVER_CODES))
  return (
    <Group title="What the number includes">
      <fieldset
        disabled={!canWrite}
        className={`${css.covers} ${slips.standing}`}
        data-place={key}
        data-standing={standingColour(others)}
        data-unsaved={unsaved || undefined}
        tabIndex={-1}
      >
        <legend className="unseen">Covers</legend>
        <Standing others={others} />
        {codes.map((code) => (
          <label key={code}>
            <input type="checkbox" checked={ticked.includes(code)} onChange={() => toggle(code)} />
            {wordOf(code)}
            {!known.includes(code) && ' (not usual for this kind)'}
          </label>
        ))}
        <label>
          <input type="checkbox" checked={line.covers === ''} onChange={() => write(line.covers === '' ? null : '')} />
          nothing beside its own piece
        </label>
      </fieldset>
      {line.covers === null && (
        <p className={css.quiet}>Not said yet: neighbours cannot be checked for what is counted twice or by nobody.</p>
      )}
      {codes.length === 0 && line.kind === null && <p className={css.quiet}>Say the kind first.</p>}
    </Group>
  )
}
