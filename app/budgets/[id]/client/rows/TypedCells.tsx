'use client'
import type { Line, SectionName } from '../../../../../lib/budget/schema'
import { metaOf } from '../../../../../lib/sheet/layout'
import { Reference } from '../slips/Reference'
import { fieldSlip } from '../slips/spec'
import { Typed } from '../slips/Typed'
import { modelSlips } from '../typed/modelSlips'
import { wordOf } from '../words/choices'
import { GridCell } from './GridCell'
import css from './rows.module.css'

type Props = { readonly id: string; readonly line: Line; readonly of: string; readonly lanes: string }

/** The few values that the line's model is known by, each a slip: loss @ frequency, length × loss class, and so on. */
export function TypedCells({ id, line, of, lanes }: Props) {
  return (
    <div className={css.typed}>
      {modelSlips(line).map(({ field, before }) => {
        const value = line[field]
        return (
          <div key={field} className={css.typedSlip}>
            {before && (
              <span aria-hidden="true" className={css.before}>
                {before}
              </span>
            )}
            <GridCell spec={fieldSlip('lines', id, field, value)} of={of} look="slip">
              {typeof value === 'string' && value !== '' ? <Shown field={field} value={value} /> : undefined}
            </GridCell>
          </div>
        )
      })}
      {lanes !== '' && <span className={css.lanes}>{lanes}</span>}
    </div>
  )
}

function Shown({ field, value }: { field: string; value: string }) {
  const meta = metaOf('lines', field)
  if (meta?.kind === 'reference') return <Reference section={meta.section as SectionName} id={value} />
  return meta?.kind === 'choice' ? wordOf(value) : <Typed text={value} />
}
