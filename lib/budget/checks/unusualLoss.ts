import { twoTermAttenuation } from '../../channel/lines'
import { type Band, usualCableLoss, usualTraceLoss } from '../../channel/lines/usualLoss'
import { formatQuantity, formatScaled, isQuantity, type Quantity } from '../../channel/units'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import { FREQUENCY, LOSS_PER_LENGTH, typedValue } from '../quantities'
import { isUniform } from '../uniform'
import { unitSuspected } from '../unitSuspected'
import type { LineCheck } from './check'
import { lineFlag } from './lineFlag'

/** Asked about below a fifth of the least and above twice the most that is usual for the kind. */
const LEAST = 0.2
const MOST = 2

/** An attenuation per length as it was typed, and where. */
type Typed = { readonly quantity: Quantity; readonly hz: number; readonly field: string }

/** An attenuation per length that is far from what its kind loses: a wrong unit, or a number of something else. */
export const unusualLoss: LineCheck = function* (item, { nyquist }) {
  const { kind } = item.line
  const usual = kind === 'trace' ? usualTraceLoss : kind === 'cable' && isUniform(item.line) ? usualCableLoss : null
  const typed = usual === null ? null : typedPerLength(item, nyquist)
  const band = usual === null || typed === null ? null : usual(typed.hz)
  if (typed === null || band === null) return
  const { value } = typed.quantity
  if (value >= LEAST * band.low && value <= MOST * band.high) return
  yield flag(item, typed, band)
}

function flag(item: LineItem, { quantity, hz, field }: Typed, band: Band): FlagDraft {
  const unit = unitSuspected(quantity, ['dB/m', 'dB/in', 'dB/ft'], (value) => value >= band.low && value <= band.high)
  const inUnit = (value: number) => formatQuantity(value, 'lossPerLength', 'dB/in', 2)
  const found = `loses ${inUnit(quantity.value)} at ${formatScaled(hz, 'frequency')}, where ${inUnit(band.low)} to ${inUnit(band.high)} are usual for a ${item.line.kind}`
  if (unit === null) {
    return lineFlag(item, 'per-length-unusual', field, `${found}.`, 'Check the number, its unit and its frequency.')
  }
  const [typed, meant] = [quantity.unit, unit]
  return lineFlag(
    item,
    'unit-suspected',
    field,
    `${found}; the number would be usual in ${meant} and was typed in ${typed}.`,
    `Check whether ${meant} was meant.`,
  )
}

function typedPerLength({ line, lossClass }: LineItem, nyquist: number | null): Typed | null {
  if (line.model === 'class' && lossClass !== null) {
    return typed(lossClass.lossPerLength, typedValue(FREQUENCY, lossClass.at) ?? nyquist, 'lossClass')
  }
  if (line.model !== 'per-length' && line.model !== 'cable') return null
  if (line.rootTerm === null && line.linearTerm === null) {
    return typed(line.lossPerLength, typedValue(FREQUENCY, line.at) ?? nyquist, 'lossPerLength')
  }
  const [root, linear] = [typedValue(LOSS_PER_LENGTH, line.rootTerm), typedValue(LOSS_PER_LENGTH, line.linearTerm)]
  const result = line.rootTerm === null ? null : LOSS_PER_LENGTH.read(line.rootTerm)
  if (nyquist === null || root === null || linear === null || result === null || !isQuantity(result)) return null
  const square = typedValue(LOSS_PER_LENGTH, line.squareTerm) ?? 0
  const value = twoTermAttenuation(root, linear, nyquist) + square * (nyquist / 1e9) ** 2
  return { quantity: { ...result, value }, hz: nyquist, field: 'rootTerm' }
}

function typed(text: string | null, hz: number | null, field: string): Typed | null {
  const quantity = text === null ? null : LOSS_PER_LENGTH.read(text)
  return quantity === null || hz === null || !isQuantity(quantity) ? null : { quantity, hz, field }
}
