import * as Y from 'yjs'
import { ID, LANE_FIELDS, LIMITS, type Scalar, type SectionName } from '../../budget/schema'
import type { Operation } from '../change'
import { fieldsOf, isNote, isSection, refuseValue } from '../layout'
import { mergedText, type NoteOperation } from './noteText'
import { editSize } from './size'

/** Why an edit may not be made: which of its operations, and a sentence that says what to do. */
export type EditRefusal = { readonly index: number; readonly reason: string }

/**
 * Judges the operations of one edit against the document, in order, without touching it.
 * @returns null if all may be made
 */
export function refuseEdit(doc: Y.Doc, operations: readonly Operation[]): EditRefusal | null {
  const judged = new Judged(doc)
  for (const [index, operation] of operations.entries()) {
    const reason = judged.refuse(operation)
    if (reason !== null) return { index, reason }
  }
  if (editSize(operations) > LIMITS.editBytes) {
    return { index: operations.length - 1, reason: 'One edit may hold 4 MB at most; make it in several.' }
  }
  return null
}

/** The document as it will be after the operations judged so far. */
class Judged {
  private readonly added = new Map<SectionName, Set<string>>()
  private readonly addedLanes = new Set<string>()
  /** Y.Map counts its entries each time that it is asked. */
  private readonly counts = new Map<string, number>()

  constructor(private readonly doc: Y.Doc) {}

  refuse(operation: Operation): string | null {
    switch (operation.op) {
      case 'set':
        return this.refuseSet(operation.section, operation.id, operation.field, operation.value)
      case 'add':
        return this.refuseAdd(operation.section, operation.id, operation.values)
      case 'note':
        return this.refuseNote(operation)
      case 'lane':
        return this.refuseLane(operation.line, operation.lane, operation.field, operation.value)
      default:
        return "An operation is one of 'set', 'add', 'note' and 'lane'."
    }
  }

  private refuseSet(section: 'head' | SectionName, id: string | null, field: string, value: Scalar): string | null {
    if (section === 'head') {
      return field === 'schemaVersion'
        ? 'The version of the schema is not set by hand.'
        : refuseValue('head', field, value)
    }
    const missing = this.refuseMissing(section, id)
    if (missing !== null) return missing
    return isNote(section, field)
      ? "A note is changed with 'note', not with 'set'."
      : refuseValue(section, field, value)
  }

  private refuseAdd(section: SectionName, id: string, values: Readonly<Record<string, Scalar>>): string | null {
    if (!isSection(section)) return `'${String(section)}' is not a section of a budget.`
    if (!ID.test(id)) return 'An id has 1 to 40 small letters, digits and hyphens.'
    if (this.has(section, id)) return `There is already a record '${id}' in '${section}'.`
    if (values.removed) return "A record is added first and removed later: leave 'removed' out."
    if (typeof values.order !== 'string') return "Give the new record an 'order'."
    for (const [field, value] of Object.entries(values)) {
      if (value === null && fieldsOf(section).includes(field)) continue
      const reason = refuseValue(section, field, value)
      if (reason !== null) return `${field}: ${reason}`
    }
    const added = this.added.get(section) ?? new Set()
    this.added.set(section, added.add(id))
    const limit = section === 'lines' ? LIMITS.lines : LIMITS.recordsPerSection
    const count = this.count(section) + added.size
    return count > limit ? `A budget has at most ${limit} records in '${section}', removed ones included.` : null
  }

  private refuseNote(operation: NoteOperation): string | null {
    const { section, id, field, text } = operation
    const missing = this.refuseMissing(section, id)
    if (missing !== null) return missing
    if (!isNote(section, field)) return `'${field}' of '${section}' is not a note.`
    const record = this.doc.getMap(section).get(id)
    const note = record instanceof Y.Map ? record.get(field) : null
    return refuseValue(section, field, text) ?? refuseValue(section, field, mergedText(operation, String(note ?? '')))
  }

  private refuseLane(line: string, lane: number, field: string, value: string | null): string | null {
    const missing = this.refuseMissing('lines', line)
    if (missing !== null) return missing
    if (!Number.isInteger(lane) || lane < 1 || lane > LIMITS.lanes)
      return `A lane is a number from 1 to ${LIMITS.lanes}.`
    if (!LANE_FIELDS.some((name) => name === field)) return `'${field}' does not differ from lane to lane.`
    const key = laneKey(line, lane, field)
    const lanes = this.doc.getMap('laneValues')
    if (!lanes.has(key)) this.addedLanes.add(key)
    if (this.count('laneValues') + this.addedLanes.size > LIMITS.laneValues)
      return `A budget has at most ${LIMITS.laneValues} lane values.`
    return refuseValue('laneValues', key, value)
  }

  private refuseMissing(section: SectionName, id: string | null): string | null {
    if (!isSection(section)) return `'${String(section)}' is not a section of a budget.`
    return id !== null && this.has(section, id) ? null : `There is no record '${id}' in '${section}'.`
  }

  private count(root: string): number {
    const count = this.counts.get(root) ?? this.doc.getMap(root).size
    this.counts.set(root, count)
    return count
  }

  private has(section: SectionName, id: string): boolean {
    return this.doc.getMap(section).has(id) || (this.added.get(section)?.has(id) ?? false)
  }
}

export function laneKey(line: string, lane: number, field: string): string {
  return `${line}/${lane}/${field}`
}
