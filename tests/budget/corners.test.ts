import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import type { BudgetFile } from '../../lib/budget/schema'
import { line, link } from './links'

type CornerFile = NonNullable<BudgetFile['corners']>[string]

const LINES = {
  t: line('a1', '5 dB', { kind: 'trace' }),
  v: line('a2', '1 dB', { kind: 'via' }),
  c: line('a3', '2 dB', { kind: 'cable', covers: 'bulk' }),
  w: line('a4', '0.5 dB', { kind: 'cable', covers: 'terminations' }),
}
const HOT = { order: 'a0', name: 'Hot', temperature: '65 °C', lossPerKelvin: '0.1 %/K' } as const

function at(corner: Partial<CornerFile>, parts: Partial<BudgetFile> = {}) {
  const base = link({}).allowances.limit
  const budget = link({
    lines: LINES,
    corners: { hot: { ...HOT, ...corner } },
    allowances: { limit: { ...base, order: 'a0', judgedCorner: 'hot' } },
    ...parts,
  })
  const { allowances, flags } = evaluate(budget, new Map())
  const [allowance] = allowances
  if (!allowance) throw new Error('no allowance')
  return { allowance, codes: flags.map(({ code, id }) => `${code} ${id}`) }
}

describe('a judged corner', () => {
  it('grows traces and bulk cable by the typed coefficient, nothing else: 7 dB × 0.1 %/K × 40 K (by hand)', () => {
    const { allowance, codes } = at({})
    expect(allowance.lossDb).toBeCloseTo(8.5 + 0.28, 12)
    expect(allowance.judged.corner).toBe('hot')
    expect(allowance.lines.map(({ countedDb }) => countedDb)).toEqual(
      [5.2, 1, 2.08, 0.5].map((db) => expect.closeTo(db, 12)),
    )
    expect(codes.filter((code) => !code.startsWith('nobody-counts'))).toEqual([
      'corner-does-not-move v',
      'corner-does-not-move w',
    ])
  })

  it('adds only what a number does not already contain', () => {
    const held = {
      ...LINES,
      t: { ...LINES.t, conditionTemperature: '65 °C' },
      c: { ...LINES.c, conditionTemperature: '45 °C' },
    }
    expect(at({}, { lines: held }).allowance.lossDb).toBeCloseTo(8.5 + 2 * 0.001 * 20, 12)
  })

  it('lowers a nominal number that holds hotter, but never a guaranteed maximum', () => {
    const hotter = (grade: 'nominal' | 'maximum') => ({
      ...LINES,
      t: { ...LINES.t, grade, conditionTemperature: '85 °C' },
    })
    expect(at({}, { lines: hotter('nominal') }).allowance.lossDb).toBeCloseTo(8.5 + 0.08 - 0.1, 12)
    expect(at({}, { lines: hotter('maximum') }).allowance.lossDb).toBeCloseTo(8.5 + 0.08, 12)
  })

  it('says that a maximum without its temperature was put through it', () => {
    const lines = { ...LINES, t: { ...LINES.t, grade: 'maximum' } } as const
    expect(at({}, { lines }).codes).toContain('maximum-through-corner t')
    const said = { ...LINES, t: { ...LINES.t, grade: 'maximum', conditionTemperature: '25 °C' } } as const
    expect(at({}, { lines: said }).codes).not.toContain('maximum-through-corner t')
  })

  it('wet grows traces only, and only those that do not hold wet (by hand)', () => {
    const wet = { temperature: null, humidity: 'wet', lossWet: '4 %' } as const
    expect(at(wet).allowance.lossDb).toBeCloseTo(8.5 + 0.2, 12)
    const lines = { ...LINES, t: { ...LINES.t, conditionHumidity: 'wet' } } as const
    expect(at(wet, { lines }).allowance.lossDb).toBeCloseTo(8.5, 12)
    expect(at({ ...wet, temperature: '65 °C' }).allowance.lossDb).toBeCloseTo(3.5 + 5 * 1.04 * 1.04 - 2 + 2.08, 12)
  })

  it.each([
    [
      { lossPerKelvin: null },
      {},
      "the corner 'Hot' does not say by how much the loss of traces and cable grows per kelvin",
    ],
    [{ humidity: 'wet' }, {}, "the corner 'Hot' is wet and does not say by how much the loss of traces grows"],
    [
      { temperature: null },
      {},
      "the corner 'Hot' says neither a temperature, nor a humidity, nor an extreme of fabrication",
    ],
    [{ removed: true }, {}, 'the corner that it is to be judged at does not exist or was taken out'],
    [
      { lossPerKelvin: '-2 %/K', temperature: '85 °C' },
      {},
      "the growth per kelvin of the corner 'Hot' leaves no loss at all",
    ],
    [
      {},
      { head: { ...link({}).head, referenceTemperature: null } },
      "the temperature of the reference corner is not given, so how far it is to the corner 'Hot' is unknown",
    ],
  ] as const)('%j cannot be judged, and says so plainly', (corner, parts, reason) => {
    const { allowance, codes } = at(corner as Partial<CornerFile>, parts)
    expect(allowance).toMatchObject({
      verdict: 'undecided',
      words: `undecided: ${reason}`,
      knownDb: 8.5,
      nominalDb: 8.5,
      lossDb: null,
      marginDb: null,
    })
    expect(codes).toContain('corner-not-judged limit')
  })

  it('without coefficients is judged where nothing between the planes grows', () => {
    const { allowance } = at({ lossPerKelvin: null }, { lines: { v: LINES.v, w: LINES.w } })
    expect(allowance).toMatchObject({ verdict: 'inside', lossDb: 1.5 })
  })

  it('a tolerance in % is of the grown loss', () => {
    const lines = { t: { ...LINES.t, tolerancePlus: '10 %' } }
    expect(at({}, { lines }).allowance.worstDb).toBeCloseTo(5.2 * 1.1, 12)
  })

  it('a number in other conditions than the reference corner is a notice there', () => {
    const lines = {
      v: { ...LINES.v, conditionTemperature: '85 °C' },
      t: { ...LINES.t, conditionHumidity: 'wet' },
    } as const
    const { flags } = evaluate(link({ lines }), new Map())
    expect(flags.map(({ code, message }) => [code, message])).toEqual([
      ['other-conditions', "'Line a1' holds wet; in the reference corner (25 °C, dry) it counts as it is."],
      ['other-conditions', "'Line a2' holds at 85 °C; in the reference corner (25 °C, dry) it counts as it is."],
    ])
  })
})
