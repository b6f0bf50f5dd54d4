import { describe, expect, it } from 'vitest'
import { budgetJsonSchema } from '../../lib/budget/jsonSchema'
import { head, SECTIONS } from '../../lib/budget/schema'

type Node = {
  description?: string
  properties?: Record<string, Node>
  additionalProperties?: Node | boolean
  propertyNames?: { pattern?: string }
  examples?: string[]
  maxProperties?: number
  required?: string[]
}
const schema = budgetJsonSchema() as Node & { $schema: string }
const sections = schema.properties ?? {}
const recordOf = (section: string): Node => {
  const node = sections[section]
  const record = section === 'head' ? node : node?.additionalProperties
  return typeof record === 'object' ? record : {}
}

describe('the JSON Schema of a budget file', () => {
  it('is draft 2020-12 and needs nothing but the head', () => {
    expect(schema.$schema).toBe('https://json-schema.org/draft/2020-12/schema')
    expect(schema.required).toEqual(['head'])
    expect(schema.additionalProperties).toBe(false)
  })

  it.each([
    ['head', head.shape],
    ...Object.entries(SECTIONS).map(([name, section]) => [name, section.shape] as const),
  ] as const)('describes every field of %s and refuses others', (section, shape) => {
    const record = recordOf(section)
    expect(Object.keys(record.properties ?? {})).toEqual(Object.keys(shape))
    expect(record.additionalProperties).toBe(false)
    for (const [field, node] of Object.entries(record.properties ?? {})) {
      if (field !== 'schemaVersion') expect(node.description, `${section}.${field}`).toMatch(/\w.*\.$/)
    }
  })

  it('says what each section is, and how many records it holds', () => {
    for (const [name, node] of Object.entries(sections)) expect(node.description, name).toMatch(/\w.*\.$/)
    expect(sections.lines?.maxProperties).toBe(500)
    expect(sections.lines?.propertyNames?.pattern).toBe('^[a-z0-9][a-z0-9-]{0,39}$')
  })

  it('says the dimension, the units and the bounds of a quantity', () => {
    const line = recordOf('lines').properties ?? {}
    expect(line.at?.description).toBe(
      'Frequency of the stated loss. A number with its unit: dimension frequency, in Hz, kHz, MHz, GHz, from 100000 to 300000000000 Hz.',
    )
    expect(line.toleranceMinus?.description).toMatch(/in dB, from 0 to 100 dB; or dimension ratio, in %,/)
    expect(line.dk?.description).toMatch(/dimension number, without a unit, from 1 to 20\.$/)
    expect(line.lossClass?.description).toBe("Loss class of the assembly. An id of 'lossClasses'.")
    expect(line.loss?.examples).toEqual(['1.35 dB'])
  })

  it('is plain JSON', () => {
    expect(JSON.parse(JSON.stringify(schema))).toEqual(schema)
  })
})
