import { LEVELS } from './code'
import { type Overhead, overheadOf, type RateInput, type Rates } from './rate'

/** A number holds within 2 % of its frequency. */
const SAME = 0.02
/** How close a frequency must lie to a mistake's own to be called by its name. */
const CLOSE = 0.005

const RS544: Overhead = { payload: 514, sent: 544 }
const BLOCK_257: Overhead = { payload: 256, sent: 257 }
const BLOCK_66: Overhead = { payload: 64, sent: 66 }
/** Rate classes of common electrical interfaces double from 28 Gb/s on; the rates sent lie a few percent below. */
const CLASS_RATE = 28e9

type Mistake = { readonly hz: number; readonly what: string }

/**
 * Names what a frequency probably is when it is not the Nyquist frequency of the link. Every candidate is computed
 * from the link's own signalling.
 * @param hz the frequency that a number was given at
 * @returns words that continue 'this is …', or null where it is right (within 2 %) or nothing fits within 0.5 %
 */
export function usualMistake(hz: number, input: RateInput, rates: Rates): string | null {
  if (Math.abs(hz / rates.nyquist - 1) <= SAME) return null
  let best: Mistake | null = null
  for (const mistake of mistakes(input, rates)) {
    if (Math.abs(mistake.hz / rates.nyquist - 1) <= SAME) continue
    const off = Math.abs(hz / mistake.hz - 1)
    if (off <= CLOSE && (best === null || off < Math.abs(hz / best.hz - 1) - 1e-9)) best = mistake
  }
  return best?.what ?? null
}

function* mistakes(input: RateInput, rates: Rates): Generator<Mistake> {
  const nyquistAt = (bitRate: number) => bitRate / rates.bitsPerSymbol / 2
  const levels = LEVELS[input.code]
  const single = rates.symbolRate === rates.lineRate
  yield {
    hz: rates.symbolRate,
    what: single
      ? 'the bit rate, which is the symbol rate here; the Nyquist frequency is half of it'
      : 'the symbol rate; the Nyquist frequency is half of it',
  }
  yield { hz: rates.lineRate, what: 'the bit rate itself' }
  yield {
    hz: rates.lineRate / levels,
    what: `the bit rate divided by the ${levels} levels instead of by the bits per symbol`,
  }
  if (!single) yield { hz: rates.lineRate / 2, what: 'the Nyquist frequency as if the code were NRZ' }
  if (levels === 2) yield { hz: rates.lineRate / 4, what: 'the Nyquist frequency as if the code were PAM4' }
  yield* withoutOverhead(input, rates, nyquistAt)
  const step = Math.ceil(Math.log2(rates.lineRate / CLASS_RATE) - 1e-9)
  const classRate = CLASS_RATE * 2 ** step
  if (classRate / rates.lineRate < 1.12) {
    yield {
      hz: nyquistAt(classRate),
      what: `the Nyquist frequency of the ${classRate / 1e9} Gb/s rate class, not of the rate sent`,
    }
  }
}

/** Rates before coding or FEC, or with an overhead of another kind. Where the budget does not say its overheads, the usual ones are tried. */
function* withoutOverhead(input: RateInput, rates: Rates, nyquistAt: (bitRate: number) => number): Generator<Mistake> {
  const said = input.blockCode !== null || input.fec !== null
  const blockCode = said ? input.blockCode : BLOCK_257
  const fec = said ? input.fec : RS544
  const payload = rates.payloadRate ?? rates.lineRate / (overheadOf(blockCode) * overheadOf(fec))
  const maybe = said ? '' : ', if the rate sent contains 256b/257b and RS(544,514)'
  yield { hz: nyquistAt(payload), what: `the Nyquist frequency of the payload, without coding and FEC${maybe}` }
  if (fec !== null) {
    yield { hz: nyquistAt(payload * overheadOf(blockCode)), what: `the Nyquist frequency without the FEC${maybe}` }
    yield {
      hz: nyquistAt(payload * overheadOf(BLOCK_66)),
      what: `the Nyquist frequency with 64b/66b coding and without the FEC${maybe}`,
    }
    yield { hz: nyquistAt(rates.lineRate * overheadOf(fec)), what: 'the Nyquist frequency with the FEC counted twice' }
  }
  if (blockCode !== null && fec !== null) {
    yield { hz: nyquistAt(payload * overheadOf(fec)), what: `the Nyquist frequency without the block code${maybe}` }
  }
}
