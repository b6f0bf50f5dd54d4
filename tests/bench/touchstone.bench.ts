import { readTouchstone } from '../../lib/channel/touchstone'
import { readClearly } from './clear/touchstone'
import { type BenchRow, milliseconds } from './measure'

const POINTS = 10_000
const PORTS = 4

/** 5 MB: a point a line for each row of its matrix, 12 digits a number, seeded. */
function fourPort(): string {
  let state = 7
  const part = () => {
    state = (Math.imul(state, 1664525) + 1013904223) | 0
    return (state / 2 ** 31).toPrecision(12)
  }
  const row = () => Array.from({ length: 2 * PORTS }, part).join(' ')
  const point = (k: number) => `${(k + 1) / 1000} ${Array.from({ length: PORTS }, row).join('\n')}`
  return `# GHz S RI R 50\n${Array.from({ length: POINTS }, (_, k) => point(k)).join('\n')}\n`
}

/** Times reading a file of 4 ports and 10,000 points against the clear reader, once both have read the same bits. */
export async function benchTouchstone(): Promise<BenchRow[]> {
  const text = fourPort()
  const bytes = new TextEncoder().encode(text)
  const file = readTouchstone(bytes, 'bench.s4p')
  if ('message' in file) throw new Error(file.message)
  const clear = readClearly(text, PORTS).points.flatMap((point) => point.s.flat().flatMap(({ re, im }) => [re, im]))
  if (!clear.every((part, k) => Object.is(part, file.network.s[k]))) throw new Error('The two readers differ.')
  return [
    {
      what: `Touchstone, ${PORTS} ports, ${POINTS} points (${(bytes.length / 1e6).toFixed(1)} MB)`,
      ours: milliseconds(15, 1, () => readTouchstone(bytes, 'bench.s4p')),
      baseline: milliseconds(5, 1, () => readClearly(text, PORTS)),
      unit: 'ms',
    },
  ]
}
