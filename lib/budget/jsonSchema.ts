import { z } from 'zod'
import { DIMENSIONS, type Dimension } from '../channel/units'
import { budgetSchema, type FieldMeta, fieldMeta, LIMITS, SAMPLES, type SectionName } from './schema'

const ABOUT: Readonly<Record<'head' | SectionName | 'laneValues', string>> = {
  head: 'The link and its signalling, said once.',
  assemblies: 'What somebody builds, by id.',
  lossClasses: 'Loss tables of the assemblies, by id.',
  layers: 'Stack-ups of the assemblies, by id, top layer first.',
  lines: 'Line items, by id. They share the order of the planes: together they are the channel.',
  planes: 'Reference planes between the line items, by id.',
  allowances: 'Loss limits between two planes, by id.',
  shares: 'Parts of an allowance given away beforehand, by id.',
  corners: 'Named sets of conditions, by id.',
  evidence: 'Attached files, by id.',
  figures: 'Companion figures such as COM and ERL, by id.',
  signOffs: 'Disciplines whose signature a revision needs, by id.',
  laneValues: "What one lane says instead of its line, by 'line/lane/field', as text with its unit.",
}

/**
 * The JSON Schema (draft 2020-12) of a budget file, generated from the schema that every door of the program checks against.
 * It describes shape, choices, numbers and lengths; that a text is a quantity within its bounds is said in words.
 */
export function budgetJsonSchema(): Record<string, unknown> {
  const generated = z.toJSONSchema(budgetSchema, {
    target: 'draft-2020-12',
    io: 'input',
    override: ({ zodSchema, jsonSchema }) => {
      const meta = fieldMeta.get(zodSchema as unknown as z.ZodType)
      if (!meta) return
      jsonSchema.description = describe(meta)
      const examples = examplesOf(meta)
      if (examples.length > 0) jsonSchema.examples = examples
    },
  })
  for (const [name, about] of Object.entries(ABOUT)) {
    const section = generated.properties?.[name]
    if (typeof section !== 'object') continue
    section.description = about
    if (name !== 'head') section.maxProperties = name === 'laneValues' ? LIMITS.laneValues : LIMITS.recordsPerSection
  }
  return {
    ...generated,
    title: 'Halfbaud budget file, version 1',
    description: 'The loss budget of one direction of a serial link. Unknown fields are refused.',
  }
}

function describe(meta: FieldMeta): string {
  switch (meta.kind) {
    case 'quantity':
      return `${meta.what} A number with its unit: ${meta.dimensions.map((each) => quantityWords(each, meta)).join('; or ')}.`
    case 'set':
      return `${meta.what} Codes in this order, one space between: ${meta.choices.join(' ')}.`
    case 'reference':
      return `${meta.what} An id of '${meta.section}'.`
    default:
      return meta.what
  }
}

/** Bounds belong to the first dimension; another one is a share of it. */
function quantityWords(dimension: Dimension, meta: Extract<FieldMeta, { kind: 'quantity' }>): string {
  const { si, units } = DIMENSIONS[dimension]
  const named = Object.keys(units).filter(Boolean).join(', ')
  const kind = `dimension ${dimension}, ${named ? `in ${named}` : 'without a unit'}`
  if (dimension !== meta.dimensions[0]) return `${kind}, from 0 % to 1000 %`
  return `${kind}, from ${meta.min} to ${meta.max}${si === '1' ? '' : ` ${si}`}`
}

function examplesOf(meta: FieldMeta): string[] {
  if (meta.kind === 'order') return ['a0', 'a1', 'a0V']
  return meta.kind === 'quantity' ? meta.dimensions.map((dimension) => SAMPLES[dimension]) : []
}
