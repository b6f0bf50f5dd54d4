import { bitsPerSymbol, type CodedGroup, type LineCode } from './code'

/** A block code or an FEC: so many bits or symbols become so many. 256b/257b is 256 → 257, RS(544,514) is 514 → 544. */
export type Overhead = { readonly payload: number; readonly sent: number }

export type RateInput = {
  /** Bits per second of one lane. */
  readonly bitRate: number
  /** 'line': as sent, coding and FEC included; 'payload': before them. */
  readonly rateType: 'line' | 'payload'
  readonly code: LineCode
  readonly group: CodedGroup | null
  readonly blockCode: Overhead | null
  readonly fec: Overhead | null
}

export type Rates = {
  /** b/s before block code and FEC; null where a line rate comes without saying them. */
  readonly payloadRate: number | null
  /** b/s as sent. */
  readonly lineRate: number
  readonly bitsPerSymbol: number
  /** Bd. */
  readonly symbolRate: number
  /** s. */
  readonly unitInterval: number
  /** Hz. */
  readonly nyquist: number
}

/**
 * Symbol rate = line rate / bits per symbol; Nyquist = symbol rate / 2 (H. Nyquist, 'Certain topics in telegraph
 * transmission theory', Trans. AIEE 47, 1928: the least bandwidth for so many symbols a second).
 * For RZ the same definition is kept, because it counts symbols and not pulses; a run of ones then has its
 * fundamental at the symbol rate, twice the Nyquist frequency.
 * @returns null where the code's group is impossible for its levels.
 */
export function ratesOf(input: RateInput): Rates | null {
  const bits = bitsPerSymbol(input.code, input.group)
  if (bits === null) return null
  const overhead = overheadOf(input.blockCode) * overheadOf(input.fec)
  const lineRate = input.rateType === 'payload' ? input.bitRate * overhead : input.bitRate
  const said = input.blockCode !== null || input.fec !== null
  const payloadRate = input.rateType === 'payload' ? input.bitRate : said ? input.bitRate / overhead : null
  const symbolRate = lineRate / bits
  return {
    payloadRate,
    lineRate,
    bitsPerSymbol: bits,
    symbolRate,
    unitInterval: 1 / symbolRate,
    nyquist: symbolRate / 2,
  }
}

/** Sent over payload; 1 where there is none. */
export function overheadOf(overhead: Overhead | null): number {
  return overhead === null ? 1 : overhead.sent / overhead.payload
}
