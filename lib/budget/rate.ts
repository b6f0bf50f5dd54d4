import type { CodedGroup, Overhead, RateInput } from '../channel/signalling'
import type { FlagCode, FlagDraft } from './flags'
import { BIT_RATE, typedValue, unitsOf } from './quantities'
import type { Head } from './schema'

/** Reads rate, code and overheads from the head. @returns null after saying what lacks. */
export function readRate(head: Head, drafts: FlagDraft[]): RateInput | null {
  const say = (code: FlagCode, field: string, message: string, todo: string) => {
    drafts.push(headFlag(code, field, message, todo))
    return null
  }
  const bitRate = typedValue(BIT_RATE, head.bitRate)
  if (bitRate === null || bitRate <= 0) {
    say(
      head.bitRate === null ? 'signalling-incomplete' : 'unreadable-value',
      'bitRate',
      head.bitRate === null ? 'The link has no bit rate.' : `The link: the bit rate '${head.bitRate}' cannot be read.`,
      `Type the bit rate of one lane with its unit: ${unitsOf(BIT_RATE)}.`,
    )
  }
  if (head.code === null) {
    say('signalling-incomplete', 'code', 'The link has no line code.', 'Choose the line code, such as NRZ or PAM4.')
  }
  const group = pair(head.codedBits, head.codedSymbols, 'coded group', 'codedBits', 'codedSymbols', say)
  const blockCode = pair(head.codingBits, head.codingLineBits, 'block code', 'codingBits', 'codingLineBits', say)
  const fec = pair(head.fecMessage, head.fecCodeword, 'FEC', 'fecMessage', 'fecCodeword', say)
  const grows = [growing(blockCode, 'block code', 'codingLineBits', say), growing(fec, 'FEC', 'fecCodeword', say)]
  if (head.rateType === 'payload' && blockCode === null && fec === null) {
    return say(
      'signalling-incomplete',
      'codingBits',
      'The link: the rate is a payload, and neither block code nor FEC is given.',
      'Type their overheads, or give the rate as sent.',
    )
  }
  if (head.rateType === null && bitRate !== null) {
    say(
      'rate-type-not-said',
      'rateType',
      'The link: whether the bit rate contains coding and FEC overhead is not said; it is taken as the rate sent.',
      "Choose 'line' or 'payload'.",
    )
  }
  if (bitRate === null || bitRate <= 0 || head.code === null || grows.includes(false)) return null
  if (group === 'half' || blockCode === 'half' || fec === 'half') return null
  return {
    bitRate,
    rateType: head.rateType ?? 'line',
    code: head.code,
    group: group && ({ bits: group.payload, symbols: group.sent } satisfies CodedGroup),
    blockCode,
    fec,
  }
}

export function headFlag(code: FlagCode, field: string, message: string, todo: string): FlagDraft {
  return { code, section: 'head', id: null, field, message, todo }
}

type Say = (code: FlagCode, field: string, message: string, todo: string) => null
type Pair = Overhead | null | 'half'

function pair(first: number | null, second: number | null, what: string, a: string, b: string, say: Say): Pair {
  if (first === null && second === null) return null
  if (first !== null && second !== null) return { payload: first, sent: second }
  say(
    'signalling-incomplete',
    first === null ? a : b,
    `The link: only one of the two numbers of the ${what} is given.`,
    'Type both numbers, or neither.',
  )
  return 'half'
}

function growing(overhead: Pair, what: string, field: string, say: Say): boolean {
  if (overhead === null || overhead === 'half' || overhead.sent >= overhead.payload) return true
  say(
    'signalling-impossible',
    field,
    `The link: the ${what} sends ${overhead.sent} for ${overhead.payload}; it cannot send fewer than it is given.`,
    'Exchange the two numbers, such as 256 and 257 or 514 and 544.',
  )
  return false
}
