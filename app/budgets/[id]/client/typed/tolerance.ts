import type { Scalar } from '../../../../../lib/budget/schema'
import { isRefused, type Judged, judgeTyped } from './judge'

export type Tolerance = { readonly minus: Scalar; readonly plus: Scalar }

const SIGN = '[−-]'
const NUMBER = '\\d+(?:[.,]\\d+)?|[.,]\\d+'
const EQUAL = new RegExp(`^(?:±|\\+/?${SIGN})?\\s*(${NUMBER})\\s*(\\D*)$`)
const SIDE = new RegExp(`^(\\+|${SIGN})\\s*(${NUMBER})\\s*([^\\d+−/,;-]*)[/,;]?\\s*`)
const ADVICE = 'Type a tolerance such as ± 0.15 dB, 6 % or −0.1 +0.2 dB.'

/**
 * Reads a tolerance typed into one cell: '± 0.15 dB', '0.15' (decibels), '6 %', '−0.1 +0.2 dB'. One side alone is that
 * side, and nothing on the other. A unit after the second side counts for the first as well.
 */
export function readTolerance(typed: string): Tolerance | { readonly reason: string } {
  const text = typed.trim()
  if (text === '') return { minus: null, plus: null }
  const equal = EQUAL.exec(text)
  if (equal) {
    const judged = side('tolerancePlus', equal[1], equal[2])
    return isRefused(judged) ? judged : { minus: judged.value, plus: judged.value }
  }
  return readSides(text)
}

function readSides(text: string): Tolerance | { readonly reason: string } {
  const first = SIDE.exec(text)
  if (!first) return { reason: ADVICE }
  const rest = text.slice(first[0].length)
  const second = rest === '' ? null : SIDE.exec(rest)
  if (rest !== '' && (!second || second[0].length !== rest.length)) return { reason: ADVICE }
  if (second && isMinus(first[1]) === isMinus(second[1])) {
    return { reason: 'Type one side with − and the other with +, such as −0.1 +0.2 dB.' }
  }
  const unit = (first[3] ?? '').trim() || (second?.[3] ?? '').trim()
  const sides: { minus: Scalar; plus: Scalar } = { minus: `0 ${unit || 'dB'}`, plus: `0 ${unit || 'dB'}` }
  for (const match of second ? [first, second] : [first]) {
    const key = isMinus(match[1]) ? 'minus' : 'plus'
    const judged = side(key === 'minus' ? 'toleranceMinus' : 'tolerancePlus', match[2], (match[3] ?? '').trim() || unit)
    if (isRefused(judged)) return judged
    sides[key] = judged.value
  }
  return sides
}

const isMinus = (sign: string | undefined) => sign === '−' || sign === '-'

function side(field: 'toleranceMinus' | 'tolerancePlus', number = '', unit = ''): Judged {
  return judgeTyped('lines', field, `${number} ${unit}`)
}

/** Shows both sides in one cell, as typed: '± 0.15 dB', '−0.1 +0.2 dB', '−0.1 dB +5 %'. */
export function showTolerance({ minus, plus }: Tolerance): string {
  if (typeof minus !== 'string' && typeof plus !== 'string') return ''
  if (minus === plus) return `± ${plus}`
  if (typeof minus !== 'string') return `+${plus}`
  if (typeof plus !== 'string') return `−${minus}`
  const [down = '', downUnit = ''] = split(minus)
  const [up = '', upUnit = ''] = split(plus)
  return downUnit === upUnit ? `−${down} +${up} ${upUnit}`.trim() : `−${minus} +${plus}`
}

const split = (text: string) => /^(\S*?)\s*([^\d.,\s]*)$/.exec(text)?.slice(1) ?? [text, '']
