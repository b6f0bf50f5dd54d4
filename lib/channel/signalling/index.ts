export { bitsPerSymbol, type CodedGroup, LEVELS, type LineCode } from './code'
export { type Overhead, overheadOf, type RateInput, type Rates, ratesOf } from './rate'
export {
  kneeFrequency,
  levelPower,
  type Spectrum,
  spectrumOf,
  type Trapezoid,
  trapezoidCorners,
  trapezoidHarmonics,
} from './spectrum'
export { usualMistake } from './wrongNyquist'
