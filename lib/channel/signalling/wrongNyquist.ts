import { holdsAt } from '../lines'
import { LEVELS } from './code'
import { type Overhead, overheadOf, type RateInput, type Rates } from './rate'

/** How close a frequency must lie to a mistake's own to be called by its name. */
const CLOSE = 0.005

const RS544: Overhead = { payload: 514, sent: 544 }
const BLOCK_257: Overhead = { payload: 256, sent: 257 }
const BLOCK_66: Overhead = { payload: 64, sent: 66 }
const BLOCK_10: Overhead = { payload: 8, sent: 10 }
/** Rate classes of common electrical interfaces double from 28 Gb/s on; the rates sent lie a few percent below. */
const CLASS_RATE = 28e9
const BELOW_CLASS = 1.12

type Mistake = { readonly hz: number; readonly what: string }

/**
 * Names what a frequency probably is when it is not the Nyquist frequency of the link. Every candidate is computed
 * from the link's own signalling.
 * @param hz the frequency that a number was given at
 * @returns words that continue 'this is …', or null where it is right (within 2 %) or nothing fits within 0.5 %
 */
export function usualMistake(hz: number, input: RateInput, rates: Rates): string | null {
  if (holdsAt(rates.nyquist, hz)) return null
  let best: string | null = null
  let nearest = CLOSE
  for (const mistake of mistakes(input, rates)) {
    const off = Math.abs(hz / mistake.hz - 1)
    if (holdsAt(rates.nyquist, mistake.hz) || off > nearest - (best === null ? 0 : 1e-9)) continue
    best = mistake.what
    nearest = off
  }
  return best
}

function* mistakes(input: RateInput, rates: Rates): Generator<Mistake> {
  const { lineRate, symbolRate, bitsPerSymbol } = rates
  const levels = LEVELS[input.code]
  const oneBit = symbolRate === lineRate
  yield {
    hz: symbolRate,
    what: `the ${oneBit ? 'bit rate, which is the ' : ''}symbol rate; the Nyquist frequency is half of it`,
  }
  yield { hz: lineRate, what: 'the bit rate itself' }
  yield {
    hz: lineRate / levels,
    what: `the bit rate divided by the ${levels} levels instead of by the bits per symbol`,
  }
  if (!oneBit) yield { hz: lineRate / 2, what: 'the Nyquist frequency as if the code were NRZ' }
  if (levels === 2) yield { hz: lineRate / 4, what: 'the Nyquist frequency as if the code were PAM4' }
  for (const { rate, what } of otherRates(input, rates)) {
    yield { hz: rate / bitsPerSymbol / 2, what: `the Nyquist frequency ${what}` }
    if (!oneBit) yield { hz: rate / levels, what: `the bit rate ${what}, divided by the ${levels} levels` }
    yield { hz: rate, what: `the bit rate ${what}` }
  }
}

/** Bit rates that are mistaken for the rate sent. */
function* otherRates(input: RateInput, rates: Rates): Generator<{ rate: number; what: string }> {
  const said = input.blockCode !== null || input.fec !== null
  yield* said ? beforeOverhead(input, rates) : beforeUsualOverhead(rates.lineRate)
  const classRate = CLASS_RATE * 2 ** Math.ceil(Math.log2(rates.lineRate / CLASS_RATE) - 1e-9)
  if (classRate < rates.lineRate * BELOW_CLASS) {
    yield { rate: classRate, what: `of the ${classRate / 1e9} Gb/s rate class, not of the rate sent` }
  }
}

/** The rate at each step of the overheads that the budget says, and one of them put on twice. */
function* beforeOverhead({ blockCode, fec }: RateInput, rates: Rates): Generator<{ rate: number; what: string }> {
  const [block, code] = [overheadOf(blockCode), overheadOf(fec)]
  const payload = rates.lineRate / (block * code)
  yield { rate: payload, what: 'of the payload, without coding and FEC' }
  if (fec !== null) {
    yield { rate: payload * block, what: 'without the FEC' }
    yield { rate: payload * overheadOf(BLOCK_66), what: 'with 64b/66b coding and without the FEC' }
  }
  if (blockCode !== null && fec !== null) yield { rate: payload * code, what: 'without the block code' }
  yield { rate: rates.lineRate * block * code, what: 'with coding and FEC counted twice' }
  if (fec !== null) yield { rate: rates.lineRate * code, what: 'with the FEC counted twice' }
}

/** Where the budget does not say its overheads: the rate as if it contained a usual one. */
function* beforeUsualOverhead(lineRate: number): Generator<{ rate: number; what: string }> {
  const strong = overheadOf(BLOCK_257) * overheadOf(RS544)
  const given = ', if the rate sent contains 256b/257b and RS(544,514)'
  yield { rate: lineRate / overheadOf(BLOCK_66), what: 'without 64b/66b coding, if the rate sent contains it' }
  yield { rate: lineRate / overheadOf(BLOCK_10), what: 'without 8b/10b coding, if the rate sent contains it' }
  yield { rate: lineRate / strong, what: `of the payload, without coding and FEC${given}` }
  yield { rate: (lineRate / strong) * overheadOf(BLOCK_66), what: `with 64b/66b coding and without the FEC${given}` }
  yield { rate: lineRate / overheadOf(RS544), what: `without the FEC${given}` }
}
