import type { Line, ModelType } from '../../../../../lib/budget/schema'

/** One slip of the 'as typed' column, and the words that stand before it. */
export type ModelSlip = { readonly field: keyof Line & string; readonly before?: string }

/** The few values that a line of each model is known by, in reading order; the detail shows the others as well. */
const SLIPS: Readonly<Record<ModelType, readonly ModelSlip[]>> = {
  stated: [{ field: 'loss' }, { field: 'at', before: '@' }],
  class: [{ field: 'length' }, { field: 'lossClass', before: '×' }],
  'per-length': [{ field: 'length' }, { field: 'lossPerLength', before: '×' }, { field: 'at', before: '@' }],
  table: [{ field: 'points' }],
  geometry: [{ field: 'length' }, { field: 'width', before: 'width' }, { field: 'gap', before: 'gap' }],
  via: [
    { field: 'boardThickness', before: 'board' },
    { field: 'stub', before: 'stub' },
  ],
  pad: [{ field: 'capacitance' }],
  'package-line': [{ field: 'length' }, { field: 'impedance', before: 'Zc' }],
  'ac-capacitor': [{ field: 'capacitance' }, { field: 'inductance', before: '+' }],
  cable: [{ field: 'length' }, { field: 'lossPerLength', before: '×' }, { field: 'at', before: '@' }],
  network: [{ field: 'evidence' }, { field: 'portMap', before: 'ports' }],
}

/** Every parameter that a model reads, in the order of the detail; other parameters are kept but not shown. */
const PARAMETERS: Readonly<Record<ModelType, readonly (keyof Line & string)[]>> = {
  stated: ['loss', 'at', 'validFrom', 'validTo', 'length', 'skew'],
  class: ['length', 'lossClass', 'skew'],
  'per-length': ['length', 'lossPerLength', 'at', 'rootTerm', 'linearTerm', 'validFrom', 'validTo', 'skew'],
  table: ['points', 'length', 'validFrom', 'validTo', 'skew'],
  geometry: [
    'length',
    'structure',
    'layer',
    'width',
    'gap',
    'thickness',
    'heightBelow',
    'heightAbove',
    'etch',
    'dk',
    'df',
    'anchor',
    'roughness',
    'roughnessTop',
    'roughnessBottom',
    'skew',
  ],
  via: [
    'boardThickness',
    'usedDepth',
    'stub',
    'drillTolerance',
    'barrel',
    'pad',
    'antipad',
    'pitch',
    'dk',
    'count',
    'skew',
  ],
  pad: ['capacitance', 'count'],
  'package-line': ['length', 'impedance', 'packageGamma0', 'packageA1', 'packageA2', 'packageTau', 'skew'],
  'ac-capacitor': ['capacitance', 'inductance', 'resistance', 'pad'],
  cable: ['length', 'lossPerLength', 'at', 'rootTerm', 'linearTerm', 'endLossA', 'endLossB', 'impedance', 'skew'],
  network: ['evidence', 'portMap', 'taken', 'length', 'skew'],
}

/** A line without a model shows the two slips of a stated number: typing one is the shortest way to a number. */
export function modelSlips(line: Line): readonly ModelSlip[] {
  const special: readonly ModelSlip[] =
    line.kind === 'reserve' ? [{ field: 'purpose', before: 'for' }] : line.kind === 'overlap' ? overlapSlips : []
  return [...SLIPS[line.model ?? 'stated'], ...special]
}

const overlapSlips: readonly ModelSlip[] = [
  { field: 'overlapA', before: 'in' },
  { field: 'overlapB', before: 'and' },
]

export function modelParameters(model: ModelType | null): readonly (keyof Line & string)[] {
  return PARAMETERS[model ?? 'stated']
}
