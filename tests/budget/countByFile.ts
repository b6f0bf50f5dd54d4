import { evaluate } from '../../lib/budget/evaluate'
import type { EvidenceNetwork, LineEvaluation } from '../../lib/budget/evaluation'
import type { BudgetFile } from '../../lib/budget/schema'
import { network } from '../../lib/channel/networks/network'
import { link } from './links'
import { evidenceOf, fileLine, GRID, type Section, scattering } from './sections'

type Files = Readonly<Record<string, EvidenceNetwork | null>>
type LineFile = NonNullable<BudgetFile['lines']>[string]
type Record_ = NonNullable<BudgetFile['evidence']>[string]

export type Asked = {
  readonly line?: Partial<LineFile>
  readonly record?: Partial<Record_>
  readonly modes?: Record_['modes']
  readonly head?: Partial<BudgetFile['head']>
}

/** One line that counts by the file 'a', at 10 GHz in 100 Ω. */
export function count(files: Files, { line = {}, record = {}, modes = 'mixed-as-two-ports', head = {} }: Asked = {}) {
  const { evidence, read } = evidenceOf(files, modes)
  const records = evidence.a ? { ...evidence, a: { ...evidence.a, ...record } } : evidence
  const lines = { l: fileLine('a1', 'a', line) }
  const budget = link({ head: { ...link({}).head, ...head }, evidence: records, lines })
  const evaluation = evaluate(budget, read)
  const found = evaluation.lines.l as LineEvaluation
  return {
    db: found.loss.nominalDb,
    by: found.loss.by,
    beside: Object.fromEntries(found.loss.beside.map(({ what, db }) => [what, db])),
    flags: evaluation.flags.filter(({ id }) => id === 'l').map(({ code, field }) => `${code} ${field}`),
    allowance: evaluation.allowances[0],
  }
}

export const SECTION: Section = { ohm: 78, delay: 110e-12, db: (hz) => 0.3 * Math.sqrt(hz / 1e9) }

export function networkOf(file: EvidenceNetwork) {
  if (!('network' in file)) throw new Error('no network')
  return file.network
}

/** Four ports of two lines without coupling, single-ended 50 Ω; pairs (1,3)→(2,4), or (1,2)→(3,4). */
export function fourPorts(section: Section, order: readonly [number, number, number, number]): EvidenceNetwork {
  const s = new Float64Array(32 * GRID.length)
  const [p1, q1, p2, q2] = order
  GRID.forEach((hz, k) => {
    const [s11, s12, s21, s22] = scattering([section], hz, 50)
    const put = (row: number, column: number, [re, im]: readonly [number, number]) => {
      s[32 * k + 2 * (4 * row + column)] = re
      s[32 * k + 2 * (4 * row + column) + 1] = im
    }
    for (const [a, b] of [
      [p1, p2],
      [q1, q2],
    ] as const) {
      put(a, a, s11)
      put(a, b, s12)
      put(b, a, s21)
      put(b, b, s22)
    }
  })
  return { network: network(4, GRID, s, 50) }
}
