import { evaluate } from '../../lib/budget/evaluate'
import { forgetLosses } from '../../lib/budget/lossMemory'
import { type Budget, type BudgetFile, budgetSchema } from '../../lib/budget/schema'
import { type BenchRow, milliseconds } from './measure'

const LINES = 40
const LANES = 256

/** A link of 40 lines, every third a trace of a loss class, in five groups; with lanes, each trace has a length per lane. */
function bigLink(lanes: number): Budget {
  const lines: NonNullable<BudgetFile['lines']> = {}
  const laneValues: NonNullable<BudgetFile['laneValues']> = {}
  for (let n = 0; n < LINES; n++) {
    const common = { order: `a${n.toString(36).padStart(2, '0')}`, name: `Piece ${n}`, group: `lot ${n % 5}` }
    const trace = n % 3 === 0
    lines[`l${n}`] = trace
      ? { ...common, kind: 'trace', model: 'class', lossClass: 'c', length: `${1 + n / 10} in`, tolerancePlus: '6 %' }
      : { ...common, kind: 'via', model: 'stated', loss: `0.${10 + n} dB`, at: '26.5625 GHz', tolerancePlus: '0.1 dB' }
    for (let lane = 1; trace && lane <= lanes; lane++)
      laneValues[`l${n}/${lane}/length`] = `${1 + ((n * lane) % 29) / 10} in`
  }
  return budgetSchema.parse({
    head: {
      schemaVersion: 1,
      bitRate: '106.25 Gb/s',
      rateType: 'line',
      code: 'PAM4',
      reference: '100 Ω',
      laneCount: lanes || 1,
    },
    lossClasses: { c: { order: 'a0', lossPerLength: '0.9 dB/in', at: '26.5625 GHz', basis: 'measured' } },
    lines,
    planes: { a: { order: 'Zz', code: 'tx-ball' }, z: { order: 'z0', code: 'rx-ball' } },
    allowances: {
      limit: { order: 'a0', limit: '60 dB', at: '26.5625 GHz', from: 'a', to: 'z', requiredMargin: '1 dB' },
    },
    laneValues,
  } satisfies BudgetFile)
}

/** The shortest clear version: adds what is typed, nominal and grouped, in every lane, and compares with the limit. No checks, no flags. */
function shortest(budget: Budget): { loss: number; rss: number; margin: number } {
  const number = (text: string | null | undefined) => Number.parseFloat(text ?? '')
  const perInch = number(budget.lossClasses.c?.lossPerLength)
  const lines = Object.entries(budget.lines)
  let worst = { loss: Number.NEGATIVE_INFINITY, rss: 0 }
  for (let lane = 1; lane <= (budget.head.laneCount ?? 1); lane++) {
    let loss = 0
    const groups: Record<string, number> = {}
    for (const [id, line] of lines) {
      const length = budget.laneValues[`${id}/${lane}/length`] ?? line.length
      const db = line.model === 'class' ? number(length) * perInch : number(line.loss)
      const plus = number(line.tolerancePlus) * (line.tolerancePlus?.endsWith('%') ? db / 100 : 1)
      loss += db
      groups[line.group ?? id] = (groups[line.group ?? id] ?? 0) + plus
    }
    if (loss > worst.loss) worst = { loss, rss: Math.hypot(...Object.values(groups)) }
  }
  return { ...worst, margin: number(budget.allowances.limit?.limit) - worst.loss }
}

/** Times evaluate() on 40 lines against the shortest clear version, in the same run; says the ratio and judges nothing. */
export async function benchEvaluate(): Promise<BenchRow[]> {
  const plain = bigLink(0)
  const lanes = bigLink(LANES)
  const agree = Math.abs((evaluate(lanes, new Map()).allowances[0]?.lossDb ?? 0) - shortest(lanes).loss)
  if (!(agree < 1e-9)) throw new Error(`The two ways of computing differ by ${agree} dB.`)
  const { l1 } = plain.lines
  if (!l1) throw new Error('The link has no second line.')
  const change = (n: number) => ({
    ...plain,
    lines: { ...plain.lines, l1: { ...l1, loss: `0.${100 + (n % 800)} dB` } },
  })
  const baseline = milliseconds(9, 300, () => shortest(plain))
  const laneBaseline = milliseconds(5, 10, () => shortest(lanes))
  return [
    {
      what: `evaluate, ${LINES} lines, nothing remembered`,
      ours: milliseconds(9, 60, () => {
        forgetLosses()
        evaluate(plain, new Map())
      }),
      baseline,
      unit: 'ms',
    },
    {
      what: `evaluate, ${LINES} lines, one changed`,
      ours: milliseconds(9, 60, (n) => evaluate(change(n), new Map())),
      baseline,
      unit: 'ms',
    },
    {
      what: `evaluate, ${LINES} lines in ${LANES} lanes`,
      ours: milliseconds(5, 4, () => evaluate(lanes, new Map())),
      baseline: laneBaseline,
      unit: 'ms',
    },
  ]
}
