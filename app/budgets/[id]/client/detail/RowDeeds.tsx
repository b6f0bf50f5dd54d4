'use client'
import type { Scalar } from '../../../../../lib/budget/schema'
import { addRow, moveRow, removeRow, restoreRow } from '../deeds/channel'
import { type Selected, useBench, useLook } from '../state/contexts'
import css from './detail.module.css'

type Props = { readonly row: Selected; readonly removed: boolean; readonly assembly: Scalar }

/** What can be done with a row as a whole, for those without the keys. */
export function RowDeeds({ row, removed, assembly }: Props) {
  const { canWrite, act, read } = useBench()
  const { goTo } = useLook()
  if (!canWrite) return null
  const add = () => {
    const added = addRow(read(), row.id, { section: 'lines', values: { assembly } })
    if (act(added.operations)) goTo({ section: 'lines', id: added.id, field: 'name' })
  }
  return (
    <div className={css.deeds}>
      <button type="button" onClick={() => act(moveRow(read(), row.id, -1))}>
        Move up
      </button>
      <button type="button" onClick={() => act(moveRow(read(), row.id, 1))}>
        Move down
      </button>
      <button type="button" onClick={add}>
        Add a line below
      </button>
      {removed ? (
        <button type="button" onClick={() => act(restoreRow(row))}>
          Put back
        </button>
      ) : (
        <button type="button" onClick={() => act(removeRow(row))}>
          Take out
        </button>
      )}
    </div>
  )
}
