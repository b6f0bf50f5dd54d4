import css from './diagram.module.css'
import type { LevelGeometry, Staff } from './geometry'
import { px } from './path'

/** Planes as levelling staffs. The first carries the figures, both of the allowance carry ticks. */
export function Staffs({ geometry }: { geometry: LevelGeometry }) {
  const { staffs, ticks, surface, plot } = geometry
  const first = staffs.find((staff) => staff.bounds === 'from')
  return (
    <>
      {staffs.map((staff) => (
        <g key={staff.id}>
          <path
            d={`M${px(staff.x)} ${px(staff.top)}V${staff.bottom}`}
            className={staff.bounds ? css.staff : css.post}
          />
          <text x={px(labelX(staff))} y={14} textAnchor={staff.anchor} className={css.plane}>
            {staff.label}
          </text>
          {staff.bounds && <Ticks x={staff.x} side={staff.bounds === 'from' ? -1 : 1} geometry={geometry} />}
        </g>
      ))}
      {!first && <path d={`M${px(plot.x)} ${px(plot.y)}V${px(plot.y + plot.height)}`} className={css.drop} />}
      {ticks.map(
        (tick) =>
          tick.label && (
            <text
              key={tick.db}
              x={px((first?.x ?? plot.x) - 13)}
              y={px(tick.y + 4.5)}
              className={tick.db === surface?.limitDb ? css.limit : css.figureLeft}
            >
              {tick.label}
            </text>
          ),
      )}
    </>
  )
}

const labelX = (staff: Staff) =>
  staff.anchor === 'start' ? staff.x - 8 : staff.anchor === 'end' ? staff.x + 8 : staff.x

function Ticks({ x, side, geometry }: { x: number; side: 1 | -1; geometry: LevelGeometry }) {
  const d = geometry.ticks
    .map((tick) => `M${px(x)} ${px(tick.y)}h${side * (tick.label ? 9 : tick.long ? 6 : 4)}`)
    .join('')
  return <path d={d} className={css.tick} />
}
