import type { FlagDraft } from '../flags'
import { inOrder, livingRecord, nameOf, recordOf } from '../record'
import { type Budget, fieldMeta, type Line, type Scalar, SECTIONS, type SectionName } from '../schema'
import type { Check } from './check'

/** References that have a flag of their own where they matter. */
const ELSEWHERE: readonly string[] = [
  'lines.lossClass',
  'lines.overlapA',
  'lines.overlapB',
  'allowances.from',
  'allowances.to',
  'allowances.judgedCorner',
]

/** Section → its fields that name a record of another section. */
const REFERENCES = (Object.keys(SECTIONS) as SectionName[]).map((section) => ({
  section,
  fields: Object.entries(SECTIONS[section].shape).flatMap(([field, schema]) => {
    const meta = fieldMeta.get(schema)
    if (meta?.kind !== 'reference' || ELSEWHERE.includes(`${section}.${field}`)) return []
    return [{ field, target: meta.section as SectionName }]
  }),
}))

/** References to records that do not exist or were taken out: two people may remove and refer at the same time. */
export const references: Check = function* ({ context: { budget, items } }) {
  for (const { section, fields } of REFERENCES) {
    if (fields.length === 0) continue
    if (section === 'lines') {
      for (const { id, line, content } of items) {
        const made = ofLine(line, content, fields)
        if (made.length > 0) yield* dangling(budget, section, id, line, made)
      }
    } else if (anyDangling(budget, section, fields)) {
      for (const [id, record] of inOrder(budget, section)) {
        yield* dangling(budget, section, id, record, named(record, fields))
      }
    }
  }
}

type Field = { readonly field: string; readonly target: SectionName }
type Named = Field & { readonly value: string }

/** The references that a record makes. */
function named(record: object, fields: readonly Field[]): Named[] {
  const values = record as Readonly<Record<string, Scalar>>
  const found: Named[] = []
  for (const { field, target } of fields) {
    const value = values[field]
    if (typeof value === 'string') found.push({ field, target, value })
  }
  return found
}

/** Lines kept; more than a worksheet has, for several worksheets. */
const MOST = 20_000
const kept = new Map<string, readonly Named[]>()

/** Remembered, because a line has many fields that may refer and few that do. */
function ofLine(line: Line, content: string, fields: readonly Field[]): readonly Named[] {
  const known = kept.get(content)
  if (known) return known
  if (kept.size >= MOST) kept.clear()
  const found = named(line, fields)
  kept.set(content, found)
  return found
}

function anyDangling(budget: Budget, section: SectionName, fields: readonly Field[]): boolean {
  const records = budget[section]
  for (const id in records) {
    const record = records[id]
    if (!record || record.removed) continue
    if (named(record, fields).some(({ target, value }) => livingRecord(budget, target, value) === null)) return true
  }
  return false
}

function* dangling(
  budget: Budget,
  section: SectionName,
  id: string,
  record: object,
  references: readonly Named[],
): Generator<FlagDraft> {
  for (const { field, target, value } of references) {
    if (livingRecord(budget, target, value) !== null) continue
    const gone = recordOf(budget, target, value)
    const what = gone ? `${nameOf(target, value, gone)}, which was taken out` : `'${value}', which does not exist`
    yield {
      code: 'dangling-reference',
      section,
      id,
      field,
      message: `${nameOf(section, id, record)} refers to ${what}.`,
      todo: 'Choose another, or clear the field.',
    }
  }
}
