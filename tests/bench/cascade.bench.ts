import { cascade } from '../../lib/channel/networks'
import { clearCascade } from './clear/cascade'
import { type BenchRow, milliseconds } from './measure'

const TWO_PORTS = 30
const FREQUENCIES = 2000

/** Lossy, slightly mismatched two-ports that differ from each other, of modest numbers so that nothing underflows. */
function chain(): Float64Array[] {
  return Array.from({ length: TWO_PORTS }, (_, n) =>
    Float64Array.from(
      { length: 8 * FREQUENCIES },
      (_, k) => (k % 8 > 1 && k % 8 < 6 ? 0.6 : 0.1) * Math.sin(k + n / 7),
    ),
  )
}

/** Times the cascade against the shortest clear version, in the same run; says the ratio and judges nothing. */
export async function benchCascade(): Promise<BenchRow[]> {
  const twoPorts = chain()
  const clear = clearCascade(twoPorts, FREQUENCIES)
  const agree = cascade(twoPorts, FREQUENCIES).reduce(
    (worst, x, k) => Math.max(worst, Math.abs(x - (clear[k] ?? 0))),
    0,
  )
  if (!(agree < 1e-12)) throw new Error(`The two cascades differ by ${agree}.`)
  return [
    {
      what: `cascade, ${TWO_PORTS} two-ports at ${FREQUENCIES} frequencies`,
      ours: milliseconds(9, 20, () => cascade(twoPorts, FREQUENCIES)),
      baseline: milliseconds(3, 1, () => clearCascade(twoPorts, FREQUENCIES)),
      unit: 'ms',
    },
  ]
}
