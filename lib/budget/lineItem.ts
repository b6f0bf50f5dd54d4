import { contentName, joinedName } from './contentName'
import type { EvidenceData } from './evaluation'
import { inOrder, livingRecord } from './record'
import { restsOn } from './restsOn'
import {
  type Assembly,
  type Basis,
  type Budget,
  type Grade,
  LANE_FIELDS,
  type Line,
  type LossClass,
  type Owner,
} from './schema'

/** A line with the records that it rests on. */
export type LineItem = {
  readonly id: string
  readonly line: Line
  /** The lane whose values the line has; null: the line as it stands for all lanes. */
  readonly lane: number | null
  readonly assembly: Assembly | null
  /** The loss class, where the line's model uses one. */
  readonly lossClass: LossClass | null
  /** A name of what the line and its loss class say: the same content, the same name. */
  readonly content: string
}

/** What one lane says instead of its line. */
export type LaneFields = Partial<Pick<Line, (typeof LANE_FIELDS)[number]>>

export function lineItems(budget: Budget, evidence: EvidenceData): LineItem[] {
  return inOrder(budget, 'lines').map(([id, line]) => {
    const assembly = livingRecord(budget, 'assemblies', line.assembly)
    const lossClass = lossClassOf(budget, line)
    const own = contentName('lines', id, line)
    const content = joinedName(own, classContent(line, lossClass), restsOn(budget, evidence, line))
    return { id, line, lane: null, assembly, lossClass, content }
  })
}

/** The line with the values of one lane. */
export function itemInLane(budget: Budget, item: LineItem, lane: number, fields: LaneFields): LineItem {
  const line = { ...item.line, ...fields }
  const lossClass = fields.lossClass === undefined ? item.lossClass : lossClassOf(budget, line)
  const differing = LANE_FIELDS.map((field) => fields[field] ?? '').join(';')
  const content = `${item.content}|${differing}|${fields.lossClass === undefined ? '' : classContent(line, lossClass)}`
  return { ...item, line, lane, lossClass, content }
}

function lossClassOf(budget: Budget, line: Line): LossClass | null {
  return line.model === 'class' ? livingRecord(budget, 'lossClasses', line.lossClass) : null
}

function classContent(line: Line, lossClass: LossClass | null): string {
  return lossClass === null ? '' : contentName('lossClasses', line.lossClass ?? '', lossClass)
}

export function ownerOf({ line, assembly }: LineItem): Owner | null {
  return line.owner ?? assembly?.owner ?? null
}

export function basisOf({ line, lossClass }: LineItem): Basis | null {
  return line.basis ?? lossClass?.basis ?? null
}

export function gradeOf({ line, lossClass }: LineItem): Grade {
  return line.grade ?? lossClass?.grade ?? 'nominal'
}

/** Said in place of a group: the line varies on its own. */
const OWN = 'none'

/**
 * What a line varies together with: its own group, else its assembly's, else the assembly itself. 'none' holds only with a
 * note that says why; without one the assembly's group stays, which is the larger sum.
 */
export function groupOf({ id, line, assembly }: LineItem): string {
  const own = line.group?.trim() ?? ''
  if (own === OWN && hasGroupNote(line)) return id
  if (own !== '' && own !== OWN) return own
  return assembly?.group?.trim() || (assembly === null ? null : line.assembly) || id
}

export function groupOffWithoutNote(line: Line): boolean {
  return line.group?.trim() === OWN && !hasGroupNote(line)
}

function hasGroupNote(line: Line): boolean {
  return (line.groupNote?.trim() ?? '') !== ''
}
