import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { LevelGeometry } from '../../../app/diagram/geometry'
import { layoutLevels } from '../../../app/diagram/layoutLevels'
import { overlaps } from '../../../app/diagram/text'
import { shareWidth } from '../../../app/diagram/widths'
import type { Present } from '../../../lib/sheet/wire'
import { alder, type Link, osier, sedge, tamarack, upstream } from './links'

const WIDE = { width: 1050, height: 380 }
const NARROW = { width: 366, height: 300 }
const NOBODY = { selected: null, present: [], was: null }

function lay(link: Link, allowance: string, size = WIDE, state: Partial<typeof NOBODY> = {}): LevelGeometry {
  return layoutLevels(link.evaluation, link.budget, allowance, size, { ...NOBODY, ...state })
}

function present(connection: string, line: string, me = false): Present {
  return {
    connection,
    person: connection,
    name: connection,
    initials: connection,
    colour: 0,
    me,
    cell: { section: 'lines', id: line, field: 'loss' },
  }
}

const inside = (geometry: LevelGeometry) => geometry.pieces.filter((piece) => piece.place === 'inside')

describe('the level', () => {
  it('falls by the known sums, from 0 dB at the first plane (sums added by hand: 27.20, 37.11, 16.32, 26.00 dB)', () => {
    for (const [link, allowance, sum] of [
      [tamarack, 'room', 27.2],
      [osier, 'slot', 37.11],
      [sedge, 'link', 16.32],
      [alder, 'long', 26],
    ] as const) {
      const geometry = lay(link, allowance)
      const pieces = inside(geometry)
      expect(pieces[0]?.from.y).toBeCloseTo(geometry.zeroY, 9)
      expect((geometry.end.y - geometry.zeroY) / geometry.scale).toBeCloseTo(sum, 9)
    }
  })

  it('lies above the surface by the margin, and under it when over', () => {
    const above = (geometry: LevelGeometry) => ((geometry.surface?.y ?? 0) - geometry.end.y) / geometry.scale
    expect(above(lay(tamarack, 'room'))).toBeCloseTo(0.8, 9)
    expect(above(lay(osier, 'slot'))).toBeCloseTo(-1.11, 9)
    expect(above(lay(sedge, 'link'))).toBeCloseTo(8.68, 9)
  })

  it('stays in the drawing when the loss is far over the limit', () => {
    const [allowance] = osier.evaluation.allowances
    if (!allowance) throw new Error('osier has an allowance')
    const evaluation = { ...osier.evaluation, allowances: [{ ...allowance, limitDb: 20 }] }
    const geometry = layoutLevels(evaluation, osier.budget, 'slot', WIDE, NOBODY)
    expect(geometry.end.y).toBeLessThanOrEqual(WIDE.height)
    expect((geometry.end.y - (geometry.surface?.y ?? 0)) / geometry.scale).toBeCloseTo(17.11, 9)
  })

  it('is one line without a break: each piece begins where the one before it ends', () => {
    for (const link of [tamarack, upstream, sedge]) {
      const pieces = lay(link, link.evaluation.allowances[0]?.id ?? '').pieces
      for (const [at, piece] of pieces.entries()) {
        const next = pieces[at + 1]
        if (!next) continue
        expect(next.from.x).toBeCloseTo(piece.to.x, 9)
        expect(next.from.y).toBeCloseTo(piece.to.y, 9)
      }
    }
  })

  it('keeps lines outside the allowance beside the staffs, above 0 and below the end', () => {
    const geometry = lay(tamarack, 'room')
    const [before] = geometry.pieces
    const after = geometry.pieces[geometry.pieces.length - 1]
    expect(before).toMatchObject({ place: 'before', fromDb: expect.closeTo(-3.1, 9), toDb: expect.closeTo(0, 9) })
    expect(after).toMatchObject({ place: 'after', fromDb: expect.closeTo(27.2, 9), toDb: expect.closeTo(29.9, 9) })
    expect(before?.to.x).toBeCloseTo(geometry.plot.x, 9)
    expect(geometry.runs.some((run) => run.name === 'TX package')).toBe(false)
  })

  it('rises at an overlap', () => {
    const overlap = inside(lay(sedge, 'link')).find((piece) => piece.overlap)
    expect(overlap?.countedDb).toBe(-1.9)
    expect(overlap && overlap.to.y < overlap.from.y).toBe(true)
  })
})

describe('widths', () => {
  it('follow length: 11.50 in is 2.3 times as wide as 5.00 in', () => {
    const pieces = inside(lay(tamarack, 'room'))
    const width = (number: number) => {
      const piece = pieces.find((one) => one.number === number)
      return piece ? piece.to.x - piece.from.x : 0
    }
    expect(width(7) / width(3)).toBeCloseTo(11.5 / 5, 6)
    expect(width(11) / width(3)).toBeCloseTo(7 / 5, 6)
    expect(width(2)).toBeCloseTo(width(12), 9)
  })

  it('add up to the whole; pieces without a length are equal and take at most 42 % together', () => {
    fc.assert(
      fc.property(
        fc.array(fc.option(fc.double({ min: 1e-4, max: 5, noNaN: true })), { minLength: 1, maxLength: 60 }),
        fc.integer({ min: 250, max: 1600 }),
        (lengths, total) => {
          const widths = shareWidth(lengths, total)
          expect(widths.reduce((sum, width) => sum + width, 0)).toBeCloseTo(total, 5)
          const small = widths.filter((_, at) => lengths[at] === null)
          expect(Math.max(0, ...small) - Math.min(...small, Math.max(0, ...small))).toBeLessThan(1e-9)
          if (lengths.some((length) => length !== null)) {
            expect(small.reduce((sum, width) => sum + width, 0)).toBeLessThanOrEqual(0.42 * total + 1e-6)
          }
          for (const width of widths) expect(width).toBeGreaterThan(0)
        },
      ),
      { seed: 20251 },
    )
  })

  it('keeps a short trace visible beside a long cable', () => {
    const [cable = 0, trace = 0] = shareWidth([30, 0.01], 900)
    expect(trace).toBeGreaterThanOrEqual(30)
    expect(cable + trace).toBeCloseTo(900, 9)
  })
})

describe('the ground', () => {
  it('is one stretch per assembly that the signal enters, with the decibels of its lines', () => {
    const runs = lay(tamarack, 'room').runs
    expect(runs.map((run) => [run.name, Number(run.knownDb.toFixed(2)), run.texture])).toEqual([
      ['Line card', 5.8, 'strata'],
      ['Backplane connector', 1.35, 'pins'],
      ['Backplane', 10.5, 'heavy-strata'],
      ['Backplane connector', 1.35, 'pins'],
      ['Switch card', 8.2, 'strata'],
    ])
    expect(runs[0]?.label).toBe('Line card 5.80 dB')
  })

  it('says that a stretch is not all known', () => {
    expect(lay(upstream, 'slot').runs[0]?.label).toBe('Card 1.25 dB known')
  })

  it('has stippled air as tall as the required margin', () => {
    const geometry = lay(tamarack, 'room')
    expect((geometry.required?.height ?? 0) / geometry.scale).toBeCloseTo(1.5, 9)
    expect((geometry.required?.y ?? 0) + (geometry.required?.height ?? 0)).toBeCloseTo(geometry.surface?.y ?? 0, 9)
  })

  it('is not drawn without a limit, and broken where a plane is missing', () => {
    expect(lay(tamarack, 'none').surface).toBeNull()
    const [allowance] = tamarack.evaluation.allowances
    if (!allowance) throw new Error('tamarack has an allowance')
    const evaluation = { ...tamarack.evaluation, allowances: [{ ...allowance, to: null }] }
    expect(layoutLevels(evaluation, tamarack.budget, 'room', WIDE, NOBODY).surface?.broken).toBe(true)
  })
})

describe('what is not known', () => {
  it('is a hatched gap for each line without a number; the level goes on from what is known', () => {
    const geometry = lay(upstream, 'slot')
    expect(geometry.gaps.map((gap) => gap.id)).toEqual(['l1', 'l3', 'l6'])
    expect((geometry.end.y - geometry.zeroY) / geometry.scale).toBeCloseTo(26.81, 9)
    for (const gap of geometry.gaps) expect(gap.y + gap.height).toBeLessThan(geometry.surface?.y ?? 0)
    expect(geometry.labels.some((label) => label.id === 'l3')).toBe(false)
  })
})

describe('the tolerance', () => {
  it('ends as wide as the evaluation says, ±1.09 dB, and only grows', () => {
    const geometry = lay(tamarack, 'room')
    const half = geometry.band.length / 2
    const heights = geometry.band.slice(0, half).map((upper, at) => {
      const lower = geometry.band[geometry.band.length - 1 - at]
      return ((lower?.y ?? 0) - upper.y) / geometry.scale
    })
    expect(heights[0]).toBeCloseTo(0, 9)
    expect(heights[half - 1]).toBeCloseTo(2.18, 9)
    for (const [at, height] of heights.entries()) expect(height).toBeGreaterThanOrEqual((heights[at - 1] ?? 0) - 1e-9)
  })
})

describe('labels', () => {
  const cases = [
    [tamarack, 'room'],
    [osier, 'slot'],
    [upstream, 'slot'],
    [sedge, 'link'],
    [alder, 'long'],
  ] as const

  it('stand above the level, inside the drawing', () => {
    for (const [link, allowance] of cases) {
      for (const size of [WIDE, NARROW]) {
        const geometry = lay(link, allowance, size)
        expect(geometry.labels.length).toBeGreaterThan(0)
        for (const label of geometry.labels) {
          const under = inside(geometry).filter((piece) => piece.from.x <= label.x && label.x <= piece.to.x)
          for (const piece of under) expect(label.y).toBeLessThan(Math.max(piece.from.y, piece.to.y))
          expect(label.x).toBeGreaterThan(geometry.plot.x)
          expect(label.x).toBeLessThan(geometry.plot.x + geometry.plot.width)
        }
      }
    }
  })

  it('do not overlap one another', () => {
    for (const [link, allowance] of cases) {
      const boxes = lay(link, allowance).labels.map((label) => ({
        x: label.x - label.figure.length * 3.5,
        y: label.y - 13,
        width: label.figure.length * 7,
        height: 13,
      }))
      for (const [at, box] of boxes.entries()) {
        for (const other of boxes.slice(at + 1)) expect(overlaps(box, other)).toBe(false)
      }
    }
  })

  it('go to the largest losses first, and always to the selected line', () => {
    const narrow = lay(tamarack, 'room', NARROW, {})
    expect(narrow.labels.map((label) => label.figure).sort()).toEqual(['4.75', '6.65', '9.20'])
    const state = { ...NOBODY, selected: 'l12' }
    const chosen = layoutLevels(tamarack.evaluation, tamarack.budget, 'room', NARROW, state)
    expect(chosen.labels.map((label) => label.figure)).toContain('0.50')
  })

  it('are six at most with 40 lines, and there are no joints', () => {
    const geometry = lay(alder, 'long')
    expect(geometry.labels.length).toBeLessThanOrEqual(6)
    expect(geometry.joints).toEqual([])
    expect(geometry.pieces).toHaveLength(40)
  })

  it('mark typical values', () => {
    const typical = lay(tamarack, 'room').labels.filter((label) => label.typical)
    expect(typical.map((label) => label.figure)).toEqual(['1.35', '1.35'])
  })
})

describe('shares', () => {
  it('are shelves counted from where the signal enters, with a post as tall as the excess', () => {
    const geometry = lay(osier, 'slot')
    const shelf = (id: string) => geometry.shelves.find((one) => one.id === id)
    const db = (y: number | undefined) => ((y ?? 0) - geometry.zeroY) / geometry.scale
    expect(db(shelf('s1')?.from.y)).toBeCloseTo(9, 9)
    expect(shelf('s1')?.post).toBeNull()
    expect(db(shelf('s2')?.from.y)).toBeCloseTo(8.4 + 16, 9)
    const post = shelf('s2')?.post
    expect(db(post?.[1].y) - db(post?.[0].y)).toBeCloseTo(1.16, 9)
    expect(shelf('s2')?.words).toEqual(['share 16', '17.16 used, 1.16 past it'])
    expect(shelf('s3')?.words[1]).toBe('all used')
  })
})

describe('people', () => {
  it('other people stand at their lines, not on one another; oneself does not', () => {
    const state = { ...NOBODY, present: [present('TK', 'l7'), present('MH', 'l7'), present('IO', 'l3', true)] }
    const { flags } = layoutLevels(tamarack.evaluation, tamarack.budget, 'room', WIDE, state)
    expect(flags.map((flag) => flag.person.initials)).toEqual(['TK', 'MH'])
    const [a, b] = flags.map((flag) => ({ x: flag.x, y: flag.y, width: 34, height: 20 }))
    expect(a && b && overlaps(a, b)).toBe(false)
  })

  it("another person's change leaves the old level below the new one by what the margin gained", () => {
    const state = { ...NOBODY, was: { marginDb: 0.34, words: 'a\nb', line: 'l7' } }
    const geometry = layoutLevels(tamarack.evaluation, tamarack.budget, 'room', WIDE, state)
    const last = geometry.was?.points[geometry.was.points.length - 1]
    expect(((last?.y ?? 0) - geometry.end.y) / geometry.scale).toBeCloseTo(0.46, 9)
    expect([...(geometry.was?.before.keys() ?? [])]).toEqual(['l7', 'l8', 'l9', 'l10', 'l11', 'l12', 'l13'])
    expect(geometry.was?.before.get('l8')).toBe(`translateY(${Math.round(0.46 * geometry.scale * 10) / 10}px)`)
  })
})

describe('staffs', () => {
  it('are ticked every decibel, every fifth at 390 px', () => {
    const steps = (geometry: LevelGeometry) => {
      const [first, second] = geometry.ticks
      return (second?.db ?? 0) - (first?.db ?? 0)
    }
    expect(steps(lay(tamarack, 'room'))).toBe(1)
    expect(steps(lay(tamarack, 'room', NARROW))).toBe(5)
    expect(lay(tamarack, 'room').ticks.at(-1)?.label).toBe('28')
  })

  it('stand at the planes; one between them reaches from the level to the ground', () => {
    const geometry = lay(sedge, 'link')
    const [from, between, to] = geometry.staffs
    expect([from?.bounds, between?.bounds, to?.bounds]).toEqual(['from', null, 'to'])
    expect(between?.bottom).toBeCloseTo(geometry.surface?.y ?? 0, 9)
  })
})
