import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import type { AllowanceEvaluation, EvidenceData } from '../../lib/budget/evaluation'
import { readNetwork } from '../../lib/budget/evidence/readNetwork'
import { type BudgetFile, budgetSchema } from '../../lib/budget/schema'
import { plain, scenario, withAllowance, withLine } from './byHand'

const folder = new URL('../../seed-scenarios/', import.meta.url)
const file = scenario('larch')
const evidence: EvidenceData = new Map(
  Object.values(file.evidence ?? {}).map(({ sha256, name }) => [
    sha256 ?? '',
    readNetwork(readFileSync(new URL(name ?? '', folder)), name ?? ''),
  ]),
)
const evaluated = (budget: BudgetFile) => evaluate(budgetSchema.parse(budget), evidence, { sweep: true, builds: 0 })
const evaluation = evaluated(file)

function allowance(id: string, among = evaluation.allowances): AllowanceEvaluation {
  const found = among.find((one) => one.id === id)
  if (!found) throw new Error(`No allowance ${id}.`)
  return found
}
const counted = (id: string) => {
  const found = allowance('bump-to-bump').lines.find((line) => line.id === id)?.countedDb
  if (found === undefined || found === null) throw new Error(`${id} has no number.`)
  return found
}

const NYQUIST = 13.28125
const DB_PER_NEPER = 20 / Math.LN10

describe('Larch: 53.125 Gb/s PAM4 over a mezzanine, every line computed or measured (invented example)', () => {
  it('the packages lose Re(γ)·length of IEEE 802.3 Annex 93A (form and parameters from memory)', () => {
    expect(evaluation.signalling.nyquist).toBe(NYQUIST * 1e9)
    const perMm = DB_PER_NEPER * (0.001734 * Math.sqrt(NYQUIST) + 0.0001455 * NYQUIST)
    expect(counted('tx-package')).toBeCloseTo(20 * perMm, 9)
    expect(counted('rx-package')).toBeCloseTo(16 * perMm, 9)
  })

  it('the trace loses its dielectric exactly (Pozar: 27.3·√εr·tan δ/λ0 dB) and between one and two strips of smooth copper', () => {
    const perMetre = counted('main-trace') / (11.5 * 0.0254) / 1.05
    const wavelength = 299_792_458 / (NYQUIST * 1e9)
    // Dk and Df of the stack-up, both prepreg and core, moved from 10 GHz by less than a hundredth.
    const dielectric = (Math.PI * DB_PER_NEPER * Math.sqrt(3.4) * 0.004) / wavelength
    const sheet = Math.sqrt((Math.PI * NYQUIST * 1e9 * 4e-7 * Math.PI) / 5.8e7)
    // One strip of the pair, current on both of its faces, in half of 100 Ω; the planes and the roughness come on top.
    const strip = (DB_PER_NEPER * sheet) / (2 * 109e-6) / (2 * 50)
    expect(perMetre - dielectric).toBeGreaterThan(strip)
    expect(perMetre - dielectric).toBeLessThan(2.5 * strip)
  })

  it('the connector loses what its file says between the two points around the frequency, read by hand', () => {
    const rows = pointsOf('larch-connector.s4p', 32)
    const after = rows.findIndex(([hz = 0]) => hz > NYQUIST * 1e9)
    const around = [rows[after - 1], rows[after]].map((row = []) => {
      const s = (i: number, j: number) => [
        row[1 + 2 * (4 * i + j)] ?? Number.NaN,
        row[2 + 2 * (4 * i + j)] ?? Number.NaN,
      ]
      // Sdd21 of the pairs 1,3 and 2,4: (S21 − S23 − S41 + S43)/2 (Bockelman and Eisenstadt 1995).
      const [re, im] = [0, 1].map(
        (part) => ((s(1, 0)[part] ?? 0) - (s(1, 2)[part] ?? 0) - (s(3, 0)[part] ?? 0) + (s(3, 2)[part] ?? 0)) / 2,
      )
      return -20 * Math.log10(Math.hypot(re ?? 0, im ?? 0))
    })
    expect(counted('connector')).toBeGreaterThan(Math.min(...around) - 1e-3)
    expect(counted('connector')).toBeLessThan(Math.max(...around) + 1e-3)
  })

  it('all lines are in the cascade, with reflections: curve and return loss are judged, and the ripple is seen', () => {
    for (const id of ['bump-to-bump', 'ball-to-ball']) {
      const { channel, lossDb, lines } = allowance(id)
      expect(lossDb).toBeCloseTo(plain(...lines.map(({ countedDb }) => countedDb ?? Number.NaN)), 9)
      expect(channel).toMatchObject({ withoutBand: [], withoutReflection: [] })
      expect(channel?.reflectingDb).toBeCloseTo(lossDb ?? Number.NaN, 9)
      expect(channel?.deviation?.rmsDb).toBeGreaterThan(0.1)
    }
    expect(allowance('bump-to-bump').channel).toMatchObject({ curve: { whole: true, missed: null } })
    expect(allowance('bump-to-bump').channel?.returnLoss?.worstDb).toBeGreaterThan(5)
  })

  it('inside by more than the 2 dB required, in words without an unknown; the curve is the limit at Nyquist', () => {
    expect(0.6 + 2.2 * Math.sqrt(NYQUIST) + 0.857 * NYQUIST).toBeCloseTo(20, 2)
    expect(evaluation.verdict).toBe('inside')
    for (const { words, marginDb } of evaluation.allowances) {
      expect(words).toBe('inside')
      expect(marginDb).toBeGreaterThan(2)
    }
    expect(allowance('bump-to-bump').judged).toMatchObject({ lane: 8, lanes: 8 })
  })

  it('at a floor of 10 dB the return loss is missed, and under a curve 3 dB lower the loss (no source)', () => {
    const strict = evaluated(withAllowance(file, 'bump-to-bump', { returnLossFloor: '10 dB' }))
    expect(allowance('bump-to-bump', strict.allowances).words).toMatch(
      /^tight: return loss 8\.\d+ dB at .* where 10\.00 dB/,
    )
    const curve = '0.05..20 GHz: 0.1 + 1.5 sqrt(f) + 0.7 f'
    const low = evaluated(withAllowance(file, 'bump-to-bump', { curve }))
    expect(allowance('bump-to-bump', low.allowances).words).toMatch(/^tight: limit curve missed by /)
  })

  it('hot: the measured line grows by 60 K of 0.12 %/K, the computed one by its copper and dielectric, the rest stays', () => {
    const hot = allowance(
      'bump-to-bump',
      evaluated(withAllowance(file, 'bump-to-bump', { judgedCorner: 'hot' })).allowances,
    )
    const growth = (id: string) => (hot.lines.find((line) => line.id === id)?.countedDb ?? Number.NaN) / counted(id) - 1
    expect(growth('mezzanine-line')).toBeCloseTo(60 * 0.0012, 9)
    // √ of copper's 0.393 %/K at most (IEC 60028), dielectric 60 K of 0.2 %/K.
    expect(growth('main-trace')).toBeGreaterThan(0.05)
    expect(growth('main-trace')).toBeLessThan(0.12)
    expect(growth('connector')).toBe(0)
    expect(hot.verdict).toBe('inside')
  })

  it('raises no flag', () => {
    expect(evaluation.flags).toEqual([])
  })

  it('a port map that joins the ends wrongly is caught by the file itself (practice: the low-frequency test for pairs)', () => {
    const wrong = evaluated(withLine(file, 'connector', { portMap: '1,2>3,4' }))
    expect(wrong.flags).toContainEqual(expect.objectContaining({ code: 'port-pairs-doubtful', id: 'connector' }))
  })
})

describe("Sedge's cable assembly with its fixtures in (invented file)", () => {
  it('loses 15.9 dB at 5.15625 GHz in the file, as its line says', () => {
    const [at] = pointsOf('sedge-cable-in-fixtures.s2p', 8).filter(([hz]) => hz === 5.1625e9)
    // A version 1 file of two ports has S11, S21, S12, S22 in a row (Touchstone 1.1).
    const [, , , re = 0, im = 0] = at ?? []
    expect(-20 * Math.log10(Math.hypot(re, im))).toBeCloseTo(15.9, 1)
  })

  it('counted by its file in place of the five lines it says by itself that fixtures are in', () => {
    const sedge = scenario('sedge')
    const name = 'sedge-cable-in-fixtures.s2p'
    let wrong = withLine(sedge, 'cable-in-fixtures', {
      removed: false,
      model: 'network',
      taken: 'discrete',
      length: '3 m',
    })
    for (const id of ['connector-near', 'termination-near', 'bulk', 'termination-far', 'connector-far'])
      wrong = withLine(wrong, id, { removed: true })
    const sha256 = sedge.evidence?.['cable-in-fixtures']?.sha256 ?? ''
    const found = evaluate(
      budgetSchema.parse(wrong),
      new Map([[sha256, readNetwork(readFileSync(new URL(name, folder)), name)]]),
    )
    expect(found.lines['cable-in-fixtures']?.loss.nominalDb).toBeCloseTo(15.9, 1)
    expect(found.allowances[0]?.lossDb).toBeCloseTo(23.27, 1)
    expect(found.verdict).toBe('tight')
    const codes = found.flags.filter(({ id }) => id === 'cable-in-fixtures').map(({ code }) => code)
    expect(codes).toEqual(['fixtures-in', 'delay-longer-than-length'])
  })
})

/** Frequency and numbers of each point of a Touchstone file in Hz and RI, by no reader of ours. */
function pointsOf(name: string, each: number): number[][] {
  const lines = readFileSync(new URL(name, folder), 'utf8')
    .split('\n')
    .filter((line) => !/^[!#]/.test(line))
  const numbers = lines.join(' ').trim().split(/\s+/).map(Number)
  return Array.from({ length: numbers.length / (each + 1) }, (_, k) =>
    numbers.slice(k * (each + 1), (k + 1) * (each + 1)),
  )
}
