import {
  type FieldMeta,
  fieldMeta,
  head,
  LANE_KEY,
  LIMITS,
  laneValue,
  type Scalar,
  SECTIONS,
  type SectionName,
} from '../budget/schema'

/**
 * The budget as a Yjs document (write path, rule 1). Roots, all Y.Map:
 * - 'head': field → scalar;
 * - one root per section of the schema: record id → Y.Map of field → scalar, where a 'note' field is a Y.Text;
 * - 'laneValues': 'line/lane/field' → string or null.
 * A record has every field of its section from the moment it is made, null where empty. Nothing is ever deleted.
 */
export const SECTION_NAMES = Object.keys(SECTIONS) as readonly SectionName[]
export const ROOTS: readonly string[] = ['head', ...SECTION_NAMES, 'laneValues']

export function isSection(name: string): name is SectionName {
  return Object.hasOwn(SECTIONS, name)
}

/** Fields of a record of this section, or of the head, in schema order. */
export function fieldsOf(section: 'head' | SectionName): readonly string[] {
  return Object.keys(section === 'head' ? head.shape : SECTIONS[section].shape)
}

export function metaOf(section: 'head' | SectionName, field: string): FieldMeta | null {
  const schema = fieldSchema(section, field)
  return (schema && fieldMeta.get(schema)) ?? null
}

export function isNote(section: 'head' | SectionName, field: string): boolean {
  return metaOf(section, field)?.kind === 'note'
}

/** Judges one value of one field. @returns null if it may be kept, else a sentence that says what to do. */
export function refuseValue(
  section: 'head' | SectionName | 'laneValues',
  field: string,
  value: unknown,
): string | null {
  if (Object.is(value, -0)) return 'Write zero without a minus sign.'
  if (section === 'laneValues') {
    if (!LANE_KEY.test(field) || Number(field.split('/')[1]) > LIMITS.lanes)
      return "A lane value's key is 'line/lane/field'."
    const result = laneValue.safeParse(value)
    if (!result.success) return result.error.issues[0]?.message ?? 'Not a lane value.'
    const laneField = field.split('/')[2] ?? ''
    return value === null ? null : refuseValue('lines', laneField, value)
  }
  const schema = fieldSchema(section, field)
  if (!schema) return `'${field}' is not a field of '${section}'.`
  const result = schema.safeParse(value)
  return result.success ? null : (result.error.issues[0]?.message ?? 'Not a value of this field.')
}

/** The values a new record starts with: null, false for 'removed', '' for notes. 'order' must be given. */
export function emptyRecord(section: SectionName): Record<string, Scalar> {
  return Object.fromEntries(
    fieldsOf(section).map((field) => [field, field === 'removed' ? false : isNote(section, field) ? '' : null]),
  )
}

function fieldSchema(section: 'head' | SectionName, field: string) {
  const shape: Record<string, import('zod').ZodType> = section === 'head' ? head.shape : SECTIONS[section].shape
  return Object.hasOwn(shape, field) ? shape[field] : undefined
}
