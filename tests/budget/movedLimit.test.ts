import { describe, expect, it } from 'vitest'
import { movedLimit } from '../../lib/budget/allowance/movedLimit'
import { parseCurve } from '../../lib/channel/limits'

const curve = (text: string) => {
  const parsed = parseCurve(text)
  if ('reason' in parsed) throw new Error(parsed.reason)
  return parsed
}

/** Common practice, no source: the arithmetic is checked by hand. */
describe('a limit used at another frequency', () => {
  const kr = curve('1..9 GHz: 2 + 3 sqrt(f) + f; 9..16 GHz: 20 + 0.25 f; 18..20 GHz: 30')

  it('keeps its distance from its own curve (by hand)', () => {
    // The curve gives 6 dB at 1 GHz, 12 dB at 4 GHz and 24 dB at 16 GHz.
    expect(movedLimit(12.5, 4e9, kr, 1e9)).toEqual({ limitDb: 6.5, by: 'curve' })
    expect(movedLimit(12, 4e9, kr, 16e9)).toEqual({ limitDb: 24, by: 'curve' })
  })

  it('takes the stricter of two pieces where they meet', () => {
    // At 9 GHz the pieces give 20 and 22.25 dB.
    expect(movedLimit(12, 4e9, kr, 9e9)).toEqual({ limitDb: 20, by: 'curve' })
    expect(movedLimit(20, 9e9, kr, 4e9)).toEqual({ limitDb: 12, by: 'curve' })
  })

  it('is left alone at its own frequency, even off its curve', () => {
    expect(movedLimit(12.5, 25e9, kr, 25e9)).toEqual({ limitDb: 12.5, by: 'stated' })
  })

  it('follows a curve inside the 2 % too, within which a limit without one stays', () => {
    expect(movedLimit(12, 4e9, kr, 4.0804e9)).toEqual({
      limitDb: expect.closeTo(2 + 3 * 2.02 + 4.0804, 9),
      by: 'curve',
    })
    expect(movedLimit(12, 4e9, null, 4.08e9)).toEqual({ limitDb: 12, by: 'stated' })
  })

  it.each([
    [null, 4e9, 5e9, 'it is used at 5 GHz and has no limit curve to be moved along from 4 GHz'],
    [kr, 4e9, 21e9, 'it is used at 21 GHz and its limit curve runs from 1 GHz to 20 GHz, so it cannot be moved'],
    [kr, 0.5e9, 4e9, 'it is stated at 500 MHz and its limit curve runs from 1 GHz to 20 GHz, so it cannot be moved'],
    [kr, 4e9, 17e9, 'it is used at 17 GHz and its limit curve has a gap there, so it cannot be moved'],
    [kr, 16e9, 1e9, 'moved along its curve to 1 GHz its limit is below 0 dB'],
  ])('is refused with the reason, never continued (%#)', (along, atHz, usedAtHz, reason) => {
    expect(movedLimit(12, atHz, along, usedAtHz)).toEqual({ reason })
  })
})
