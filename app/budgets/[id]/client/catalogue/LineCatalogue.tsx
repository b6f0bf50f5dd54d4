'use client'
import { useState } from 'react'
import { lineFromFoil } from '../../../../../lib/budget/catalogues/foils'
import { LAMINATE_CLASSES, lineFromLaminate } from '../../../../../lib/budget/catalogues/laminates'
import { lineFromPackage, PUBLISHED_PACKAGES } from '../../../../../lib/budget/catalogues/packages'
import type { Line } from '../../../../../lib/budget/schema'
import { setField } from '../deeds/records'
import { useBench, useLook } from '../state/contexts'
import { CatalogueDialog } from './CatalogueDialog'
import css from './catalogue.module.css'
import { FOIL_ROWS, laminateRow, packageRow } from './lineRows'
import type { CatalogueRow } from './row'
import { type ServerCatalogue, useServerEntries } from './useServerEntries'

/** What a catalogue may fill in a line of a model: the question, the entries, and the fields that one of them fills. */
type Offer<E> = {
  readonly button: string
  readonly title: string
  readonly caution: string
  readonly rows: (entries: ServerCatalogue['entries']) => readonly CatalogueRow<E>[]
  readonly fields: (entry: E) => Partial<Line>
}
const offer = <E,>(given: Offer<E>): Offer<E> => given

const LAMINATES = offer({
  button: 'Suggest a laminate',
  title: 'Laminate classes',
  caution: 'Suggestions in generic words. Stack-up and laminate values come from the fabricator.',
  rows: (entries) => [
    ...entries.flatMap((one) => (one.kind === 'laminate' ? [laminateRow(one.id, one.entry, one)] : [])),
    ...LAMINATE_CLASSES.map(({ id, ...entry }) => laminateRow(id, entry, null)),
  ],
  fields: lineFromLaminate,
})

const FOILS = offer({
  button: 'Suggest a foil',
  title: 'Foil classes',
  caution: 'Suggestions in generic words. The usual Rz is typed for both sides.',
  rows: () => FOIL_ROWS,
  fields: lineFromFoil,
})

const PACKAGES = offer({
  button: 'Suggest a package',
  title: 'Packages',
  caution: 'Parameter sets from memory: confirm against the standard.',
  rows: (entries) => [
    ...entries.flatMap((one) => (one.kind === 'package' ? [packageRow(one.id, one.entry, one)] : [])),
    ...PUBLISHED_PACKAGES.map(({ id, ...entry }) => packageRow(id, entry, null)),
  ],
  fields: lineFromPackage,
})

/** Offers what the catalogues have for a line that is computed from its cross-section, or for a package's line. */
export function LineCatalogue({ id, model }: { id: string; model: Line['model'] }) {
  const { canWrite } = useBench()
  if (!canWrite) return null
  if (model === 'package-line') return <Offered id={id} offer={PACKAGES} />
  if (model !== 'geometry') return null
  return (
    <div className={css.offers}>
      <Offered id={id} offer={LAMINATES} />
      <Offered id={id} offer={FOILS} />
    </div>
  )
}

function Offered<E>({ id, offer }: { id: string; offer: Offer<E> }) {
  const [open, setOpen] = useState(false)
  return (
    <>
      <button type="button" className={css.button} onClick={() => setOpen(true)}>
        {offer.button}
      </button>
      {open && <Choice id={id} offer={offer} onClosed={() => setOpen(false)} />}
    </>
  )
}

function Choice<E>({ id, offer, onClosed }: { id: string; offer: Offer<E>; onClosed: () => void }) {
  const { act } = useBench()
  const { goTo } = useLook()
  const { entries, problem, remove } = useServerEntries()
  const take = (entry: E) =>
    act(Object.entries(offer.fields(entry)).map(([field, value]) => setField('lines', id, field, value)))
  const closed = (taken: boolean) => {
    onClosed()
    if (taken) goTo({ section: 'lines', id, field: null })
  }
  return (
    <CatalogueDialog
      title={offer.title}
      caution={offer.caution}
      rows={offer.rows(entries)}
      problem={problem}
      onTake={take}
      onRemove={remove}
      onClosed={closed}
    />
  )
}
