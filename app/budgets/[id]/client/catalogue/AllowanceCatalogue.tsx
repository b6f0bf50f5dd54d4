'use client'
import { useRef, useState } from 'react'
import {
  type AllowanceEntry,
  allowanceFromCatalogue,
  OWN_COPY_WINS,
  PUBLISHED_ALLOWANCES,
} from '../../../../../lib/budget/catalogues/allowances'
import { addRecord } from '../deeds/records'
import { useBench, useLook, useReading } from '../state/contexts'
import { allowanceRow } from './allowanceRow'
import { CatalogueDialog } from './CatalogueDialog'
import css from './catalogue.module.css'
import { filled } from './filled'
import { useServerEntries } from './useServerEntries'

/** Adds an allowance from the catalogue: the published ones, and those of this server. */
export function AllowanceCatalogue() {
  const { canWrite } = useBench()
  const [open, setOpen] = useState(false)
  if (!canWrite) return null
  return (
    <>
      <button type="button" className={css.button} onClick={() => setOpen(true)}>
        Take an allowance from the catalogue
      </button>
      {open && <Choice onClosed={() => setOpen(false)} />}
    </>
  )
}

function Choice({ onClosed }: { onClosed: () => void }) {
  const { budget, evaluation } = useReading()
  const { act, read } = useBench()
  const { goTo } = useLook()
  const { entries, problem, remove } = useServerEntries()
  const added = useRef<string | null>(null)
  const { nyquist } = evaluation.signalling
  const rows = [
    ...entries.flatMap((one) =>
      one.kind === 'allowance' ? [allowanceRow(one.id, one.entry, budget, nyquist, one)] : [],
    ),
    ...PUBLISHED_ALLOWANCES.map(({ id, ...entry }) => allowanceRow(id, entry, budget, nyquist, null)),
  ]
  const take = (entry: AllowanceEntry) => {
    const { operations, id } = addRecord(read(), 'allowances', filled(allowanceFromCatalogue(entry, read())))
    added.current = id
    return act(operations)
  }
  const closed = (taken: boolean) => {
    onClosed()
    if (taken && added.current !== null) goTo({ section: 'allowances', id: added.current, field: null })
  }
  return (
    <CatalogueDialog
      title="Catalogue of allowances"
      caution={OWN_COPY_WINS}
      rows={rows}
      problem={problem}
      onTake={take}
      onRemove={remove}
      onClosed={closed}
    />
  )
}
