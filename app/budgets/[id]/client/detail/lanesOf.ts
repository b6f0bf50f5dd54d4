import { type Budget, LANE_FIELDS } from '../../../../../lib/budget/schema'

type LaneField = (typeof LANE_FIELDS)[number]

/** The values that single lanes have of their own for a line, by field and lane. Cleared ones are not among them. */
export function laneValuesOf(budget: Budget, line: string): ReadonlyMap<LaneField, ReadonlyMap<number, string>> {
  const found = new Map<LaneField, Map<number, string>>()
  for (const [key, value] of Object.entries(budget.laneValues)) {
    const [id, lane, field] = key.split('/')
    const known = LANE_FIELDS.find((each) => each === field)
    if (id !== line || value === null || known === undefined) continue
    const lanes = found.get(known) ?? new Map()
    found.set(known, lanes.set(Number(lane), value))
  }
  return found
}

/** For how many lanes each line's fields have values of their own, by 'line/field': those that the slip does not speak for. */
export function laneCounts(budget: Budget): ReadonlyMap<string, number> {
  const counts = new Map<string, number>()
  for (const [key, value] of Object.entries(budget.laneValues)) {
    if (value === null) continue
    const [line, , field] = key.split('/')
    const name = `${line}/${field}`
    counts.set(name, (counts.get(name) ?? 0) + 1)
  }
  return counts
}
