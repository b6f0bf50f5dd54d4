import { inOrder, livingRecord, nameOf, recordOf } from '../record'
import { type Budget, fieldMeta, type Scalar, SECTIONS, type SectionName } from '../schema'
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
export const references: Check = function* ({ context: { budget } }) {
  for (const { section, fields } of REFERENCES) {
    if (!fields.some(({ field, target }) => anyDangling(budget, section, field, target))) continue
    for (const [id, record] of inOrder(budget, section)) {
      for (const { field, target } of fields) {
        const value = danglingValue(budget, record, field, target)
        if (value === null) continue
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
  }
}

function anyDangling(budget: Budget, section: SectionName, field: string, target: SectionName): boolean {
  const records = budget[section]
  for (const id in records) {
    const record = records[id]
    if (record && !record.removed && danglingValue(budget, record, field, target) !== null) return true
  }
  return false
}

function danglingValue(budget: Budget, record: object, field: string, target: SectionName): string | null {
  const value = (record as Readonly<Record<string, Scalar>>)[field]
  return typeof value === 'string' && livingRecord(budget, target, value) === null ? value : null
}
