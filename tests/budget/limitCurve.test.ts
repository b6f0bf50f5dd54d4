import { describe, expect, it } from 'vitest'
import { AT_NYQUIST, evaluate, WHOLE } from '../../lib/budget/evaluate'
import type { AllowanceEvaluation, EvidenceNetwork } from '../../lib/budget/evaluation'
import type { BudgetFile } from '../../lib/budget/schema'
import { line, link } from './links'
import { attenuator, constantly, evidenceOf, fileLine, GRID, step, steps } from './sections'

type AllowanceFile = NonNullable<BudgetFile['allowances']>[string]
type Parts = Partial<Omit<BudgetFile, 'evidence' | 'allowances'>>
type Files = Readonly<Record<string, EvidenceNetwork>>

/** The verdict, words and reasons must not depend on what is asked for; both are evaluated. */
function judged(allowance: Partial<AllowanceFile>, files: Files, parts: Parts) {
  const { evidence, read } = evidenceOf(files)
  const limit = { ...link({}).allowances.limit, order: 'a0', ...allowance }
  const budget = link({ ...parts, evidence, allowances: { limit } })
  const short = evaluate(budget, read, AT_NYQUIST)
  const full = evaluate(budget, read, { ...WHOLE, builds: 100 })
  const [one, other] = [short.allowances[0], full.allowances[0]] as [AllowanceEvaluation, AllowanceEvaluation]
  const verdictOf = ({ verdict, words, reasons, marginDb, lossDb }: AllowanceEvaluation) =>
    JSON.stringify({ verdict, words, reasons, marginDb, lossDb })
  expect(verdictOf(one)).toBe(verdictOf(other))
  const said = full.flags.filter(({ id }) => id === 'limit').map(({ code, message }) => ({ code, message }))
  const flagged = short.flags.filter(({ id }) => id === 'limit').map(({ code, message }) => ({ code, message }))
  expect(said.filter(({ code }) => code !== 'cascade-differs')).toEqual(
    flagged.filter(({ code }) => code !== 'cascade-differs'),
  )
  return { ...one, codes: said.map(({ code }) => code), channel: other.channel }
}

/** A matched file that loses 0.5 dB a GHz: 5 dB at Nyquist. */
const sloped = (hz: Float64Array) => constantly(hz, (at) => attenuator(0.5 * (at / 1e9)))
const ONE = { lines: { a: fileLine('a1', 'a') } }
const DATA = { a: sloped(GRID) }

describe('a limit curve against the cascade (straight lines, by hand)', () => {
  it('is kept: inside, without a further word', () => {
    const found = judged({ curve: '0.05..20 GHz: 0.1 + 0.6 f' }, DATA, ONE)
    expect(found).toMatchObject({ verdict: 'inside', words: 'inside', reasons: [], codes: [] })
    expect(found.channel?.curve).toEqual({ whole: true, missed: null })
  })

  it('is missed: tight, and the reason says by how much, where and over which band', () => {
    // 0.5 f over 6 from 12 GHz on; most at 20 GHz, by 4 dB.
    const found = judged({ curve: '0.05..20 GHz: 6' }, DATA, ONE)
    const first = [...GRID].find((hz) => 0.5 * (hz / 1e9) > 6 + 1e-9) ?? 0
    const reason = `limit curve missed by 4.00 dB at 20 GHz (${Number((first / 1e9).toPrecision(6))} GHz to 20 GHz)`
    expect(found).toMatchObject({ verdict: 'tight', words: `tight: ${reason}`, reasons: [reason] })
    expect(found.marginDb).toBeCloseTo(7, 9)
    expect(found.channel?.curve?.missed?.fromHz).toBeCloseTo(first, 0)
  })

  it('of two pieces holds the stricter where they meet, and none in a gap', () => {
    const both = judged({ curve: '0.05..8 GHz: 4.1; 8..20 GHz: 10.5' }, DATA, ONE)
    expect(both.verdict).toBe('inside')
    expect(judged({ curve: '0.05..8 GHz: 3.9; 8..20 GHz: 10.5' }, DATA, ONE).reasons[0]).toMatch(/missed by 0\.1/)
    expect(judged({ curve: '0.05..6 GHz: 3.1; 14..20 GHz: 10.5' }, DATA, ONE).verdict).toBe('inside')
  })

  it('a piece between two samples of the sweep is judged at its ends', () => {
    const found = judged({ curve: '0.05..9.9961 GHz: 30; 9.9962..9.9963 GHz: 3; 9.9964..20 GHz: 30' }, DATA, ONE)
    expect([...GRID].some((hz) => hz > 9.9961e9 && hz < 9.9964e9)).toBe(false)
    expect(found.reasons).toEqual([expect.stringMatching(/^limit curve missed by 2\.00 dB at 9\.9963 GHz/)])
  })

  it('is unknown where a line has no data over the band', () => {
    const found = judged({ curve: '0.05..20 GHz: 30' }, DATA, { lines: { ...ONE.lines, b: line('a2', '1 dB') } })
    expect(found).toMatchObject({ verdict: 'inside', words: 'inside at Nyquist; limit curve unknown' })
    expect(found.reasons).toEqual(['the limit curve is not known: not every line has data over the band'])
    expect(found.codes).toContain('curve-not-judged')
  })

  it('but missed where what is joined misses it already', () => {
    const lines = { ...ONE.lines, b: line('a2', '1 dB') }
    const found = judged({ curve: '0.05..20 GHz: 6' }, DATA, { lines })
    expect(found.verdict).toBe('tight')
    expect(found.words).toMatch(/^tight: limit curve missed by 4\.00 dB/)
    expect(found.codes).not.toContain('curve-not-judged')
  })

  it('beyond the data is unknown; below where they begin too; missed if it is already', () => {
    expect(judged({ curve: '0.05..25 GHz: 30' }, DATA, ONE).words).toBe('inside at Nyquist; limit curve unknown')
    expect(judged({ curve: '0.05..25 GHz: 6' }, DATA, ONE).verdict).toBe('tight')
    const late = { a: sloped(Float64Array.from(GRID.filter((hz) => hz > 0.2e9))) }
    expect(judged({ curve: '0.05..20 GHz: 30' }, late, ONE).words).toBe('inside at Nyquist; limit curve unknown')
    expect(judged({ curve: '0.5..20 GHz: 30' }, late, ONE).words).toBe('inside')
    // Nobody asks below 0.05 GHz, where a sweep begins.
    expect(judged({ curve: '0.01..20 GHz: 30' }, DATA, ONE).words).toBe('inside')
  })

  it('a file that reaches beyond the symbol rate is judged over all of the curve', () => {
    const found = judged({ curve: '0.05..28 GHz: 13.9' }, { a: sloped(steps(0.05e9, 600)) }, ONE)
    expect(found.words).toMatch(/^tight: limit curve missed by 0\.10 dB at 28 GHz/)
  })

  it('a reserve counts against it at every frequency', () => {
    const reserve = { order: 'a2', kind: 'reserve', purpose: 'growth', model: 'stated', loss: '1 dB' } as const
    const lines = { ...ONE.lines, r: reserve }
    expect(judged({ curve: '0.05..20 GHz: 1.05 + 0.5 f' }, DATA, { lines }).verdict).toBe('inside')
    expect(judged({ curve: '0.05..20 GHz: 0.75 + 0.5 f' }, DATA, { lines }).reasons).toEqual([
      expect.stringMatching(/^limit curve missed by 0\.25 dB/),
    ])
  })

  it('an overlap makes it unknown: what it takes away has no curve', () => {
    const overlap = { order: 'a3', kind: 'overlap', model: 'stated', loss: '0.1 dB', at: '10 GHz' } as const
    const lines = { ...ONE.lines, b: fileLine('a2', 'b'), o: { ...overlap, overlapA: 'a', overlapB: 'b' } }
    const files = { ...DATA, b: constantly(GRID, () => attenuator(1)) }
    expect(judged({ curve: '0.05..20 GHz: 30' }, files, { lines }).words).toBe('inside at Nyquist; limit curve unknown')
  })

  it('that cannot be read is unknown, and says why', () => {
    const found = judged({ curve: 'about 7 dB' }, DATA, ONE)
    expect(found.words).toBe('inside at Nyquist; limit curve unknown')
    expect(found.codes).toEqual(['unreadable-value', 'curve-not-judged'])
  })

  it('never makes an undecided or an over allowance better', () => {
    const open = { lines: { ...ONE.lines, b: line('a2', null) } }
    expect(judged({ curve: '0.05..20 GHz: 6' }, DATA, open).verdict).toBe('undecided')
    expect(judged({ curve: '0.05..20 GHz: 30', limit: '4 dB' }, DATA, ONE).verdict).toBe('over')
  })
})

describe('a return-loss floor', () => {
  /** Reflects 0.2: 13.979 dB at every frequency. */
  const FILES = { a: constantly(GRID, () => step(0.2)) }
  const reflected = -20 * Math.log10(0.2)

  it('is kept, just missed, and unknown without reflection data', () => {
    expect(judged({ returnLossFloor: '13.9 dB' }, FILES, ONE).words).toBe('inside')
    const missed = judged({ returnLossFloor: '14 dB' }, FILES, ONE)
    expect(missed.verdict).toBe('tight')
    expect(missed.reasons[0]).toMatch(/^return loss 13\.98 dB at .*Hz where 14\.00 dB are asked for$/)
    expect(missed.channel?.returnLoss?.worstDb).toBeCloseTo(reflected, 9)
    const unknown = judged({ returnLossFloor: '5 dB' }, FILES, { lines: { ...ONE.lines, b: line('a2', '1 dB') } })
    expect(unknown.words).toBe('inside at Nyquist; return loss unknown')
    expect(unknown.codes).toContain('floor-not-judged')
  })

  it('is asked for up to the Nyquist frequency and no further', () => {
    const worse = constantly(GRID, (hz) => step(hz > 10.05e9 ? 0.7 : 0.1))
    expect(judged({ returnLossFloor: '19 dB' }, { a: worse }, ONE).words).toBe('inside')
  })

  it('is unknown, not passed, where the data begin late or end below the Nyquist frequency', () => {
    const below = constantly(Float64Array.from(GRID.filter((hz) => hz < 6e9)), () => step(0.2))
    const at = { limit: '12 dB', at: '5 GHz' }
    const found = judged({ ...at, returnLossFloor: '10 dB' }, { a: below }, ONE)
    expect(found.words).toBe('inside at 5 GHz; return loss unknown')
    expect(found.channel?.returnLoss).toMatchObject({ whole: false, atNyquistDb: null })
    expect(judged({ ...at, returnLossFloor: '15 dB' }, { a: below }, ONE).verdict).toBe('tight')
    const late = constantly(Float64Array.from(GRID.filter((hz) => hz > 1e9)), () => step(0.2))
    expect(judged({ returnLossFloor: '10 dB' }, { a: late }, ONE).words).toBe('inside at Nyquist; return loss unknown')
  })

  it('both unknown are said together', () => {
    const both = judged(
      { returnLossFloor: '5 dB', curve: '0.05..20 GHz: 30' },
      {},
      { lines: { b: line('a2', '1 dB') } },
    )
    expect(both.words).toBe('inside at Nyquist; limit curve and return loss unknown')
  })

  it('nothing that comes back keeps any floor', () => {
    expect(judged({ returnLossFloor: '60 dB' }, DATA, ONE).words).toBe('inside')
  })
})

describe('the long and the short lane', () => {
  /** A reflection of 0.3 between two traces whose lanes are 2 in and 5 in long, 0.5 dB/in at 10 GHz by √f. */
  const trace = {
    kind: 'trace',
    model: 'per-length',
    basis: 'simulated',
    length: '4 in',
    rootTerm: `${0.5 / Math.sqrt(10)} dB/in`,
    linearTerm: '0 dB/in',
    validFrom: '0.05 GHz',
    validTo: '20 GHz',
    impedance: '100 Ω',
    delay: '170 ps/in',
  } as const
  const parts: Parts = {
    head: { ...link({}).head, laneCount: 4 },
    lines: { s: { order: 'a1', ...trace }, a: fileLine('a2', 'a'), t: { order: 'a3', ...trace } },
    laneValues: { 's/2/length': '2 in', 't/2/length': '2 in', 's/3/length': '5 in', 't/3/length': '5 in' },
  }
  const files = { a: constantly(GRID, () => step(0.3)) }
  const round = (inches: number, hz: number) => 2 * inches * 0.5 * Math.sqrt(hz / 10e9)

  it('the long one misses a curve, the short one a floor, each named', () => {
    const found = judged({ returnLossFloor: '12 dB', curve: '8..20 GHz: 6' }, files, parts)
    expect(found.judged).toMatchObject({ lane: 3, shortestLane: 2 })
    // The worst return loss lies at the lowest frequency, where the traces lose least.
    const least = -20 * Math.log10(0.3) + round(2, 0.05e9)
    expect(found.reasons).toEqual([
      expect.stringMatching(/^limit curve missed by .* in lane 3$/),
      expect.stringMatching(/^return loss .* dB are asked for in lane 3$/),
      expect.stringMatching(new RegExp(`^return loss ${least.toFixed(2)} dB at 50 MHz .* in lane 2$`)),
    ])
  })

  it('the short one alone misses a floor that the long one keeps', () => {
    const between = -20 * Math.log10(0.3) + (round(2, 0.05e9) + round(5, 0.05e9)) / 2
    const found = judged({ returnLossFloor: `${between.toFixed(4)} dB` }, files, parts)
    expect(found.reasons).toEqual([expect.stringMatching(/ in lane 2$/)])
    expect(found.verdict).toBe('tight')
  })

  it('the long one alone misses a curve that the short one keeps', () => {
    const loss = (inches: number) => round(inches, 20e9) - 10 * Math.log10(1 - 0.3 ** 2)
    const found = judged({ curve: `0.05..20 GHz: ${(loss(5) - 0.1).toFixed(3)}` }, files, parts)
    expect(found.reasons).toEqual([expect.stringMatching(/^limit curve missed by 0\.10 dB at 20 GHz .* in lane 3$/)])
    expect(judged({ curve: `0.05..20 GHz: ${(loss(5) + 0.1).toFixed(3)}` }, files, parts).verdict).toBe('inside')
  })

  it('a named lane is judged alone', () => {
    expect(judged({ returnLossFloor: '12 dB', judgedLane: 2 }, files, parts).reasons).toEqual([
      expect.stringMatching(/asked for$/),
    ])
  })
})

describe('a limit that is used at another frequency than its own', () => {
  const terms = {
    order: 'a1',
    kind: 'trace',
    model: 'per-length',
    basis: 'simulated',
    length: '1 in',
    rootTerm: '1 dB/in',
    linearTerm: '0 dB/in',
    validFrom: '0.05 GHz',
    validTo: '20 GHz',
  } as const
  const parts = { lines: { t: terms } }

  it('is moved along its own curve, keeping the distance of limit and curve', () => {
    // Curve 1 + f: 11 at 10 GHz, 9 at 8 GHz; the limit of 12 lies 1 above, so 10 at 8 GHz.
    const found = judged({ usedAt: '8 GHz', curve: '0.05..20 GHz: 1 + f' }, {}, parts)
    expect(found.limitDb).toBeCloseTo(10, 9)
    expect(found.atHz).toBe(8e9)
    expect(found.lossDb).toBeCloseTo(Math.sqrt(8), 9)
    expect(found.marginDb).toBeCloseTo(10 - Math.sqrt(8), 9)
    expect(found.codes).toContain('limit-moved')
  })

  it('is refused without a curve and outside of it: undecided, with the reason', () => {
    for (const curve of [null, '9..20 GHz: 1 + f', '0.05..9 GHz: 1 + f']) {
      const found = judged({ usedAt: '8 GHz', curve }, {}, parts)
      expect(found).toMatchObject({ verdict: 'undecided', marginDb: null, leftDb: null })
      expect(found.words).toMatch(/^undecided: its limit cannot be had at 8 GHz: it is /)
      expect(found.codes).toContain('limit-not-moved')
    }
  })

  it('stands as it is within 2 %', () => {
    const found = judged({ usedAt: '9.9 GHz' }, {}, parts)
    expect([found.limitDb, found.atHz, found.verdict]).toEqual([12, 9.9e9, 'inside'])
  })

  it('stands for the Nyquist frequency where it does not say its own, and is not moved from there silently', () => {
    const found = judged({ at: null, usedAt: '8 GHz' }, {}, parts)
    expect(found.words).toMatch(/^undecided: its limit cannot be had at 8 GHz/)
    expect(judged({ at: null, usedAt: '8 GHz', curve: '0.05..20 GHz: 1 + f' }, {}, parts).limitDb).toBeCloseTo(10, 9)
  })
})
