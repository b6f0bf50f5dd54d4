'use client'
import { LANE_FIELDS } from '../../../../../lib/budget/schema'
import { FieldSlip } from '../slips/FieldSlip'
import { laneSlip } from '../slips/spec'
import { useReading } from '../state/contexts'
import { labelOf } from '../words/labels'
import css from './detail.module.css'
import { Group } from './Group'
import { laneValuesOf } from './lanesOf'

/** What differs from lane to lane on this line. An empty slip leaves the lane with the line's own value. */
export function Lanes({ id, fields }: { id: string; fields: readonly string[] }) {
  const { budget } = useReading()
  const values = laneValuesOf(budget, id)
  const lanes = Array.from({ length: budget.head.laneCount ?? 1 }, (_, index) => index + 1)
  const shown = LANE_FIELDS.filter((field) => fields.includes(field) || values.has(field))
  if (lanes.length < 2 || shown.length === 0) return null
  return (
    <Group title="From lane to lane">
      {shown.map((field) => {
        const own = values.get(field)
        return (
          <details key={field}>
            <summary>
              {labelOf('lines', field)}:{' '}
              {own ? `${own.size} of ${lanes.length} lanes have their own` : 'the same in all'}
            </summary>
            <div className={css.lanes}>
              {lanes.map((lane) => (
                <FieldSlip
                  key={lane}
                  spec={{ ...laneSlip(id, lane, field, own?.get(lane) ?? null), label: `lane ${lane}` }}
                />
              ))}
            </div>
          </details>
        )
      })}
    </Group>
  )
}
