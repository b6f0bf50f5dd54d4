import type { Line, ModelType } from '../../../../../lib/budget/schema'
import { byTerms } from './modelParameters'

/** One slip of the 'as typed' column, and the words that stand before it. */
export type ModelSlip = { readonly field: keyof Line & string; readonly before?: string }

const LENGTH_AND_NUMBER: readonly ModelSlip[] = [
  { field: 'length' },
  { field: 'lossPerLength', before: '×' },
  { field: 'at', before: '@' },
]
const LENGTH_AND_TERMS: readonly ModelSlip[] = [
  { field: 'length' },
  { field: 'rootTerm', before: '× √f' },
  { field: 'linearTerm', before: '+ f' },
]

/** The few values that a line of each model is known by, in reading order; the detail shows the others as well. */
const SLIPS: Readonly<Record<ModelType, readonly ModelSlip[]>> = {
  stated: [{ field: 'loss' }, { field: 'at', before: '@' }],
  class: [{ field: 'length' }, { field: 'lossClass', before: '×' }],
  'per-length': LENGTH_AND_NUMBER,
  table: [{ field: 'points' }],
  geometry: [{ field: 'length' }, { field: 'layer', before: 'on' }, { field: 'width', before: 'width' }],
  via: [
    { field: 'usedDepth', before: 'used' },
    { field: 'stub', before: 'stub' },
  ],
  pad: [{ field: 'capacitance' }],
  'package-line': [{ field: 'length' }, { field: 'impedance', before: 'Zc' }],
  'ac-capacitor': [{ field: 'capacitance' }, { field: 'inductance', before: '+' }],
  cable: LENGTH_AND_NUMBER,
  network: [{ field: 'evidence' }, { field: 'taken', before: 'as' }],
}

/** A line without a model shows the two slips of a stated number: typing one is the shortest way to a number. */
export function modelSlips(line: Line): readonly ModelSlip[] {
  const special: readonly ModelSlip[] =
    line.kind === 'reserve' ? [{ field: 'purpose', before: 'for' }] : line.kind === 'overlap' ? overlapSlips : []
  return [...ownSlips(line), ...special]
}

function ownSlips(line: Line): readonly ModelSlip[] {
  const { model } = line
  if ((model === 'per-length' || model === 'cable') && byTerms(line)) return LENGTH_AND_TERMS
  return SLIPS[model ?? 'stated']
}

const overlapSlips: readonly ModelSlip[] = [
  { field: 'overlapA', before: 'in' },
  { field: 'overlapB', before: 'and' },
]
