import { formatScaled } from '../../channel/units'
import { FREQUENCY, typedValue } from '../quantities'
import type { LineCheck } from './check'
import { lineFlag } from './lineFlag'

/** Dk and Df are trusted up to three times, and down to a third, of the frequency that they were measured at. */
const FAR = 3

/** From here on the foil matters: a rough one adds a fifth and more to the loss of its copper. */
const FOIL_MATTERS_HZ = 5e9

export function isFar(anchor: number, nyquist: number): boolean {
  return anchor < nyquist / FAR - 1 || anchor > nyquist * FAR + 1
}

/** What a line computed from its cross-section rests on: where Dk and Df hold, how they were found, which foil. */
export const laminates: LineCheck = function* (item, { nyquist }) {
  const { line } = item
  if (line.model !== 'geometry') return
  const anchor = typedValue(FREQUENCY, line.anchor)
  if (anchor !== null && nyquist !== null && isFar(anchor, nyquist)) {
    const [held, asked] = [formatScaled(anchor, 'frequency'), formatScaled(nyquist, 'frequency')]
    yield lineFlag(
      item,
      'anchor-far',
      'anchor',
      `takes Dk and Df of ${held} to ${asked}; the model of the laminate bridges a factor of ${FAR}, hardly more.`,
      `Ask for Dk and Df near ${asked}.`,
    )
  }
  if (line.roughness === 'smooth' && nyquist !== null && nyquist >= FOIL_MATTERS_HZ) {
    yield lineFlag(
      item,
      'smooth-copper',
      'roughness',
      `is computed with smooth copper at ${formatScaled(nyquist, 'frequency')}; no foil of a laminate is smooth there.`,
      "Choose a model of roughness and type the foil's Rz.",
    )
  }
  const lacks = [said(line.method) ? null : 'the method', line.resin === null ? 'the resin content' : null].filter(
    (what) => what !== null,
  )
  if (line.df === null || lacks.length === 0) return
  yield lineFlag(
    item,
    'laminate-unproven',
    said(line.method) ? 'resin' : 'method',
    `does not say ${lacks.join(' and ')} that its Dk and Df hold for.`,
    'Type what the data sheet says; a laminate has a row for each glass style, and dry samples flatter.',
  )
}

function said(text: string | null): boolean {
  return (text?.trim() ?? '') !== ''
}
