import { forgetSamples } from '../../lib/budget/cascade/samples'
import { evaluate } from '../../lib/budget/evaluate'
import { forgetLosses } from '../../lib/budget/lossMemory'
import { type Budget, type BudgetFile, budgetSchema } from '../../lib/budget/schema'
import { type ClearPiece, clearSweep } from './clear/sweep'
import { type BenchRow, milliseconds } from './measure'

const LINES = 40
const SWEEP = { sweep: true, builds: 0 }

const isPad = (n: number) => n % 4 === 3
const inches = (n: number) => 0.2 + n / 50
const ohms = (n: number) => 85 + (n % 7) * 4
const femtofarads = (n: number) => 10 + (n % 5)

/** Thirty pieces of line of different impedance, a pad after every third. */
function reflecting(): Budget {
  const lines: NonNullable<BudgetFile['lines']> = {}
  for (let n = 0; n < LINES; n++) {
    const common = { order: `a${n.toString(36).padStart(2, '0')}`, name: `Piece ${n}`, basis: 'simulated' } as const
    lines[`l${n}`] = isPad(n)
      ? { ...common, kind: 'component', model: 'pad', capacitance: `${femtofarads(n)} fF` }
      : {
          ...common,
          kind: 'trace',
          model: 'per-length',
          length: `${inches(n)} in`,
          rootTerm: '6 dB/m',
          linearTerm: '1 dB/m',
          validFrom: '1 MHz',
          validTo: '100 GHz',
          impedance: `${ohms(n)} Ω`,
          delay: '170 ps/in',
        }
  }
  return budgetSchema.parse({
    head: {
      schemaVersion: 1,
      bitRate: '53.125 Gb/s',
      rateType: 'line',
      code: 'PAM4',
      reference: '100 Ω',
      laneCount: 1,
    },
    lines,
    planes: { a: { order: 'Zz', code: 'tx-ball' }, z: { order: 'z0', code: 'rx-ball' } },
    allowances: { limit: { order: 'a0', limit: '30 dB', at: '13.28125 GHz', from: 'a', to: 'z' } },
  } satisfies BudgetFile)
}

const clear: readonly ClearPiece[] = Array.from({ length: LINES }, (_, n) =>
  isPad(n)
    ? { farad: femtofarads(n) * 1e-15 }
    : { root: 6, linear: 1, delay: 170e-12 / 0.0254, z: ohms(n), length: inches(n) * 0.0254 },
)

/** Times a whole sweep of a reflecting channel against the shortest clear version, in the same run. */
export async function benchSweep(): Promise<BenchRow[]> {
  const budget = reflecting()
  const channel = evaluate(budget, new Map(), SWEEP).allowances[0]?.channel
  if (!channel || channel.withoutBand.length > 0) throw new Error('The channel is not joined.')
  const { hz, lossDb } = channel.trace
  const plain = clearSweep(clear, hz, 100)
  const apart = Math.max(...plain.map((db, k) => Math.abs(db - (lossDb[k] ?? Number.NaN))))
  if (!(apart < 1e-12)) throw new Error(`The two sweeps differ by ${apart} dB.`)
  const { l0 } = budget.lines
  if (!l0) throw new Error('The link has no first line.')
  const change = (n: number) => ({
    ...budget,
    lines: { ...budget.lines, l0: { ...l0, length: `${(1 + (n % 900) / 1000).toFixed(3)} in` } },
  })
  const baseline = milliseconds(3, 1, () => clearSweep(clear, hz, 100))
  const size = `${LINES} lines at ${hz.length} frequencies`
  return [
    {
      what: `evaluate with its sweep, ${size}, nothing remembered`,
      ours: milliseconds(9, 3, () => {
        forgetLosses()
        forgetSamples()
        evaluate(budget, new Map(), SWEEP)
      }),
      baseline,
      unit: 'ms',
    },
    {
      what: `evaluate with its sweep, ${size}, one line changed`,
      ours: milliseconds(9, 5, (n) => evaluate(change(n), new Map(), SWEEP)),
      baseline,
      unit: 'ms',
    },
  ]
}
