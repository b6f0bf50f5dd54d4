import { describe, expect, it } from 'vitest'
import { evaluate, WHOLE } from '../../lib/budget/evaluate'
import type { AllowanceEvaluation, ChannelEvaluation, EvidenceNetwork } from '../../lib/budget/evaluation'
import type { BudgetFile } from '../../lib/budget/schema'
import { line, link } from './links'
import {
  attenuator,
  constantly,
  evidenceOf,
  fileLine,
  fileOf,
  GRID,
  lossOf,
  returnLossOf,
  type Section,
  step,
} from './sections'

type Lines = NonNullable<BudgetFile['lines']>

function whole(files: Readonly<Record<string, EvidenceNetwork>>, lines: Lines, parts: Partial<BudgetFile> = {}) {
  const { evidence, read } = evidenceOf(files)
  const { allowances, flags } = evaluate(link({ evidence, lines, ...parts }), read, { ...WHOLE, builds: 0 })
  const [allowance] = allowances
  if (!allowance?.channel) throw new Error('no cascade')
  return { allowance, channel: allowance.channel, codes: flags.map(({ code }) => code) }
}

const sweepOf = ({ trace }: ChannelEvaluation) => trace.hz.map((hz, k) => ({ hz, db: trace.lossDb[k] ?? Number.NaN }))
const counted = ({ lines }: AllowanceEvaluation) => lines.map(({ countedDb }) => countedDb ?? Number.NaN)

/** 85 Ω without loss, and 118 Ω losing as √f and f, both in 100 Ω. */
const NEAR: Section = { ohm: 85, delay: 130e-12 }
const FAR: Section = { ohm: 118, delay: 210e-12, db: (hz) => 0.4 * Math.sqrt(hz / 1e9) + 0.05 * (hz / 1e9) }
const MIDDLE: Section = { ohm: 100, delay: 90e-12, db: () => 1 }

describe('the cascade beside the sum (ABCD matrices of line sections, Pozar section 4.4, computed once more in the test)', () => {
  const two = () =>
    whole(
      { near: fileOf([NEAR], GRID), far: fileOf([FAR], GRID) },
      { near: fileLine('a1', 'near'), far: fileLine('a2', 'far') },
    )

  it('of two mismatched sections differs from their sum by what the matrices say, at Nyquist', () => {
    const { allowance, channel } = two()
    const [near, far] = [lossOf([NEAR], 10e9), lossOf([FAR], 10e9)]
    expect(counted(allowance)).toEqual([expect.closeTo(near, 10), expect.closeTo(far, 10)])
    expect(channel.coveredDb).toBeCloseTo(near + far, 10)
    const difference = lossOf([NEAR, FAR], 10e9) - near - far
    expect(Math.abs(difference)).toBeGreaterThan(0.05)
    expect((channel.lossDb ?? Number.NaN) - channel.coveredDb).toBeCloseTo(difference, 4)
  })

  it('is theirs over the whole trace, and so is the return loss of the worse end', () => {
    const { channel } = two()
    expect(channel).toMatchObject({ fromHz: 0.05e9, toHz: 20e9, withoutBand: [], withoutReflection: [] })
    expect(channel.trace.hz).toHaveLength(2000)
    for (const { hz, db } of sweepOf(channel)) expect(Math.abs(db - lossOf([NEAR, FAR], hz))).toBeLessThan(1e-9)
    channel.trace.hz.forEach((hz, k) => {
      const db = channel.trace.returnLossDb?.[k] ?? Number.NaN
      expect(Math.abs(db - returnLossOf([NEAR, FAR], hz))).toBeLessThan(1e-7)
    })
  })

  it('tells the return loss at Nyquist and the worst at or below it, not above', () => {
    const { channel } = two()
    const below = channel.trace.hz.filter((hz) => hz <= 10e9)
    const worst = Math.min(...below.map((hz) => returnLossOf([NEAR, FAR], hz)))
    const above = Math.min(...channel.trace.hz.map((hz) => returnLossOf([NEAR, FAR], hz)))
    expect(channel.returnLoss?.whole).toBe(true)
    expect(channel.returnLoss?.worstDb).toBeCloseTo(worst, 8)
    expect(returnLossOf([NEAR, FAR], channel.returnLoss?.worstAtHz ?? 0)).toBeCloseTo(worst, 8)
    expect(channel.returnLoss?.atNyquistDb).toBeCloseTo(returnLossOf([NEAR, FAR], 10e9), 3)
    expect(above).toBeLessThanOrEqual(worst)
  })

  it('goes by channel order, not by the order of keys: three sections', () => {
    const files = { a: fileOf([FAR], GRID), b: fileOf([MIDDLE], GRID), c: fileOf([NEAR], GRID) }
    const lines = { a: fileLine('a3', 'a'), b: fileLine('a2', 'b'), c: fileLine('a1', 'c') }
    const { channel } = whole(files, lines)
    for (const { hz, db } of sweepOf(channel)) expect(Math.abs(db - lossOf([NEAR, MIDDLE, FAR], hz))).toBeLessThan(1e-9)
    const s11 = (channel.trace.returnLossDb ?? []).map((db) => db ?? Number.NaN)
    channel.trace.hz.forEach((hz, k) => {
      expect(Math.abs((s11[k] ?? 0) - returnLossOf([NEAR, MIDDLE, FAR], hz))).toBeLessThan(1e-7)
    })
  })

  it('keeps a typed skew in it: 20 log10 cos(π f Δt) more, at every frequency', () => {
    const lines = { near: fileLine('a1', 'near', { skew: '8 ps' }), far: fileLine('a2', 'far') }
    const { channel, allowance } = whole({ near: fileOf([NEAR], GRID), far: fileOf([FAR], GRID) }, lines)
    const skew = (hz: number) => -20 * Math.log10(Math.cos(Math.PI * hz * 8e-12))
    expect(counted(allowance)[0]).toBeCloseTo(lossOf([NEAR], 10e9) + skew(10e9), 10)
    // What comes back and goes again is less too: only the main part is compared.
    const last = sweepOf(channel).at(-1)
    expect(Math.abs((last?.db ?? 0) - lossOf([NEAR, FAR], 20e9) - skew(20e9))).toBeLessThan(0.02)
  })
})

describe('two reflections with a line between them', () => {
  it.each([
    [0.1, 0.1, 0, 0.17372],
    [0.1, 0.1, 3, undefined],
    [0.2, 0.15, 1.5, undefined],
  ])(
    'Γ %d and %d, %d dB apart: ripple 20 log10((1 + Γ1Γ2 10^(−a/10))/(1 − Γ1Γ2 10^(−a/10))) (0.17372 dB from memory)',
    (first, second, db, known) => {
      const between: Section = { ohm: 100, delay: 1.2e-9, db: () => db }
      const files = {
        a: constantly(GRID, () => step(first)),
        b: fileOf([between], GRID),
        c: constantly(GRID, () => step(-second)),
      }
      const lines = { a: fileLine('a1', 'a'), b: fileLine('a2', 'b'), c: fileLine('a3', 'c') }
      const { channel } = whole(files, lines)
      const p = first * second * 10 ** (-db / 10)
      const ripple = 20 * Math.log10((1 + p) / (1 - p))
      if (known !== undefined) expect(ripple).toBeCloseTo(known, 5)
      const loss = sweepOf(channel).map((one) => one.db)
      expect(Math.abs((Math.max(...loss) - Math.min(...loss)) / ripple - 1)).toBeLessThan(0.003)
      // Where the band begins √f bends into the first wave, so the deviation from the fit is not quite the ripple.
      expect(Math.abs((channel.deviation?.rippleDb ?? 0) / ripple - 1)).toBeLessThan(0.04)
      // An almost sinusoidal ripple: rms = peak to peak / 2√2.
      expect(Math.abs(((channel.deviation?.rmsDb ?? 0) * 2 * Math.SQRT2) / ripple - 1)).toBeLessThan(0.02)
    },
  )
})

describe('what takes part in the cascade', () => {
  const TERMS = {
    kind: 'trace',
    model: 'per-length',
    basis: 'simulated',
    length: '2 in',
    rootTerm: '0.2 dB/in',
    linearTerm: '0.03 dB/in',
    validFrom: '0.05 GHz',
    validTo: '20 GHz',
  } as const
  const terms = (hz: number) => 2 * (0.2 * Math.sqrt(hz / 1e9) + 0.03 * (hz / 1e9))
  const FILES = { a: constantly(GRID, () => step(0.2)), c: constantly(GRID, () => step(-0.3)) }
  const ENDS = { a: fileLine('a1', 'a'), c: fileLine('a3', 'c') }

  it('a line without reflection data enters as matched attenuation: t1·t2·k/(1 − Γ1Γ2k²)', () => {
    const { channel, allowance } = whole(FILES, { ...ENDS, b: { order: 'a2', ...TERMS } })
    for (const { hz, db } of sweepOf(channel)) {
      const k = 10 ** (-terms(hz) / 20)
      const through = Math.sqrt(1 - 0.2 ** 2) * Math.sqrt(1 - 0.3 ** 2)
      expect(Math.abs(db + 20 * Math.log10((through * k) / (1 - 0.2 * 0.3 * k * k)))).toBeLessThan(1e-9)
    }
    const steps = -10 * Math.log10(1 - 0.2 ** 2) - 10 * Math.log10(1 - 0.3 ** 2)
    expect(channel.coveredDb).toBeCloseTo(steps + terms(10e9), 10)
    expect(channel.coveredDb).toBeCloseTo(allowance.nominalDb ?? 0, 10)
    expect(channel.reflectingDb).toBeCloseTo(steps, 10)
    expect(channel.withoutReflection).toEqual(['b'])
    expect(channel.withoutBand).toEqual([])
    expect([channel.returnLoss, channel.deviation, channel.trace.returnLossDb]).toEqual([null, null, null])
    expect(channel.fittedDb).not.toBeNull()
  })

  it('with impedance and delay typed the same line reflects, and everything is known', () => {
    const own = { ...TERMS, impedance: '92 Ω', delay: '170 ps/in' } as const
    const { channel } = whole({}, { b: { order: 'a2', ...own } })
    const section: Section = { ohm: 92, delay: 2 * 170e-12, db: terms }
    for (const { hz, db } of sweepOf(channel)) expect(Math.abs(db - lossOf([section], hz))).toBeLessThan(1e-9)
    expect(channel.returnLoss?.worstDb).toBeCloseTo(
      Math.min(...channel.trace.hz.filter((hz) => hz <= 10e9).map((hz) => returnLossOf([section], hz))),
      7,
    )
  })

  it('a stated line lacks a band: it is left out, and so are return loss and deviation', () => {
    const { channel, allowance } = whole(FILES, { ...ENDS, b: line('a2', '1 dB') })
    expect(channel.withoutBand).toEqual(['b'])
    expect(channel.coveredDb).toBeCloseTo((allowance.nominalDb ?? 0) - 1, 10)
    expect(channel.reflectingDb).toBeCloseTo(channel.coveredDb, 10)
    expect([channel.returnLoss, channel.deviation]).toEqual([null, null])
  })

  it('a reserve is no two-port, whatever its model; an overlap is none either', () => {
    const reserves: Lines = {
      ...ENDS,
      r: { order: 'a4', kind: 'reserve', purpose: 'growth', model: 'stated', loss: '1 dB' },
      t: { order: 'a5', kind: 'reserve', purpose: 'process', model: 'table', points: '0.05 GHz 0.1 dB; 20 GHz 2 dB' },
    }
    const steps = -10 * Math.log10(1 - 0.2 ** 2) - 10 * Math.log10(1 - 0.3 ** 2)
    const held = whole(FILES, reserves).channel
    expect(held.coveredDb).toBeCloseTo(steps, 10)
    expect(held.returnLoss).not.toBeNull()
    const overlap = { order: 'a4', kind: 'overlap', model: 'stated', loss: '0.1 dB', at: '10 GHz' } as const
    const overlapped = whole(FILES, { ...ENDS, o: { ...overlap, overlapA: 'a', overlapB: 'c' } })
    expect(overlapped.channel.coveredDb).toBeCloseTo(steps, 10)
    expect(overlapped.allowance.nominalDb).toBeCloseTo(steps - 0.1, 10)
    expect([overlapped.channel.returnLoss, overlapped.channel.withoutBand]).toEqual([null, ['o']])
  })

  it('ends where the data of any line end, and says so; what is fitted ends at the symbol rate', () => {
    const short = Float64Array.from(GRID.filter((hz) => hz >= 0.5e9 && hz <= 14e9))
    const { channel } = whole({ ...FILES, a: constantly(short, () => step(0.2)) }, ENDS)
    expect([channel.fromHz, channel.toHz]).toEqual([short[0], short.at(-1)])
    const curve = { limit: { ...link({}).allowances.limit, order: 'a0', curve: '0.05..30 GHz: 9' } }
    const long = Float64Array.from({ length: 400 }, (_, k) => 0.1e9 * (k + 1))
    const wild = constantly(long, (hz) => attenuator(hz > 20e9 ? 30 : 2))
    const beyond = whole({ a: wild }, { a: fileLine('a1', 'a') }, { allowances: curve }).channel
    expect(beyond.toHz).toBe(30e9)
    expect(beyond.fittedDb).toBeCloseTo(2, 9)
    expect(beyond.deviation?.maxDb).toBeCloseTo(0, 9)
    expect(beyond.curve?.missed).toMatchObject({ worstDb: expect.closeTo(21, 6) })
  })

  it('data that begin above a quarter of the frequency are no band', () => {
    const from = (share: number) => Float64Array.from(GRID.filter((hz) => hz >= share * 10e9))
    const late = { ...FILES, a: constantly(from(0.26), () => step(0.2)) }
    expect(whole(late, ENDS).channel.withoutBand).toEqual(['a'])
    expect(whole({ ...FILES, a: constantly(from(0.24), () => step(0.2)) }, ENDS).channel.withoutBand).toEqual([])
  })

  it('nothing passes or comes back: unknown, never Infinity or a passed floor', () => {
    const through = whole({ a: constantly(GRID, () => attenuator(3)) }, { a: fileLine('a1', 'a') }).channel
    expect(through.returnLoss).toMatchObject({ whole: true, atNyquistDb: null, worstDb: null })
    expect(JSON.parse(JSON.stringify(through))).toEqual(through)
    const notch = constantly(GRID, (hz) => (hz > 14e9 && hz < 14.1e9 ? [1, 0, 0, 0, 0, 0, 1, 0] : attenuator(1)))
    const curve = { limit: { ...link({}).allowances.limit, order: 'a0', curve: '0.05..20 GHz: 9' } }
    const { channel, allowance } = whole({ a: notch }, { a: fileLine('a1', 'a') }, { allowances: curve })
    expect(JSON.parse(JSON.stringify(channel))).toEqual(channel)
    expect(channel.fittedDb).toBeNull()
    expect(allowance.words).toBe('inside at Nyquist; limit curve unknown')
  })
})

describe('sum against fitted cascade: flagged over max(0.5 dB, 3 %)', () => {
  /** Two steps without delay lose 20 log10(1 + r²) more than their sum at every frequency, and an attenuator in front none. */
  function differing(db: number, front: number) {
    const r = Math.sqrt(10 ** (db / 20) - 1)
    const files = {
      a: constantly(GRID, () => attenuator(front)),
      b: constantly(GRID, () => step(r)),
      c: constantly(GRID, () => step(r)),
    }
    const lines = { a: fileLine('a1', 'a'), b: fileLine('a2', 'b'), c: fileLine('a3', 'c') }
    const { channel, codes } = whole(files, lines)
    expect((channel.fittedDb ?? 0) - channel.coveredDb).toBeCloseTo(db, 6)
    return { flagged: codes.includes('cascade-differs'), covered: channel.coveredDb }
  }

  it('half a decibel where the sum is small', () => {
    expect(differing(0.4999, 1).flagged).toBe(false)
    expect(differing(0.5001, 1).flagged).toBe(true)
  })

  it('3 % of a large sum', () => {
    const { covered } = differing(0.9, 29)
    const without = covered - 29
    // The steps' own loss changes little with the difference: find the attenuator for 3 %.
    const front = 0.9 / 0.03 - without
    expect(differing(0.9, front + 0.01).flagged).toBe(false)
    expect(differing(0.9, front - 0.01).flagged).toBe(true)
  })
})
