export { bitsPerSymbol, type CodedGroup, LEVELS, type LineCode } from './code'
export { type Overhead, overheadOf, type RateInput, type Rates, ratesOf } from './rate'
export { usualMistake } from './wrongNyquist'
