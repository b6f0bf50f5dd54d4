import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { interpolate, interpolateOver, parsePoints } from '../../lib/channel/tables'

const points = (text: string) => {
  const parsed = parsePoints(text, 'loss')
  if ('reason' in parsed) throw new Error(parsed.reason)
  return parsed.points
}
const reason = (text: string, dimension: 'loss' | 'lossPerLength' = 'loss') => {
  const parsed = parsePoints(text, dimension)
  return 'reason' in parsed ? parsed.reason : 'none'
}

describe('points as typed', () => {
  it('are read by rising frequency, with comma, colon or new line, and a semicolon at the end', () => {
    expect(points('5 GHz 1,1 dB; 1GHz: 0.4dB\n500 MHz = 0.2 dB;')).toEqual([
      { hz: 5e8, value: 0.2 },
      { hz: 1e9, value: 0.4 },
      { hz: 5e9, value: 1.1 },
    ])
  })

  it('take a loss per length where that is asked for', () => {
    expect(parsePoints('1 GHz 0.2 dB/in', 'lossPerLength')).toEqual({
      points: [{ hz: 1e9, value: expect.closeTo(0.2 / 0.0254, 12) }],
    })
  })

  it.each([
    ['1 GHz 0.4 dB; 5 GHz', "Point 2 ('5 GHz'): Type a number with its unit."],
    ['1 GHz 0.4', "Point 1 ('1 GHz 0.4'): Add a unit: dB."],
    ['1 GHz 0.4 dB/in', "Point 1 ('1 GHz 0.4 dB/in'): 'dB/in' is not a unit for this field; use dB."],
    [
      '0.4 dB',
      "Point 1 ('0.4 dB'): type a frequency with its unit, then a value, such as '1 GHz 0.4 dB; 5 GHz 1.1 dB'.",
    ],
    [
      '1 GHz −0.4 dB',
      "Point 1 ('1 GHz −0.4 dB'): a loss is typed as a positive number of decibels; leave the minus sign out.",
    ],
    ['0 Hz 0.4 dB', "Point 1 ('0 Hz 0.4 dB'): the frequency must be above zero."],
    ['1 GHz 1 dB; 1000 MHz 2 dB', "Point 2 ('1000 MHz 2 dB'): this frequency is there twice; keep one of the two."],
    [
      '1 GHz 1 dB, 2 GHz 2 dB',
      "Point 1 ('1 GHz 1 dB, 2 GHz 2 dB'): 'dB, 2 GHz 2 dB' is not a unit for this field; use dB.",
    ],
    [' ; ', "Type at least one point, such as '1 GHz 0.4 dB; 5 GHz 1.1 dB'."],
  ])('%j is refused by the number of the point', (text, expected) => {
    expect(reason(text)).toBe(expected)
  })
})

describe('between points', () => {
  const table = points('1 GHz 0.4 dB; 5 GHz 1.2 dB; 10 GHz 3 dB')

  it('goes in a straight line (by hand)', () => {
    expect(interpolate(table, 3e9)?.value).toBeCloseTo(0.8, 12)
    expect(interpolate(table, 6e9)?.value).toBeCloseTo(1.56, 12)
    expect(interpolate(table, 5e9)).toEqual({ value: 1.2, differs: 0 })
  })

  it('never goes beyond the ends but for the ±2 % of a stated number', () => {
    expect(interpolate(table, 0.98e9)?.value).toBe(0.4)
    expect(interpolate(table, 10.2e9)?.value).toBe(3)
    expect(interpolate(table, 0.97e9)).toBeNull()
    expect(interpolate(table, 10.3e9)).toBeNull()
    expect(interpolate([], 1e9)).toBeNull()
  })

  it('says how far a power law through the same points lies away: 0.3 √f at 4 GHz is 0.6, the line says 0.48 (by hand)', () => {
    const root = [
      { hz: 1e9, value: 0.3 },
      { hz: 16e9, value: 1.2 },
    ]
    const found = interpolate(root, 4e9)
    expect(found?.value).toBeCloseTo(0.48, 12)
    expect(found?.differs).toBeCloseTo(0.12, 12)
  })

  it('stays between its neighbours (random)', () => {
    const rising = fc.uniqueArray(
      fc.record({ hz: fc.integer({ min: 1, max: 1000 }), value: fc.double({ min: 0, max: 50, noNaN: true }) }),
      {
        minLength: 2,
        maxLength: 20,
        selector: ({ hz }) => hz,
      },
    )
    fc.assert(
      fc.property(rising, fc.double({ min: 0, max: 1, noNaN: true }), (unsorted, share) => {
        const sorted = unsorted.sort((a, b) => a.hz - b.hz)
        const [first, last] = [sorted[0], sorted.at(-1)]
        if (!first || !last) return
        const hz = first.hz + share * (last.hz - first.hz)
        const found = interpolate(sorted, hz)
        const below = sorted.findLast((point) => point.hz <= hz) ?? first
        const above = sorted.find((point) => point.hz >= hz) ?? last
        expect(found?.value).toBeGreaterThanOrEqual(Math.min(below.value, above.value) - 1e-9)
        expect(found?.value).toBeLessThanOrEqual(Math.max(below.value, above.value) + 1e-9)
      }),
    )
  })

  it('over many frequencies gives at each what it gives alone, and the ends at the ends (random, seed 11)', () => {
    const anyPoints = fc.uniqueArray(
      fc.record({ hz: fc.integer({ min: 1, max: 1000 }), value: fc.double({ min: 0, max: 50, noNaN: true }) }),
      { minLength: 1, maxLength: 20, selector: ({ hz }) => hz },
    )
    fc.assert(
      fc.property(anyPoints, fc.array(fc.double({ min: 0, max: 1, noNaN: true })), (unsorted, shares) => {
        const sorted = unsorted.sort((a, b) => a.hz - b.hz)
        const [from, to] = [sorted[0]?.hz ?? 0, sorted.at(-1)?.hz ?? 0]
        const hz = Float64Array.from([0, 1, ...shares].sort(), (share) =>
          Math.min(to, from + share * (to - from)),
        ).sort()
        const alone = Array.from(hz, (f) => interpolate(sorted, f)?.value)
        expect(Array.from(interpolateOver(sorted, hz))).toEqual(
          alone.map((value) => expect.closeTo(value ?? Number.NaN, 12)),
        )
      }),
      { seed: 11 },
    )
  })
})
