import { LINE_KINDS, type LineKind, type ModelType, PLANE_CODES, type Scalar } from '../../../../../lib/budget/schema'
import type { NewRow } from '../deeds/channel'
import { wordOf } from '../words/choices'
import { isRefused, judgeTyped } from './judge'
import { type Known, type Scan, scan } from './openLineScan'
import { kindOf, type NumberKind, planeIn } from './openLineWords'
import { readTolerance } from './tolerance'

/** What the open line takes over from around it where nothing is typed. */
export type OpenLineContext = Known & {
  /** Frequency that a number without one is taken to be stated at: the allowance's in view, else Nyquist. */
  readonly at: string | null
  /** Assembly of the line above. */
  readonly assembly: string | null
}

export type OpenLine = { readonly row: NewRow; readonly says: string }

/**
 * Reads the open line: 'via 0.60 dB', 'trace 5 in × 0.95 dB/in', 'reserve 1 dB temperature', 'plane RX ball'.
 * @returns the row to add with a sentence that says how it was understood, or a sentence that says what was not.
 */
export function readOpenLine(typed: string, context: OpenLineContext): OpenLine | { readonly reason: string } {
  const text = typed.trim()
  const first = /^\S+/.exec(text)?.[0] ?? ''
  const rest = text.slice(first.length).trim()
  if (first.toLowerCase() === 'plane') return readPlane(rest)
  const kind = kindOf(first)
  if (!kind) return { reason: `'${first}' is no kind of line. Begin with ${LINE_KINDS.join(', ')} or plane.` }
  const read = scan(rest, kind, context)
  return 'reason' in read ? read : lineFrom(kind, read, context)
}

function readPlane(text: string): OpenLine | { readonly reason: string } {
  const plane = planeIn(text)
  if (!plane) {
    const said = text === '' ? 'Say which plane' : `'${text}' is not a plane of the list`
    return { reason: `${said}: ${PLANE_CODES.map(wordOf).join(', ')}.` }
  }
  const name = plane.rest === '' ? null : plane.rest
  return {
    row: { section: 'planes', values: { code: plane.code, name } },
    says: `plane ${wordOf(plane.code)}${name ? `, ${name}` : ''}`,
  }
}

const LENGTHY: readonly LineKind[] = ['trace', 'cable', 'package', 'die']

function lineFrom(kind: LineKind, read: Scan, context: OpenLineContext): OpenLine | { readonly reason: string } {
  const numbers = new Map(read.numbers)
  if (read.bare !== null) {
    if (numbers.has('loss') || LENGTHY.includes(kind)) {
      return { reason: `Add a unit to ${read.bare}: dB, in, mm, dB/in or GHz.` }
    }
    numbers.set('loss', `${read.bare} dB`)
  }
  const model = modelOf(kind, numbers, read.lossClass)
  if (typeof model === 'object' && model !== null) return model
  const typed = typedValues(numbers, model, context.at)
  for (const [field, text] of Object.entries(typed)) {
    const judged = judgeTyped('lines', field, text)
    if (isRefused(judged)) return judged
  }
  const tolerance = readTolerance(read.tolerance ?? '')
  if ('reason' in tolerance) return tolerance
  const purpose = read.remarks.find((remark) => remark.field === 'purpose')?.value ?? null
  const values: Record<string, Scalar> = {
    name: read.name || [capital(kind), purpose].filter(Boolean).join(', '),
    kind,
    model,
    assembly: kind === 'reserve' || kind === 'overlap' ? null : (read.assembly ?? context.assembly),
    lossClass: read.lossClass,
    toleranceMinus: tolerance.minus,
    tolerancePlus: tolerance.plus,
    ...typed,
    ...Object.fromEntries(read.remarks.map((remark) => [remark.field, remark.value])),
  }
  return { row: { section: 'lines', values }, says: sentence(kind, values, context) }
}

/** A line has one model; numbers that belong to two of them are asked back. */
function modelOf(
  kind: LineKind,
  numbers: ReadonlyMap<NumberKind, string>,
  lossClass: string | null,
): ModelType | null | { readonly reason: string } {
  const given = [
    numbers.get('loss'),
    numbers.get('lossPerLength'),
    numbers.get('capacitance'),
    lossClass && 'the loss class',
  ].filter((value) => value !== undefined && value !== null)
  if (given.length > 1) return { reason: `A line finds its loss one way; type either ${given.join(' or ')}.` }
  if (numbers.has('ratio')) return { reason: `Put ± before ${numbers.get('ratio')} if it is the tolerance.` }
  if (numbers.has('loss')) return 'stated'
  if (lossClass) return 'class'
  if (numbers.has('capacitance')) return kind === 'component' ? 'ac-capacitor' : 'pad'
  if (numbers.has('lossPerLength') || (numbers.has('length') && LENGTHY.includes(kind))) {
    return kind === 'cable' ? 'cable' : 'per-length'
  }
  return null
}

function typedValues(numbers: ReadonlyMap<NumberKind, string>, model: ModelType | null, at: string | null) {
  const values: Record<string, string> = {}
  for (const dimension of ['loss', 'lossPerLength', 'length', 'capacitance'] as const) {
    const typed = numbers.get(dimension)
    if (typed !== undefined) values[dimension] = typed
  }
  const needsFrequency = model === 'stated' || model === 'per-length' || model === 'cable'
  const frequency = numbers.get('frequency') ?? (needsFrequency ? at : null)
  if (frequency) values.at = frequency
  return values
}

function sentence(kind: LineKind, values: Readonly<Record<string, Scalar>>, context: OpenLineContext): string {
  const lossClass = context.lossClasses.find(({ id }) => id === values.lossClass)
  const size = [values.length, values.lossPerLength ?? lossClass?.name].filter(Boolean).join(' × ')
  const number = values.loss ?? values.capacitance ?? size
  const assembly = context.assemblies.find(({ id }) => id === values.assembly)
  return [
    `${kind} '${values.name}'`,
    number || 'without a number: the allowance stays undecided',
    values.at ? `at ${values.at}` : number && values.model !== 'class' ? 'no frequency given' : null,
    values.tolerancePlus && `± ${values.tolerancePlus}`,
    values.purpose && `for ${values.purpose}`,
    values.basis,
    values.grade && wordOf(String(values.grade)),
    assembly && `on ${assembly.name}`,
  ]
    .filter(Boolean)
    .join(', ')
}

const capital = (text: string) => text.slice(0, 1).toUpperCase() + text.slice(1)
