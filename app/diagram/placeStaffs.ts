import type { AllowanceEvaluation } from '../../lib/budget/evaluation'
import type { Budget } from '../../lib/budget/schema'
import { planeWords } from '../words/terms'
import type { Box, Piece, Staff } from './geometry'
import { workWidth } from './text'

type Room = { readonly plot: Box; readonly bottom: number; readonly right: number }

/** Planes as levelling staffs: the two of the allowance whole and ticked, those between them from the level to the ground. */
export function staffsOf(
  planes: readonly { readonly id: string; readonly at: number }[],
  pieces: readonly Piece[],
  budget: Budget,
  allowance: AllowanceEvaluation | null,
  room: Room,
): Staff[] {
  const first = pieces.findIndex((piece) => piece.place === 'inside')
  const after = pieces.findIndex((piece) => piece.place === 'after')
  const last = after < 0 ? pieces.length : after
  const staffs: Staff[] = []
  for (const { id, at } of planes) {
    const plane = budget.planes[id]
    const bounds = id === allowance?.from ? 'from' : id === allowance?.to ? 'to' : null
    if (!plane || (!bounds && (at <= first || at >= last))) continue
    const next = pieces[at]
    const before = pieces[at - 1]
    const x =
      bounds === 'from' ? room.plot.x : bounds === 'to' ? room.right : (next?.from.x ?? before?.to.x ?? room.plot.x)
    const level = next?.from.y ?? before?.to.y ?? room.plot.y
    staffs.push({
      id,
      x,
      label: planeWords(plane),
      anchor: bounds === 'from' ? 'start' : bounds === 'to' ? 'end' : 'middle',
      bounds,
      top: bounds ? room.plot.y : level,
      bottom: bounds ? room.bottom : room.plot.y + room.plot.height,
    })
  }
  return withoutCrowding(staffs)
}

/** The names stand in one row above; where two would touch, the plane inside the allowance goes without. */
function withoutCrowding(staffs: readonly Staff[]): Staff[] {
  const extent = (staff: Staff): [number, number] => {
    const width = workWidth(staff.label, 13) + 10
    if (staff.anchor === 'start') return [staff.x - 8, staff.x - 8 + width]
    if (staff.anchor === 'end') return [staff.x + 8 - width, staff.x + 8]
    return [staff.x - width / 2, staff.x + width / 2]
  }
  const taken: [number, number][] = staffs.filter((staff) => staff.bounds).map(extent)
  return staffs.map((staff) => {
    if (staff.bounds) return staff
    const [left, right] = extent(staff)
    if (taken.some(([from, to]) => left < to && from < right)) return { ...staff, label: '' }
    taken.push([left, right])
    return staff
  })
}
