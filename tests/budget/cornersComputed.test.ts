import { describe, expect, it } from 'vitest'
import { evaluate, WHOLE } from '../../lib/budget/evaluate'
import type { EvidenceData } from '../../lib/budget/evaluation'
import { tracePiece } from '../../lib/budget/models/geometryPiece'
import type { BudgetFile } from '../../lib/budget/schema'
import { STRIPLINE } from './crossSections'
import { line, link } from './links'
import { attenuator, constantly, evidenceOf, fileLine, GRID } from './sections'

type CornerFile = NonNullable<BudgetFile['corners']>[string]
type LineFile = NonNullable<BudgetFile['lines']>[string]

/** Judged in the reference corner, and in the corner. */
function both(lines: Readonly<Record<string, LineFile>>, corner: Partial<CornerFile>, read: EvidenceData = new Map()) {
  const { evidence } = evidenceOf({ a: null })
  const limit = { ...link({}).allowances.limit, order: 'a0', limit: '100 dB' }
  const judge = (judgedCorner: string | null) => {
    const allowances = { limit: { ...limit, judgedCorner } }
    const corners = { hot: { order: 'a0', name: 'Hot', ...corner } }
    const evaluation = evaluate(link({ lines, corners, allowances, evidence }), read, { ...WHOLE, builds: 200 })
    const [allowance] = evaluation.allowances
    if (!allowance) throw new Error('no allowance')
    const codes = evaluation.flags.map(({ code, id }) => `${code} ${id}`)
    return { ...allowance, codes, db: allowance.lines.map(({ countedDb }) => countedDb ?? Number.NaN) }
  }
  return { cold: judge(null), hot: judge('hot') }
}
const only = (one: LineFile, corner: Partial<CornerFile>) => {
  const { cold, hot } = both({ l: one }, corner)
  return { cold: cold.lossDb ?? Number.NaN, hot: hot.lossDb ?? Number.NaN, in: hot, before: cold }
}

/** 1 + 0.00393 (T − 20) (IEC 60028). */
const resistivity = (celsius: number) => 1 + 0.00393 * (celsius - 20)
const skinDepth = (hz: number, celsius: number) =>
  Math.sqrt(resistivity(celsius) / (Math.PI * hz * 4e-7 * Math.PI * 5.8e7))
/** Cannonball form of Huray (from memory): 14 spheres of 0.06 Rz on 36 a². */
function cannonball(rz: number, hz: number, celsius: number): number {
  const a = 0.06 * rz
  const d = skinDepth(hz, celsius)
  return 1 + ((3 / 2) * ((14 * 4 * Math.PI) / 36)) / (1 + d / a + (d * d) / (2 * a * a))
}
/** π f √εr tan δ/c of a wave that is in the laminate altogether, dB. */
const dielectricDb = (dk: number, df: number, metres: number) =>
  (20 / Math.LN10) * ((Math.PI * 10e9 * Math.sqrt(dk) * df) / 299792458) * metres
const METRES = 5 * 0.0254
/** The field inside the copper makes the line slower, and with it the part of the dielectric larger, by about X/ωL. */
const SLOWER = 0.006

describe('the copper of a cross-section in a corner', () => {
  const lossless = { ...STRIPLINE, df: '0' }

  it('smooth: grows with the root of the resistivity, √(1.17685/1.01965) from 25 to 65 °C', () => {
    const { cold, hot } = only(lossless, { temperature: '65 °C' })
    // The strip is seven skin depths thick and the field inside adds little: within a half percent of the plain law.
    expect(Math.abs(hot / cold / Math.sqrt(resistivity(65) / resistivity(25)) - 1)).toBeLessThan(0.005)
    expect(cold).toBeGreaterThan(1)
  })

  it('rough: the roughness is recomputed with the longer skin depth, so it grows by less (from memory: cannonball)', () => {
    const rough = { ...lossless, roughness: 'cannonball' as const, roughnessTop: '3 µm', roughnessBottom: '3 µm' }
    const smooth = only(lossless, { temperature: '65 °C' })
    const { cold, hot } = only(rough, { temperature: '65 °C' })
    const factor = cannonball(3e-6, 10e9, 65) / cannonball(3e-6, 10e9, 25)
    expect(factor).toBeLessThan(0.985)
    expect(Math.abs(hot / cold / ((smooth.hot / smooth.cold) * factor) - 1)).toBeLessThan(0.004)
  })

  it('is the model asked at 65 °C by hand', () => {
    const { cold, hot } = only(STRIPLINE, { temperature: '65 °C', dielectricPerKelvin: '0.2 %/K' })
    const mil = 25.4e-6
    const values = {
      length: METRES,
      width: 5 * mil,
      thickness: 0.6 * mil,
      heightBelow: 5 * mil,
      heightAbove: 5 * mil,
      dk: 3.6,
      df: 0.006,
    }
    const at = (temperature: number, dfFactor: number) =>
      tracePiece(
        {
          structure: 'stripline',
          anchor: 10e9,
          roughness: 'smooth',
          surroundings: { temperature, dfFactor, dfAdded: 0, dkAdded: 0 },
        },
        values,
      ).attenuation?.(Float64Array.of(10e9))[0]
    expect(cold).toBeCloseTo(at(25, 1) ?? 0, 10)
    expect(hot).toBeCloseTo(at(65, 1.08) ?? 0, 10)
  })

  it('is that of the same line said to hold at 65 °C', () => {
    const { hot } = only(lossless, { temperature: '65 °C' })
    expect(hot).toBeCloseTo(only({ ...lossless, conditionTemperature: '65 °C' }, {}).cold, 10)
  })

  it('does not move a line that holds at 65 °C already', () => {
    const held = { ...STRIPLINE, conditionTemperature: '65 °C' }
    const { cold, hot, in: corner } = only(held, { temperature: '65 °C', dielectricPerKelvin: '0.2 %/K' })
    expect(hot).toBe(cold)
    expect(corner.judged).toMatchObject({ movedDb: 0, unmovedDb: 0 })
    expect(corner.codes).not.toContain('corner-does-not-move l')
  })
})

describe('the dielectric of a cross-section in a corner (π f √εr tan δ/c, by hand)', () => {
  it('grows by the typed coefficient of the loss tangent over 40 K', () => {
    const { hot } = only(STRIPLINE, { temperature: '65 °C', dielectricPerKelvin: '0.25 %/K' })
    const copper = only(STRIPLINE, { temperature: '65 °C', dielectricPerKelvin: '0 %/K' })
    expect(Math.abs((hot - copper.hot) / (dielectricDb(3.6, 0.006, METRES) * 0.0025 * 40) - 1)).toBeLessThan(SLOWER)
  })

  it('that says nothing of it is told to move the copper only', () => {
    const silent = only(STRIPLINE, { temperature: '65 °C' })
    expect(silent.in.codes).toContain('corner-does-not-move l')
    expect(silent.in.judged.movedDb).toBeCloseTo(silent.hot - silent.cold, 10)
    expect(silent.in.judged.unmovedDb).toBe(0)
    expect(only(STRIPLINE, { temperature: '65 °C', dielectricPerKelvin: '0 %/K' }).in.codes).not.toContain(
      'corner-does-not-move l',
    )
  })

  it('typed loss per kelvin counts alone where it alone is typed; beside the coefficient of the loss tangent it does not', () => {
    const typed = only(STRIPLINE, { temperature: '65 °C', lossPerKelvin: '0.12 %/K' })
    expect(typed.hot / typed.cold).toBeCloseTo(1 + 0.0012 * 40, 10)
    const computed = only(STRIPLINE, { temperature: '65 °C', dielectricPerKelvin: '0.2 %/K' })
    const both = { temperature: '65 °C', lossPerKelvin: '0.12 %/K', dielectricPerKelvin: '0.2 %/K' }
    expect(only(STRIPLINE, both).hot).toBeCloseTo(computed.hot, 12)
  })

  it('wet: Df and Dk grow by what is typed, so it is the same line with these values', () => {
    const wet = only(STRIPLINE, { humidity: 'wet', wetDf: '0.0018', wetDk: '0.05' })
    expect(wet.hot).toBeCloseTo(only({ ...STRIPLINE, df: '0.0078', dk: '3.65' }, {}).cold, 10)
    const moist = only(STRIPLINE, { humidity: 'wet', wetDf: '0.0018' })
    expect(Math.abs((moist.hot - moist.cold) / dielectricDb(3.6, 0.0018, METRES) - 1)).toBeLessThan(SLOWER)
    const held = only({ ...STRIPLINE, conditionHumidity: 'wet' }, { humidity: 'wet', wetDf: '0.0018' })
    expect(held.hot).toBe(held.cold)
  })

  it('wet and hot: the loss tangent grows, then moisture is added', () => {
    const both = { temperature: '65 °C', humidity: 'wet', dielectricPerKelvin: '0.25 %/K', wetDf: '0.0018' } as const
    const same = { ...STRIPLINE, df: String(0.006 * 1.1 + 0.0018), conditionTemperature: '65 °C' }
    expect(only(STRIPLINE, both).hot).toBeCloseTo(only(same, {}).cold, 8)
  })

  it('wet without Df or Dk takes the typed growth of trace loss', () => {
    const wet = only(STRIPLINE, { humidity: 'wet', lossWet: '4 %' })
    expect(wet.hot / wet.cold).toBeCloseTo(1.04, 10)
    expect(only(STRIPLINE, { humidity: 'wet' }).in.words).toMatch(/^undecided: the corner 'Hot' is wet/)
  })
})

describe('√f and f terms in a corner (by hand)', () => {
  const TERMS = {
    order: 'a1',
    kind: 'trace',
    model: 'per-length',
    basis: 'measured',
    length: '4 in',
    rootTerm: '0.15 dB/in',
    linearTerm: '0.04 dB/in',
    validFrom: '0.05 GHz',
    validTo: '20 GHz',
  } as const satisfies LineFile
  const root = 4 * 0.15 * Math.sqrt(10)
  const linear = 4 * 0.04 * 10

  it('the √f term follows copper from where it was fitted, the f term the typed coefficient', () => {
    const warm = { temperature: '65 °C', dielectricPerKelvin: '0.3 %/K' }
    const growth = (from: number) => Math.sqrt(resistivity(65) / resistivity(from))
    const found = only(TERMS, warm)
    expect(found.cold).toBeCloseTo(root + linear, 10)
    expect(found.hot).toBeCloseTo(root * growth(25) + linear * (1 + 0.003 * 40), 10)
    const fitted = only({ ...TERMS, conditionTemperature: '45 °C' }, warm)
    expect(fitted.hot).toBeCloseTo(root * growth(45) + linear * (1 + 0.003 * 20), 10)
    expect(only({ ...TERMS, conditionTemperature: '65 °C' }, warm).hot).toBeCloseTo(root + linear, 10)
  })

  it('a cable by terms likewise', () => {
    const cable = {
      ...TERMS,
      kind: 'cable',
      model: 'cable',
      length: '1 m',
      rootTerm: '1 dB/m',
      linearTerm: '0.1 dB/m',
    } as const
    const { hot } = only(cable, { temperature: '65 °C', dielectricPerKelvin: '0.3 %/K' })
    expect(hot).toBeCloseTo(Math.sqrt(10) * Math.sqrt(resistivity(65) / resistivity(25)) + 1 + 0.12, 10)
  })

  it('typed loss per kelvin counts where it alone is typed', () => {
    expect(only(TERMS, { temperature: '65 °C', lossPerKelvin: '0.1 %/K' }).hot).toBeCloseTo((root + linear) * 1.04, 10)
  })

  it('colder lowers a nominal number and never a guaranteed maximum', () => {
    const cold = { temperature: '0 °C', dielectricPerKelvin: '0.3 %/K' }
    expect(only(TERMS, cold).hot).toBeLessThan(root + linear - 0.1)
    expect(only({ ...TERMS, grade: 'maximum' }, cold).hot).toBeCloseTo(root + linear, 12)
    const geometry = only({ ...STRIPLINE, grade: 'maximum' }, cold)
    expect(geometry.hot).toBe(geometry.cold)
  })
})

describe('an extreme of fabrication', () => {
  const STATED = line('a1', '5 dB', { kind: 'via', toleranceMinus: '0.3 dB', tolerancePlus: '0.5 dB' })

  it('moves by the tolerance and removes it: it cannot vary any more', () => {
    for (const [fabrication, db] of [
      ['high-loss', 5.5],
      ['low-loss', 4.7],
    ] as const) {
      const { in: corner } = only(STATED, { fabrication })
      expect(corner).toMatchObject({ lossDb: db, worstDb: db, rssDb: 0 })
      expect(corner.judged.movedDb).toBeCloseTo(db - 5, 12)
      expect(corner.builds?.percentiles.p50).toMatchObject({ db: expect.closeTo(db, 12), error: 0 })
    }
  })

  it('on a hot corner: of the grown loss where the tolerance is in %', () => {
    const trace = { ...STATED, kind: 'trace' as const, toleranceMinus: null, tolerancePlus: '10 %' }
    const { hot } = only(trace, { temperature: '65 °C', lossPerKelvin: '0.1 %/K', fabrication: 'high-loss' })
    expect(hot).toBeCloseTo(5 * 1.04 * 1.1, 12)
  })

  it('takes 3σ of what is given in σ, and all of what varies inside a model', () => {
    expect(only({ ...STATED, toleranceMeaning: '1-sigma' }, { fabrication: 'high-loss' }).hot).toBeCloseTo(6.5, 12)
    const varying = { ...STRIPLINE, toleranceMinus: '0 dB', tolerancePlus: '0 dB', varies: 'length 10 %' }
    const { cold, hot } = only(varying, { fabrication: 'high-loss' })
    expect(hot / cold).toBeCloseTo(1.1, 9)
  })

  it('does not move a number that contains the spread of fabrication', () => {
    const { in: corner, cold } = only({ ...STATED, processIncluded: true }, { fabrication: 'high-loss' })
    expect([corner.lossDb, cold]).toEqual([5, 5])
    expect(corner.codes).not.toContain('corner-does-not-move l')
  })

  it('does not lower a guaranteed maximum', () => {
    expect(only({ ...STATED, grade: 'maximum' }, { fabrication: 'low-loss' }).hot).toBe(5)
  })

  it('says what it cannot move: a number without a tolerance', () => {
    const { in: corner } = only(line('a1', '5 dB', { kind: 'via' }), { fabrication: 'high-loss' })
    expect(corner.judged).toMatchObject({ movedDb: 0, unmovedDb: 5 })
    expect(corner.codes).toContain('corner-does-not-move l')
  })
})

describe('what a corner moved and could not move', () => {
  it('adds up over the lines: only those whose number does not hold there', () => {
    const lines = {
      t: line('a1', '5 dB', { kind: 'trace' }),
      held: line('a2', '2 dB', { kind: 'trace', conditionTemperature: '65 °C' }),
      v: line('a3', '1 dB', { kind: 'via' }),
      w: line('a4', '0.7 dB', { kind: 'via', conditionTemperature: '65 °C' }),
      r: { order: 'a5', kind: 'reserve', purpose: 'growth', model: 'stated', loss: '0.5 dB' },
    } as const
    const { hot } = both(lines, { temperature: '65 °C', lossPerKelvin: '0.1 %/K' })
    expect(hot.judged.movedDb).toBeCloseTo(0.2, 12)
    expect(hot.judged.unmovedDb).toBeCloseTo(1, 12)
    expect(hot.codes.filter((code) => code.startsWith('corner-does-not-move'))).toEqual(['corner-does-not-move v'])
    expect(both(lines, {}).cold.judged).toMatchObject({ movedDb: null, unmovedDb: null })
  })

  it('in the cascade too: a file grown by a factor passes that much less at every frequency', () => {
    const { read } = evidenceOf({ a: constantly(GRID, (hz) => attenuator(0.4 * Math.sqrt(hz / 1e9))) })
    const lines = { l: fileLine('a1', 'a', { kind: 'trace' }) }
    const { cold, hot } = both(lines, { temperature: '65 °C', lossPerKelvin: '0.1 %/K' }, read)
    hot.channel?.trace.hz.forEach((hz, k) => {
      const db = 0.4 * Math.sqrt(hz / 1e9)
      expect(cold.channel?.trace.lossDb[k]).toBeCloseTo(db, 9)
      expect(hot.channel?.trace.lossDb[k]).toBeCloseTo(db * 1.04, 9)
    })
    expect(hot.channel?.coveredDb).toBeCloseTo(0.4 * Math.sqrt(10) * 1.04, 10)
  })
})
