'use client'
import { type KeyboardEvent, useId, useMemo, useRef } from 'react'
import { AssemblyTextures, textureFill } from '../../../../marks/AssemblyTexture'
import { TEXTURES, texturesOf } from '../../../../marks/texture'
import { addRow, moveRow, type NewRow, shownRows } from '../deeds/channel'
import { useBench, useLook, useReading, useView } from '../state/contexts'
import { LineRow } from './LineRow'
import { PlaneRow } from './PlaneRow'
import { Grid } from './parts'
import { rowKey } from './RowHead'
import { RowsHead } from './RowsHead'
import { lineFacts, planeSays } from './rowFacts'
import css from './rows.module.css'
import { useGridKeys } from './useGridKeys'

/** The channel: lines in order with the planes between them. */
export function Rows() {
  const { budget, evaluation } = useReading()
  const bench = useBench()
  const view = useView()
  const { goTo } = useLook()
  const root = useRef<HTMLDivElement>(null)
  const keys = useGridKeys(root)
  const textureId = useId()

  const allowance = evaluation.allowances.find(({ id }) => id === view.allowance) ?? null
  const facts = useMemo(() => lineFacts(budget, evaluation, allowance), [budget, evaluation, allowance])
  const rows = shownRows(budget, (row) => bench.drafts.within(`${row.section}/${row.id}`))
  const textures = texturesOf(
    budget.assemblies,
    rows.map((row) => (row.section === 'lines' ? (budget.lines[row.id]?.assembly ?? null) : null)),
  )
  const scaleDb = Math.max(0, ...[...facts.values()].map(({ db }) => Math.abs(db ?? 0)))

  const onKeyDown = (event: KeyboardEvent) => {
    keys.onKeyDown(event)
    const id = event.target instanceof Element ? event.target.closest<HTMLElement>('[data-row]')?.dataset.row : null
    if (!id || event.defaultPrevented || !bench.canWrite) return
    if (event.altKey && (event.key === 'ArrowUp' || event.key === 'ArrowDown')) {
      bench.act(moveRow(bench.read(), id, event.key === 'ArrowUp' ? -1 : 1))
    } else if (event.key === 'Insert') {
      const blank: NewRow = { section: 'lines', values: { assembly: budget.lines[id]?.assembly ?? null } }
      const added = addRow(bench.read(), id, blank)
      if (bench.act(added.operations)) goTo({ section: 'lines', id: added.id, field: 'name' })
    } else return
    event.preventDefault()
  }

  return (
    <div className={css.frame}>
      <svg className={css.defs} aria-hidden="true" focusable="false">
        <AssemblyTextures id={textureId} textures={TEXTURES} />
      </svg>
      <Grid
        ref={root}
        aria-label="Lines and planes, in channel order"
        aria-readonly={!bench.canWrite}
        className={css.grid}
        onKeyDown={onKeyDown}
        onFocus={keys.onFocus}
        onBlur={keys.onBlur}
      >
        <RowsHead />
        {rows.map((row) => {
          const selected = view.selected?.id === row.id
          if (row.section === 'planes') {
            const plane = budget.planes[row.id]
            const says = planeSays(budget, evaluation, row.id)
            return plane && <PlaneRow key={rowKey(row)} id={row.id} plane={plane} selected={selected} says={says} />
          }
          const line = budget.lines[row.id]
          if (!line) return null
          const texture = line.assembly === null ? undefined : textures.get(line.assembly)
          return (
            <LineRow
              key={rowKey(row)}
              id={row.id}
              line={line}
              facts={facts.get(row.id) ?? NO_FACTS}
              selected={selected}
              scaleDb={scaleDb}
              assembly={line.assembly === null ? null : (budget.assemblies[line.assembly]?.name ?? null)}
              ground={texture ? textureFill(textureId, texture) : null}
            />
          )
        })}
      </Grid>
    </div>
  )
}

/** A row that was taken out while somebody typed in it is in no sum. */
const NO_FACTS = {
  number: 0,
  db: null,
  outside: true,
  basis: null,
  grade: 'nominal',
  owner: null,
  classTolerance: null,
  lanes: '',
  problems: 0,
  flags: 0,
} as const
