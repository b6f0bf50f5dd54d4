import { LEVELS, type Overhead, type RateInput, type Rates, ratesOf, usualMistake } from '../channel/signalling'
import { formatScaled } from '../channel/units'
import { contentName } from './contentName'
import type { SignallingEvaluation } from './evaluation'
import type { FlagDraft } from './flags'
import { headFlag, readRate } from './rate'
import type { Head } from './schema'

export type Signalling = {
  /** A name of what the head says about it: the same content, the same name. */
  readonly content: string
  readonly evaluation: SignallingEvaluation
  /** Continues 'this is …' where a frequency is a well-known mistake for the Nyquist frequency, else null. */
  readonly mistake: (hz: number) => string | null
  readonly drafts: readonly FlagDraft[]
}

const KEPT = 64
const kept = new Map<string, Signalling>()

/** The link's signalling, from what the head says. The same head is computed once. */
export function signallingOf(head: Head): Signalling {
  const content = contentName('head', '', head)
  const known = kept.get(content)
  if (known) return known
  if (kept.size >= KEPT) kept.clear()
  const result = compute(head, content)
  kept.set(content, result)
  return result
}

function compute(head: Head, content: string): Signalling {
  const drafts: FlagDraft[] = []
  const input = readRate(head, drafts)
  const rates = input && ratesOf(input)
  if (input && !rates) {
    drafts.push(
      headFlag(
        'signalling-impossible',
        'codedBits',
        `The link: ${head.codedBits} bits in ${head.codedSymbols} symbols are more than ${LEVELS[input.code]} levels can carry.`,
        'Correct the bits and symbols of one group, such as 11 bits in 7 symbols for PAM3.',
      ),
    )
  }
  if (!input || !rates) return { content, evaluation: UNKNOWN, mistake: () => null, drafts }
  return {
    content,
    evaluation: {
      lineRate: rates.lineRate,
      bitsPerSymbol: rates.bitsPerSymbol,
      symbolRate: rates.symbolRate,
      unitInterval: rates.unitInterval,
      nyquist: rates.nyquist,
      statement: statement(head, input, rates),
    },
    mistake: (hz) => usualMistake(hz, input, rates),
    drafts,
  }
}

const UNKNOWN: SignallingEvaluation = {
  lineRate: null,
  bitsPerSymbol: null,
  symbolRate: null,
  unitInterval: null,
  nyquist: null,
  statement: 'The signalling is not complete; no Nyquist frequency can be given.',
}

function statement(head: Head, input: RateInput, rates: Rates): string {
  const bits = Number(rates.bitsPerSymbol.toPrecision(5))
  const ideal = input.group === null && !Number.isInteger(bits) ? ' (the ideal; a code carries less)' : ''
  const symbols = `${input.code}, ${bits} ${bits === 1 ? 'bit' : 'bits'} per symbol${ideal}, ${formatScaled(rates.symbolRate, 'symbolRate', 9)}`
  const nyquist = `Nyquist frequency ${formatScaled(rates.nyquist, 'frequency', 9)}`
  const convention =
    input.code === 'RZ'
      ? ', half the symbol rate; a run of ones has its fundamental at the symbol rate, twice as high'
      : ''
  return `${rateWords(head, input, rates)}; ${symbols}; ${nyquist}${convention}.`
}

function rateWords(head: Head, input: RateInput, rates: Rates): string {
  const line = formatScaled(rates.lineRate, 'bitRate', 9)
  const overheads = [
    input.blockCode && `block code ${overheadWords(input.blockCode)}`,
    input.fec && `FEC ${overheadWords(input.fec)}`,
  ].filter((words) => words !== null)
  if (input.rateType === 'payload') {
    const payload = formatScaled(input.bitRate, 'bitRate', 9)
    return `${payload} of payload a lane becomes ${line} as sent, with ${overheads.join(' and ')}`
  }
  if (head.rateType === null) return `${line} a lane, taken as sent; whether it contains coding and FEC is not said`
  return `${line} a lane as sent, coding and FEC included${overheads.length > 0 ? ` (${overheads.join(', ')})` : ''}`
}

function overheadWords(overhead: Overhead): string {
  return `${overhead.payload} → ${overhead.sent}`
}
