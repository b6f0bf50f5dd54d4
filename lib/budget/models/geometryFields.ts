import type { Structure } from '../../channel/lines/structures'
import type { Nodules } from '../../channel/materials/roughness'
import { isQuantity, parseQuantity } from '../../channel/units'
import { FREQUENCY, LENGTH, NUMBER, type Reader } from '../quantities'
import { type FromStackup, fromStackup } from '../stackup/fromStackup'
import type { Trace } from './geometryPiece'
import type { ModelInput } from './model'
import type { Values } from './piece'

/** Fields that a stack-up may stand in for. */
type Stacked = 'thickness' | 'heightBelow' | 'heightAbove' | 'roughnessTop' | 'roughnessBottom'

type Read = { readonly trace: Trace; readonly values: Values }

/** Reads the fields of a trace, or writes down what is missing: all of it, not the first one only. */
export function readTrace(input: ModelInput): Read | null {
  const { fields, line } = input
  const { structure } = line
  if (structure === null) {
    return fields.say(
      'field-missing',
      'structure',
      `${fields.name}: the cross-section is not given.`,
      'Choose microstrip or stripline, single or as an edge-coupled pair.',
    )
  }
  const stack = stackOf(input, structure)
  const values: Record<string, number | null> = {}
  values.length = fields.need('length', LENGTH)
  values.width = fields.need('width', LENGTH)
  if (structure.startsWith('coupled')) values.gap = fields.need('gap', LENGTH)
  for (const field of fieldsOf(structure, line.roughness)) values[field] = stackedValue(input, stack, field)
  for (const [field, reader] of [
    ['etch', LENGTH],
    ['scale', NUMBER],
  ] as const) {
    const value = fields.may(field, reader)
    if (value !== null) values[field] = value === 'unreadable' ? null : value
  }
  const laminate = laminateOf(input, stack)
  const roughness = roughnessOf(input)
  values.dk = laminate?.dk ?? null
  values.df = laminate?.df ?? null
  if (laminate === null || roughness === null || !complete(values)) return null
  return { trace: { structure, anchor: laminate.anchor, roughness, surroundings: input.surroundings }, values }
}

function complete(values: Readonly<Record<string, number | null>>): values is Values {
  return Object.values(values).every((value) => value !== null)
}

function stackOf({ line, budget }: ModelInput, structure: Structure): FromStackup | string | null {
  if (line.layer === null || line.layer.trim() === '') return null
  return fromStackup(budget, line.assembly, line.layer, structure.endsWith('microstrip'))
}

function fieldsOf(structure: Structure, roughness: string | null): readonly Stacked[] {
  const heights: Stacked[] = structure.endsWith('microstrip') ? ['heightBelow'] : ['heightBelow', 'heightAbove']
  const foil: Stacked[] =
    roughness === 'hammerstad' || roughness === 'cannonball' ? ['roughnessTop', 'roughnessBottom'] : []
  return ['thickness', ...heights, ...foil]
}

/** The line's own value first, then what its layer says. */
function stackedValue({ fields, line }: ModelInput, stack: FromStackup | string | null, field: Stacked): number | null {
  if (line[field] !== null || stack === null) return fields.need(field, LENGTH)
  const found = typeof stack === 'string' ? stack : stack[field]
  return typeof found === 'number' ? found : notInStack(fields, field, found)
}

function notInStack(fields: ModelInput['fields'], field: Stacked | 'dk', why: string): null {
  return fields.say(
    'field-missing',
    field,
    `${fields.name}: a value is not given, and ${why}.`,
    'Type it here, or complete the stack-up.',
  )
}

/** Dk, Df and their frequency belong together: all three are the line's own, or all three the stack-up's. */
function laminateOf({ fields, line }: ModelInput, stack: FromStackup | string | null) {
  const own = line.dk !== null || line.df !== null || line.anchor !== null
  if (own || stack === null) {
    const dk = fields.need('dk', NUMBER)
    const df = fields.need('df', NUMBER)
    const anchor = fields.need('anchor', FREQUENCY)
    return dk === null || df === null || anchor === null ? null : { dk, df, anchor }
  }
  const found = typeof stack === 'string' ? stack : stack.laminate
  if (typeof found === 'string') return notInStack(fields, 'dk', found)
  if (typeof stack !== 'string' && stack.withoutMethod.length > 0) {
    fields.say(
      'laminate-unproven',
      'layer',
      `${fields.name}: layer ${stack.withoutMethod.join(', ')} does not say the method that its Dk and Df were found by.`,
      'Type what the data sheet says.',
    )
  }
  return found
}

function roughnessOf({ fields, line }: ModelInput): Trace['roughness'] | null {
  if (line.roughness === null) {
    return fields.say(
      'field-missing',
      'roughness',
      `${fields.name}: the model of the foil's roughness is not given.`,
      "Choose 'cannonball' and type the foil's Rz, or 'smooth' where no roughness is meant.",
    )
  }
  if (line.roughness !== 'huray') return line.roughness
  const base = fields.need('areaRatio', NUMBER)
  const nodules = nodulesOf(fields, line.nodules)
  return base === null || nodules === null ? null : { base, nodules }
}

const EXAMPLE = "such as '0.5 µm 3.24; 0.2 µm 0.8': radius, then the area of all spheres of it over the flat area"

function nodulesOf(fields: ModelInput['fields'], text: string | null): readonly Nodules[] | null {
  const pieces = (text ?? '').split(/[;\n\r]+/).filter((piece) => piece.trim() !== '')
  if (pieces.length === 0) {
    return fields.say('field-missing', 'nodules', `${fields.name}: the nodules are not given.`, `Type them ${EXAMPLE}.`)
  }
  const nodules = pieces.map((piece) => {
    const [, size = '', ratio = ''] = /^(.*\S)\s+(\S+)$/.exec(piece.trim()) ?? []
    return [read(size, LENGTH), read(ratio, NUMBER)] as const
  })
  const readable = nodules.flatMap(([radius, areaRatio]) =>
    radius !== null && radius > 0 && areaRatio !== null && areaRatio >= 0 ? [{ radius, areaRatio }] : [],
  )
  if (readable.length === pieces.length) return readable
  return fields.say(
    'unreadable-value',
    'nodules',
    `${fields.name}: the nodules cannot be read.`,
    `Type them ${EXAMPLE}.`,
  )
}

function read(text: string, { dimensions }: Reader): number | null {
  const quantity = parseQuantity(text, dimensions)
  return isQuantity(quantity) ? quantity.value : null
}
