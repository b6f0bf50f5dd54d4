import type { Line, ModelType } from '../../../../../lib/budget/schema'

type LineField = keyof Line & string
/** What of a line decides which parameters its model reads. */
export type ModelChoice = Pick<
  Line,
  'model' | 'structure' | 'roughness' | 'taken' | 'rootTerm' | 'linearTerm' | 'squareTerm'
>

/**
 * Every parameter that the line's model reads with what is chosen so far, in the order of the detail; other parameters are
 * kept but not shown. Where a model can be given in two ways, both are offered until one of them is taken.
 */
export function modelParameters(line: ModelChoice): readonly LineField[] {
  return PARAMETERS[line.model ?? 'stated'](line)
}

/** Whether the model computes its number from values that may vary from build to build. */
export function canVary(line: ModelChoice): boolean {
  switch (line.model) {
    case 'geometry':
    case 'via':
    case 'pad':
    case 'package-line':
    case 'ac-capacitor':
      return true
    case 'per-length':
    case 'cable':
      return byTerms(line)
    case 'network':
      return line.taken === 'per-length'
    default:
      return false
  }
}

/** √f, f and f² terms over a range, in place of a number at one frequency. */
export const byTerms = ({ rootTerm, linearTerm, squareTerm }: ModelChoice) =>
  rootTerm !== null || linearTerm !== null || squareTerm !== null

/** With both a line reflects in the cascade; without them it enters matched. */
const ITSELF = ['impedance', 'delay'] as const
const RANGE = ['validFrom', 'validTo'] as const
const NUMBER = ['lossPerLength', 'at'] as const

const PARAMETERS: Readonly<Record<ModelType, (line: ModelChoice) => readonly LineField[]>> = {
  stated: () => ['loss', 'at', 'length', 'skew'],
  class: () => ['length', 'lossClass', ...ITSELF, 'skew'],
  'per-length': (line) =>
    byTerms(line)
      ? ['length', 'rootTerm', 'linearTerm', ...RANGE, ...ITSELF, 'skew']
      : ['length', ...NUMBER, 'rootTerm', 'linearTerm', 'skew'],
  table: () => ['points', 'length', ...ITSELF, 'skew'],
  geometry,
  via: () => [
    ...(['boardThickness', 'usedDepth', 'stub', 'drillTolerance', 'barrel', 'pad', 'antipad', 'pitch'] as const),
    ...(['dk', 'df', 'count', 'skew'] as const),
  ],
  pad: () => ['capacitance', 'skew'],
  'package-line': () => [
    ...(['length', 'impedance', 'packageGamma0', 'packageA1', 'packageA2', 'packageTau'] as const),
    ...(['secondLength', 'secondImpedance', 'padCapacitance', 'mirrored', 'skew'] as const),
  ],
  'ac-capacitor': () => ['capacitance', 'resistance', 'inductance', 'padCapacitance', 'skew'],
  cable: (line) => {
    const ends = ['endLossA', 'endLossB'] as const
    const terms = ['rootTerm', 'linearTerm', 'squareTerm'] as const
    return byTerms(line)
      ? ['length', ...terms, ...RANGE, ...ends, 'at', ...ITSELF, 'skew']
      : ['length', ...NUMBER, ...ends, ...terms, 'skew']
  },
  network: ({ taken }) =>
    taken === 'per-length'
      ? ['taken', 'evidence', 'portMap', 'shortEvidence', 'lengthDifference', 'length', 'skew']
      : ['taken', 'evidence', 'portMap', 'fixture', 'length', 'skew'],
}

/** Heights and copper may come from the stack-up; the line's own values go first. */
function geometry({ structure, roughness }: ModelChoice): readonly LineField[] {
  const coupled = structure === null || structure.startsWith('coupled')
  const stripline = structure === null || structure.endsWith('stripline')
  return [
    ...(['length', 'structure', 'layer', 'width'] as const),
    ...(coupled ? (['gap'] as const) : []),
    ...(['thickness', 'heightBelow'] as const),
    ...(stripline ? (['heightAbove'] as const) : []),
    ...(['etch', 'dk', 'df', 'anchor', 'method', 'resin', 'roughness'] as const),
    ...foil(roughness),
    ...(['scale', 'skew'] as const),
  ]
}

function foil(roughness: Line['roughness']): readonly LineField[] {
  if (roughness === 'huray') return ['areaRatio', 'nodules']
  return roughness === 'hammerstad' || roughness === 'cannonball' ? ['roughnessTop', 'roughnessBottom'] : []
}
