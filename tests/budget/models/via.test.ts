import { describe, expect, it } from 'vitest'
import { VIA_BOUNDS, via } from '../../../lib/budget/models/via'
import { stubResonance, viaTwoPort } from '../../../lib/channel/vias'
import { ask, codes, computed, counted, edgesOf, inserted, pieceOf } from './ask'

const fields = {
  kind: 'via',
  model: 'via',
  boardThickness: '1.6 mm',
  usedDepth: '1.2 mm',
  stub: '0.2 mm',
  barrel: '0.2 mm',
  pad: '0.45 mm',
  antipad: '0.8 mm',
  pitch: '0.9 mm',
  dk: '4',
} as const
const MM = 1e-3
const geometry = {
  barrel: 0.2 * MM,
  pad: 0.45 * MM,
  antipad: 0.8 * MM,
  pitch: 0.9 * MM,
  usedDepth: 1.2 * MM,
  stub: 0.2 * MM,
  dk: 4,
  df: 0,
}

describe('a via from its drawing', () => {
  it('is the two-port of lib/channel with what was typed, a discrete that counts its insertion loss', () => {
    const piece = pieceOf(ask(via, { ...fields, df: '0.01', count: 2 }))
    const hz = Float64Array.of(1e9, 10e9)
    const expected = viaTwoPort({ ...geometry, df: 0.01 }, 2, hz, 85)
    expect(Array.from(piece.twoPort(hz, 85))).toEqual(Array.from(expected, (x) => expect.closeTo(x, 12)))
    expect(piece.attenuation).toBeNull()
    expect(piece).toMatchObject({ from: 0, reflects: true, uncertainty: 0.5 })
  })

  it('asks for everything but df, the tolerance and the count', () => {
    expect(codes(ask(via, { kind: 'via', model: 'via' }))).toEqual(Array(8).fill('field-missing'))
    expect(ask(via, fields).drafts).toEqual([])
  })

  it('costs a few tenths of a decibel at 26.5625 GHz, as back-drilled vias do (common practice, no source)', () => {
    const db = counted(pieceOf(ask(via, fields, { hz: 26.5625e9 })), 26.5625e9)
    expect(db).toBeGreaterThan(0.1)
    expect(db).toBeLessThan(1.5)
  })

  it('varies its stub by the tolerance of the drill, and a stub drilled beyond nothing is none', () => {
    const answer = ask(via, { ...fields, drillTolerance: '0.1 mm' })
    expect(computed(answer).varies).toEqual({ stub: expect.closeTo(1e-4, 12) })
    expect(computed(ask(via, fields)).varies).toBeUndefined()
    const at = (stub: number) => inserted(pieceOf(answer, { stub }), 26.5625e9) as number
    expect(at(0.3 * MM)).toBeGreaterThan(at(0.2 * MM))
    expect(at(-0.1 * MM)).toBe(at(0))
  })

  it('holds up to the quarter wave of its stub, and not beyond: nothing is counted there', () => {
    const long = { ...fields, usedDepth: '0.1 mm', stub: '1.5 mm' }
    expect(pieceOf(ask(via, long)).to).toBeCloseTo(stubResonance(1.5 * MM, 4), 0)
    expect(stubResonance(1.5 * MM, 4) / 1e9).toBeCloseTo(24.9827, 4)
    const beyond = ask(via, long, { hz: 25.1e9 })
    expect(beyond.found).toBeNull()
    expect(beyond.drafts[0]).toMatchObject({ code: 'outside-validity', field: 'stub' })
  })

  it('warns of a stub that resonates under three times the frequency, with the drill’s tolerance, and says how short it must be', () => {
    // c/(4·0.3 mm·2) = 124.9 GHz, with 0.1 mm more 93.7 GHz; three times 35 GHz is 105 GHz, and 0.357 mm resonates there.
    expect(codes(ask(via, { ...fields, stub: '0.3 mm' }, { hz: 35e9 }))).toEqual([])
    const drilled = ask(via, { ...fields, stub: '0.3 mm', drillTolerance: '0.1 mm' }, { hz: 35e9 })
    expect(drilled.found).not.toBeNull()
    expect(drilled.drafts).toMatchObject([
      {
        code: 'stub-resonance-near',
        field: 'stub',
        message:
          "'Piece': a stub of 0.4 mm, with the tolerance of the drill, resonates at 93.7 GHz, under three times 35 GHz.",
        todo: 'Drill deeper, to a stub under 0.36 mm, or route on a lower layer.',
      },
    ])
  })

  it('without stub never warns', () => {
    expect(codes(ask(via, { ...fields, stub: '0 mm', usedDepth: '1.6 mm' }, { hz: 60e9 }))).toEqual([])
  })
})

describe('the range of the via', () => {
  const at = 10e9
  const values = { ...computed(ask(via, fields, { hz: at })).values, hz: at, reference: 100 }
  const edges = edgesOf(VIA_BOUNDS, values)

  it('has these ends', () => {
    expect(edges.length).toBe(12)
  })

  it.each(edges)('$bound.what, $end: counts just inside, is flagged just outside', ({ bound, inside, outside }) => {
    const typed = (x: number) => ({ [bound.field]: bound.field === 'dk' ? `${x}` : `${x * 1e3} mm` })
    const flagged = (x: number) =>
      ask(via, { ...fields, ...typed(x) }, { hz: at }).drafts.filter(({ message }) =>
        message.includes(`its ${bound.what} is`),
      )
    expect(flagged(inside)).toEqual([])
    expect(flagged(outside)).toMatchObject([{ code: 'outside-validity', field: bound.field }])
    expect(ask(via, { ...fields, ...typed(outside) }, { hz: at }).found).toBeNull()
  })
})
