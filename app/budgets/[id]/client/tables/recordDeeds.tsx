'use client'
import { RECORD_WORDS } from '../../../../../lib/budget/record'
import type { Scalar } from '../../../../../lib/budget/schema'
import { addRecord, removedOnes, setField } from '../deeds/records'
import { useBench, useLook, useReading } from '../state/contexts'
import { recordName } from '../words/say'
import type { TableSection } from './section'
import css from './tables.module.css'

export function AddRecord({ section, fresh }: { section: TableSection; fresh: Readonly<Record<string, Scalar>> }) {
  const { canWrite, act, read } = useBench()
  const { goTo } = useLook()
  if (!canWrite) return null
  const add = () => {
    const added = addRecord(read(), section, fresh)
    if (act(added.operations)) goTo({ section, id: added.id, field: null })
  }
  return (
    <button type="button" className={css.button} onClick={add}>
      Add {/^[aeiou]/.test(RECORD_WORDS[section]) ? 'an' : 'a'} {RECORD_WORDS[section]}
    </button>
  )
}

export function TakeOut({ section, id }: { section: TableSection; id: string }) {
  const { budget } = useReading()
  const { canWrite, act } = useBench()
  if (!canWrite) return null
  return (
    <button
      type="button"
      className={css.button}
      aria-label={`Take out ${recordName(budget, section, id)}`}
      onClick={() => act([setField(section, id, 'removed', true)])}
    >
      Take out
    </button>
  )
}

/** Records that were taken out, to be put back. Nothing is ever deleted. */
export function TakenOut({ section }: { section: TableSection | 'lines' | 'planes' }) {
  const { budget } = useReading()
  const { canWrite, act } = useBench()
  const gone = removedOnes<{ order: string; removed: boolean }>(budget[section])
  if (gone.length === 0) return null
  return (
    <details className={css.gone}>
      <summary>
        {gone.length} taken out ({RECORD_WORDS[section]})
      </summary>
      <ul>
        {gone.map(([id]) => (
          <li key={id}>
            {recordName(budget, section, id)}{' '}
            {canWrite && (
              <button
                type="button"
                className={css.button}
                onClick={() => act([setField(section, id, 'removed', false)])}
              >
                Put back
              </button>
            )}
          </li>
        ))}
      </ul>
    </details>
  )
}
