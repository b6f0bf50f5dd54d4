'use client'
import { memo } from 'react'
import type { Plane } from '../../../../../lib/budget/schema'
import { planeWords } from '../../../../words/terms'
import { removeRow } from '../deeds/channel'
import { fieldSlip } from '../slips/spec'
import { useBench } from '../state/contexts'
import { wordOf } from '../words/choices'
import { GridCell } from './GridCell'
import { Cell, Row } from './parts'
import { RowHead } from './RowHead'
import css from './rows.module.css'

type Props = {
  readonly id: string
  readonly plane: Plane
  readonly selected: boolean
  /** What begins or ends here, in words; empty where nothing does. */
  readonly says: string
}

/** A reference plane: a heavy rule with its post, between two lines. */
export const PlaneRow = memo(function PlaneRow({ id, plane, selected, says }: Props) {
  const { act } = useBench()
  const of = planeWords(plane)
  return (
    <Row className={css.plane} data-row={id} data-gone={plane.removed || undefined} aria-selected={selected}>
      <RowHead
        section="planes"
        id={id}
        label={`plane ${of}${plane.removed ? ', taken out' : ''}`}
        onRemove={() => act(removeRow({ section: 'planes', id }))}
      >
        <span className={css.post} />
      </RowHead>
      <GridCell spec={fieldSlip('planes', id, 'name', plane.name)} of={of} look="text" className={css.planeName}>
        {plane.name || (plane.code ? wordOf(plane.code) : undefined)}
      </GridCell>
      <GridCell spec={fieldSlip('planes', id, 'code', plane.code)} of={of} look="text" className={css.planeCode}>
        {plane.code ? wordOf(plane.code) : 'which plane?'}
      </GridCell>
      {says !== '' && <Cell className={css.planeSays}>{says}</Cell>}
    </Row>
  )
})
