'use client'
import type { Plane } from '../../../../../lib/budget/schema'
import { planeWords } from '../../../../words/terms'
import { FieldSlip } from '../slips/FieldSlip'
import { fieldSlip } from '../slips/spec'
import css from './detail.module.css'
import { FlagList } from './FlagList'
import { RowDeeds } from './RowDeeds'

export function PlaneDetail({ id, plane }: { id: string; plane: Plane }) {
  return (
    <>
      <h2 className={css.title}>Plane {planeWords(plane)}</h2>
      <div className={css.slips}>
        {(['code', 'name', 'standard'] as const).map((field) => (
          <FieldSlip key={field} spec={fieldSlip('planes', id, field, plane[field])} />
        ))}
      </div>
      <FlagList section="planes" id={id} />
      <RowDeeds row={{ section: 'planes', id }} removed={plane.removed} assembly={null} />
    </>
  )
}
