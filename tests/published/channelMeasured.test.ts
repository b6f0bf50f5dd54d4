import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import type { EvidenceNetwork } from '../../lib/budget/evaluation'
import { type BudgetFile, budgetSchema } from '../../lib/budget/schema'
import { MSL } from './figures/msl'
import { isThere, measuredFile, WHEN_THERE } from './measuredFile'

type LineFile = NonNullable<BudgetFile['lines']>[string]

/** One line at 5 GHz (10 Gb/s NRZ) that counts by measured files, through evaluate(). */
function count(
  files: Readonly<Record<string, string>>,
  line: Partial<LineFile>,
  modes: 'single-ended',
  reference = 100,
) {
  const sha256 = (id: string) => id.repeat(64).slice(0, 64)
  const read = new Map<string, EvidenceNetwork>(
    Object.entries(files).map(([id, name]) => [sha256(id), { network: measuredFile(name) }]),
  )
  const evidence = Object.fromEntries(
    Object.entries(files).map(([id, name]) => [id, { order: 'a0', name, sha256: sha256(id), modes }]),
  )
  const budget = budgetSchema.parse({
    head: { schemaVersion: 1, bitRate: '10 Gb/s', rateType: 'line', code: 'NRZ', reference: `${reference} Ω` },
    evidence,
    lines: { l: { order: 'a1', kind: 'trace', model: 'network', basis: 'measured', evidence: 'a', ...line } },
  } satisfies BudgetFile)
  const evaluation = evaluate(budget, read)
  const found = evaluation.lines.l
  if (!found) throw new Error('no line')
  return { ...found.loss, codes: evaluation.flags.filter(({ id }) => id === 'l').map(({ code }) => code) }
}

describe.skipIf(!isThere('MSL100.s2p', 'MSL200.s2p'))(`a measured microstrip of two lengths (${WHEN_THERE})`, () => {
  it('per length: the loss of 250 mm at 5 GHz is that of the table made in numpy, within 2 %', () => {
    const line = { taken: 'per-length', length: '250 mm', shortEvidence: 'b', lengthDifference: '100 mm' } as const
    const found = count({ a: 'MSL200.s2p', b: 'MSL100.s2p' }, line, 'single-ended')
    const table = MSL.find(({ hz }) => Math.abs(hz - 5e9) < 1)
    if (!table) throw new Error('the table has no 5 GHz')
    expect(Math.abs((found.nominalDb ?? 0) / (table.dbPerMetre * 0.25) - 1)).toBeLessThan(0.02)
    expect(found.codes).toContain('single-ended-taken-as-differential')
  })

  it('as a discrete counts what the file says, −20 log10|S21| at 5 GHz, with connectors and ripple', () => {
    const network = measuredFile('MSL200.s2p')
    const at = network.hz.findIndex((hz) => Math.abs(hz - 5e9) < 1)
    const [re, im] = [network.s[8 * at + 4], network.s[8 * at + 5]] as [number, number]
    const found = count({ a: 'MSL200.s2p' }, { taken: 'discrete' }, 'single-ended')
    expect(found.nominalDb).toBeCloseTo(-20 * Math.log10(Math.hypot(re, im)), 9)
    expect(found.by).toBe('measured')
  })
})

describe.skipIf(!isThere('diff_dut.s4p', 'diff_fdf.s4p', 'diff_2xthru.s4p'))(
  `simulated differential fixtures around a device that is known (${WHEN_THERE})`,
  () => {
    const device = () => count({ a: 'diff_dut.s4p' }, { taken: 'discrete' }, 'single-ended')

    it('taken out by their thru leave the device: within 0.1 dB at 5 GHz', () => {
      const files = { a: 'diff_fdf.s4p', b: 'diff_2xthru.s4p' }
      const without = count(files, { taken: 'discrete', fixture: 'b' }, 'single-ended')
      const within = count(files, { taken: 'discrete' }, 'single-ended')
      expect(Math.abs((without.nominalDb ?? 0) - (device().nominalDb ?? 0))).toBeLessThan(0.1)
      expect(Math.abs((within.nominalDb ?? 0) - (device().nominalDb ?? 0))).toBeGreaterThan(0.5)
    })

    it('the device counts (S31 − S32 − S41 + S42)/2 of its four ports, by the ports typed or guessed', () => {
      const network = measuredFile('diff_dut.s4p')
      const at = network.hz.findIndex((hz) => Math.abs(hz - 5e9) < 1)
      const part = (row: number, column: number, im: 0 | 1) => network.s[2 * (16 * at + 4 * row + column) + im] ?? 0
      const sdd21 = ([0, 1] as const).map(
        (im) => (part(2, 0, im) - part(2, 1, im) - part(3, 0, im) + part(3, 1, im)) / 2,
      )
      const byHand = -20 * Math.log10(Math.hypot(...sdd21))
      const typed = count({ a: 'diff_dut.s4p' }, { taken: 'discrete', portMap: '1,2>3,4' }, 'single-ended')
      expect(typed.nominalDb).toBeCloseTo(byHand, 9)
      expect(device().nominalDb).toBeCloseTo(byHand, 9)
    })
  },
)
