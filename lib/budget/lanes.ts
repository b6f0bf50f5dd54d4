import type { FlagDraft } from './flags'
import { itemInLane, type LaneFields, type LineItem } from './lineItem'
import { laneFieldsNotRead } from './models'
import { fieldWords, nameOf } from './record'
import type { Budget } from './schema'

/** The lanes of a link and what they say instead of their lines. */
export type Lanes = {
  readonly count: number
  /** Line id → lane → the line with that lane's values. Only lanes that differ are in it. */
  readonly differing: ReadonlyMap<string, ReadonlyMap<number, LineItem>>
  readonly drafts: readonly FlagDraft[]
}

/** Reads the lane values of a budget. Without a lane count, the highest lane that has a value is the last. */
export function lanesOf(budget: Budget, items: readonly LineItem[]): Lanes {
  const values = new Map<string, Map<number, LaneFields>>()
  let highest = 1
  for (const [key, value] of Object.entries(budget.laneValues)) {
    if (value === null) continue
    const [line = '', number = '', field = ''] = key.split('/')
    const lane = Number(number)
    highest = Math.max(highest, lane)
    const ofLine = values.get(line) ?? new Map<number, LaneFields>()
    values.set(line, ofLine)
    ofLine.set(lane, { ...ofLine.get(lane), [field]: value })
  }
  const count = budget.head.laneCount ?? highest
  const drafts: FlagDraft[] = []
  const differing = new Map<string, Map<number, LineItem>>()
  for (const item of items) {
    const ofLine = values.get(item.id)
    if (!ofLine) continue
    const lanes = new Map<number, LineItem>()
    for (const [lane, fields] of ofLine) {
      if (lane <= count) lanes.set(lane, itemInLane(budget, item, lane, fields))
    }
    const beyond = [...ofLine.keys()].filter((lane) => lane > count).sort((a, b) => a - b)
    if (beyond.length > 0) drafts.push(beyondCount(item, beyond, count))
    const unread = laneFieldsNotRead(item.line).filter((field) => [...ofLine.values()].some((own) => field in own))
    if (unread.length > 0) drafts.push(notRead(item, unread))
    if (lanes.size > 0) differing.set(item.id, lanes)
  }
  return { count, differing, drafts }
}

/** The lanes to look at for these lines: each that differs, and one that stands for all others. */
export function distinctLanes(lanes: Lanes, lines: readonly LineItem[]): number[] {
  const differing = new Set<number>()
  for (const { id } of lines) for (const lane of lanes.differing.get(id)?.keys() ?? []) differing.add(lane)
  for (let lane = 1; lane <= lanes.count; lane++) {
    if (!differing.has(lane)) {
      differing.add(lane)
      break
    }
  }
  return [...differing].sort((a, b) => a - b)
}

export function inLane(lanes: Lanes, item: LineItem, lane: number): LineItem {
  return lanes.differing.get(item.id)?.get(lane) ?? item
}

function notRead(item: LineItem, fields: readonly string[]): FlagDraft {
  const what = fields.map((field) => fieldWords('lines', field)).join(' and ')
  return {
    code: 'lane-value-not-used',
    section: 'lines',
    id: item.id,
    field: fields[0] ?? null,
    message: `${nameOf('lines', item.id, item.line)}: lanes have their own ${what}, which the model '${item.line.model}' does not read.`,
    todo: 'Choose a model that reads it, or clear these values.',
  }
}

function beyondCount(item: LineItem, beyond: readonly number[], count: number): FlagDraft {
  const name = nameOf('lines', item.id, item.line)
  const which = beyond.length === 1 ? `lane ${beyond[0]}` : `lanes ${beyond.join(', ')}`
  return {
    code: 'lane-beyond-count',
    section: 'lines',
    id: item.id,
    field: null,
    message: `${name}: values are given for ${which}; the link has ${count} ${count === 1 ? 'lane' : 'lanes'}, so they do not count.`,
    todo: 'Clear these values, or correct the lane count of the link.',
  }
}
