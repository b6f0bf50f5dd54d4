'use client'
import { memo } from 'react'
import type { Line } from '../../../../../lib/budget/schema'
import { removeRow } from '../deeds/channel'
import { fieldSlip, toleranceSlip } from '../slips/spec'
import { useBench } from '../state/contexts'
import { ClaimCells } from './ClaimCells'
import { DbCell } from './DbCell'
import { GridCell } from './GridCell'
import { Row } from './parts'
import { RowHead } from './RowHead'
import type { LineFacts } from './rowFacts'
import css from './rows.module.css'
import { TypedCells } from './TypedCells'

export type LineRowProps = {
  readonly id: string
  readonly line: Line
  readonly facts: LineFacts
  readonly selected: boolean
  /** Largest loss of a line in view, dB: all bars are to this scale. */
  readonly scaleDb: number
  readonly assembly: string | null
  /** Fill of the ground that the line stands on. */
  readonly ground: string | null
}

/** One contributor: what may be typed is a white slip, the rest is text. */
export const LineRow = memo(
  function LineRow(props: LineRowProps) {
    const { id, line, facts, selected, assembly, ground } = props
    const { act } = useBench()
    const of = line.name || 'line without a name'
    const state = [line.removed && 'taken out', facts.outside && 'outside the allowance'].filter(Boolean).join(', ')
    return (
      <Row
        className={css.line}
        data-row={id}
        data-outside={facts.outside || undefined}
        data-gone={line.removed || undefined}
        aria-selected={selected}
      >
        <svg className={css.strip} aria-hidden="true" focusable="false">
          <title>{assembly}</title>
          {ground && <rect width="100%" height="100%" fill={ground} />}
        </svg>
        <RowHead
          section="lines"
          id={id}
          label={`line ${facts.number || ''} ${of}${state && `, ${state}`}`}
          onRemove={() => act(removeRow({ section: 'lines', id }))}
        >
          {facts.number || '–'}
        </RowHead>
        <div className={css.nameCell}>
          <GridCell spec={fieldSlip('lines', id, 'name', line.name)} of={of} look="text" className={css.name} />
          <span className={css.under}>
            {[assembly, line.kind ?? 'kind not said', state].filter(Boolean).join(' · ')}
          </span>
        </div>
        <TypedCells id={id} line={line} of={of} lanes={facts.lanes} />
        <DbCell facts={facts} scaleDb={props.scaleDb} />
        <GridCell spec={toleranceSlip('lines', id, line)} of={of} look="slip" className={css.tolerance}>
          {line.toleranceMinus === null && line.tolerancePlus === null ? (
            <span className={css.empty}>{facts.classTolerance ?? '± none'}</span>
          ) : undefined}
        </GridCell>
        <ClaimCells id={id} line={line} of={of} facts={facts} />
      </Row>
    )
  },
  (a, b) =>
    a.line === b.line &&
    a.selected === b.selected &&
    a.scaleDb === b.scaleDb &&
    a.assembly === b.assembly &&
    a.ground === b.ground &&
    sameFacts(a.facts, b.facts),
)

function sameFacts(a: LineFacts, b: LineFacts): boolean {
  return (Object.keys(a) as (keyof LineFacts)[]).every((key) => a[key] === b[key])
}
