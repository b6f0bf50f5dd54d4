import { z } from 'zod'
import { LANE_FIELDS, LIMITS } from '../../../../../../lib/budget/schema'
import type { Operation } from '../../../../../../lib/sheet/change'
import { isNote, refuseValue } from '../../../../../../lib/sheet/layout'
import { type FieldProblem, Problem } from '../../../../problem'
import { component } from '../../../../schemas/components'
import { sections } from '../../../../schemas/sections'
import { scalar } from '../../../../schemas/trail'

const id = z.string().max(40)
const field = z.string().max(40)
const section = z.enum(sections, `A section is one of: head, ${sections.join(', ')}.`)

const ofHead = z.strictObject({ section: z.literal('head'), field, value: scalar })
const ofRecord = z.strictObject({ section, id, field, value: scalar })
const ofLine = z.strictObject({ line: id, field, value: scalar })
const ofLane = z.strictObject({
  line: id,
  lane: z.number().int().min(1).max(LIMITS.lanes),
  field: z.enum(LANE_FIELDS),
  value: z.string().nullable(),
})
const added = z.strictObject({
  add: section,
  id,
  values: z
    .record(field, scalar)
    .meta({ description: "Fields that are not empty; 'order' places the record and is always needed." }),
})

/** One edit as the API takes it: a field of the head, of a record, of a line (short form), of a lane, or a new record. */
export const apiEdit = component('Edit', z.union([ofHead, ofRecord, ofLine, ofLane, added]))

type ApiEdit = z.output<typeof apiEdit>

/**
 * The same as lib/sheet's operations, judged as far as can be without the document.
 * @throws Problem 'invalid-fields' that names each value that its field cannot hold
 */
export function operationsOf(edits: readonly ApiEdit[]): Operation[] {
  const errors = edits.flatMap(refuse)
  if (errors.length > 0) throw new Problem('invalid-fields', { errors })
  return edits.map(operationOf)
}

function operationOf(edit: ApiEdit): Operation {
  if ('add' in edit) return { op: 'add', section: edit.add, id: edit.id, values: edit.values }
  if ('lane' in edit) return { op: 'lane', line: edit.line, lane: edit.lane, field: edit.field, value: edit.value }
  if ('line' in edit) return setOf('lines', edit.line, edit.field, edit.value)
  if (edit.section === 'head') return { op: 'set', section: 'head', id: null, field: edit.field, value: edit.value }
  return setOf(edit.section, edit.id, edit.field, edit.value)
}

/** A note is set as a whole: the API has no typing to merge. */
function setOf(name: z.output<typeof section>, record: string, key: string, value: z.output<typeof scalar>): Operation {
  return isNote(name, key) && key === 'note'
    ? { op: 'note', section: name, id: record, field: key, text: String(value ?? '') }
    : { op: 'set', section: name, id: record, field: key, value }
}

function refuse(edit: ApiEdit, index: number): FieldProblem[] {
  if ('add' in edit) {
    return Object.entries(edit.values).flatMap(([key, value]) =>
      problem(`edits[${index}].values.${key}`, refuseValue(edit.add, key, value)),
    )
  }
  const name = `edits[${index}].value`
  if ('lane' in edit) {
    return problem(name, refuseValue('laneValues', `${edit.line}/${edit.lane}/${edit.field}`, edit.value))
  }
  const of = 'line' in edit ? 'lines' : edit.section
  if (edit.value === null && of !== 'head' && isNote(of, edit.field)) return []
  return problem(name, refuseValue(of, edit.field, edit.value))
}

function problem(name: string, reason: string | null): FieldProblem[] {
  return reason === null ? [] : [{ field: name, todo: reason }]
}
