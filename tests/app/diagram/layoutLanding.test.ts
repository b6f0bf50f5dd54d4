import { describe, expect, it } from 'vitest'
import { layoutLanding } from '../../../app/diagram/layoutLanding'
import { type Link, osier, sedge, tamarack, upstream } from './links'

const SIZE = { width: 260, height: 350 }

function land(link: Link, allowance: string, was = null as Parameters<typeof layoutLanding>[4]) {
  const geometry = layoutLanding(link.evaluation, link.budget, allowance, SIZE, was ?? null)
  if (!geometry) throw new Error('there is a limit')
  const above = (y: number | null | undefined) => (geometry.surfaceY - (y ?? Number.NaN)) / geometry.scale
  return { geometry, above }
}

describe('the landing', () => {
  it('has a bar for each judged condition of the same limit, as far above the ground as its margin', () => {
    const { geometry, above } = land(tamarack, 'room')
    expect(geometry.bars.map((bar) => [bar.words, bar.figure, bar.verdict])).toEqual([
      ['25 °C, dry', '0.80', 'tight'],
      ['65 °C', '−0.19', 'over'],
    ])
    expect(above(geometry.bars[0]?.y)).toBeCloseTo(0.8, 9)
    expect(above(geometry.bars[1]?.y)).toBeCloseTo(-0.19, 9)
    expect(above(geometry.requiredY)).toBeCloseTo(1.5, 9)
  })

  it('enlarges: 0.80 of 28 dB is over 40 px here', () => {
    const { geometry } = land(tamarack, 'room')
    expect(geometry.surfaceY - (geometry.bars[0]?.y ?? 0)).toBeGreaterThan(40)
  })

  it('never shows limits between other planes or at another frequency together', () => {
    const [room, hot] = tamarack.evaluation.allowances
    if (!room || !hot) throw new Error('tamarack has two allowances')
    for (const other of [
      { ...hot, atHz: 13e9 },
      { ...hot, from: 'rx-ball' },
      { ...hot, limitDb: 30 },
    ]) {
      const evaluation = { ...tamarack.evaluation, allowances: [room, other] }
      expect(layoutLanding(evaluation, tamarack.budget, 'room', SIZE)?.bars).toHaveLength(1)
    }
  })

  it('shows ± of the sum around the bar', () => {
    const { geometry, above } = land(tamarack, 'room')
    const band = geometry.bars[0]?.band
    expect(above(band?.[0])).toBeCloseTo(0.8 + 1.09, 9)
    expect(above(band?.[1])).toBeCloseTo(0.8 - 1.09, 9)
  })

  it('says what is left where lines have no number, and asks about the rest', () => {
    const { geometry, above } = land(upstream, 'slot')
    expect(geometry.bars[0]).toMatchObject({ figure: '9.19', suffix: 'left', verdict: 'undecided', band: null })
    expect(above(geometry.bars[0]?.unknown?.[0])).toBeCloseTo(9.19, 9)
    expect(above(geometry.bars[0]?.unknown?.[1])).toBeCloseTo(0, 9)
  })

  it('holds bars, bands and the old margin inside the picture, with ground below', () => {
    for (const [link, allowance] of [
      [tamarack, 'room'],
      [osier, 'slot'],
      [upstream, 'slot'],
      [sedge, 'link'],
    ] as const) {
      const { geometry } = land(link, allowance, { marginDb: -3, words: '' })
      const marks = geometry.bars.flatMap((bar) => [bar.y ?? 0, ...(bar.band ?? [])])
      for (const y of [...marks, geometry.was?.y ?? 0]) {
        expect(y).toBeGreaterThan(0)
        expect(y).toBeLessThan(SIZE.height)
      }
      expect(geometry.surfaceY).toBeLessThan(SIZE.height - 30)
    }
  })

  it('is not drawn without a limit', () => {
    expect(layoutLanding(tamarack.evaluation, tamarack.budget, 'none', SIZE)).toBeNull()
  })
})
