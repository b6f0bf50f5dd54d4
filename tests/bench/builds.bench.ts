import { type BuildLine, drawBuilds, responseOf } from '../../lib/budget/builds'
import type { Computed } from '../../lib/budget/models/piece'
import { nextUnit, streamOf } from '../../lib/channel/statistics'
import { clearBuilds } from './clear/builds'
import { type BenchRow, milliseconds } from './measure'

const LINES = 40
const GEOMETRY = 13
const TRIALS = 100_000
const LIMIT = 41

const plain = (n: number): BuildLine => ({
  id: `l${n}`,
  group: `lot ${n}`,
  sign: 1,
  nominalDb: 1,
  minusDb: 0.3,
  plusDb: 0.3,
  meaning: 'limit',
  spreadDb: 0,
  response: null,
  lanes: new Map(),
})

/** A stand-in with the number of parameters of a trace; what a build costs does not hang on what the model costs. */
const FIELDS = ['width', 'gap', 'thickness', 'heightBelow', 'heightAbove', 'etch', 'dk', 'df', 'roughnessTop']
const trace: Computed = {
  values: Object.fromEntries(FIELDS.map((field) => [field, 1])),
  build: (values) => ({
    from: 0,
    to: 1e11,
    reflects: false,
    twoPort: (hz) => new Float64Array(8 * hz.length),
    attenuation: (hz) =>
      hz.map(() => FIELDS.reduce((product, field, n) => product * (values[field] ?? 0) ** (n / 9 - 0.5), 1)),
    uncertainty: 0,
  }),
}

function geometry(n: number): BuildLine {
  const varied = FIELDS.map((field) => ({ field, nominal: 1, tolerance: 0.05, min: 0, max: 2 }))
  const of = responseOf(trace, varied, 1e10, 100)
  return { ...plain(n), group: `lot ${n % 3}`, minusDb: 0, plusDb: 0, response: of && { of, times: 1 } }
}

/** Times random builds against the shortest clear version of one lane, in the same run; says the ratio and judges nothing. */
export async function benchBuilds(): Promise<BenchRow[]> {
  const lines = Array.from({ length: LINES }, (_, n) => plain(n))
  const clear = lines.map(({ group }) => ({ db: 1, sigma: 0.1, group }))
  const stream = streamOf(1, 'clear')
  const shortest = () => clearBuilds(clear, LIMIT, TRIALS, () => nextUnit(stream))
  const draw = (of: readonly BuildLine[], lanes: number) =>
    drawBuilds({ lines: of, lanes, limitDb: LIMIT, trials: TRIALS, seed: 1 })
  const apart = Math.abs((draw(lines, 1).fractionInside?.value ?? Number.NaN) - shortest().inside)
  if (!(apart < 0.01)) throw new Error(`The two ways of drawing differ by ${apart}.`)
  const baseline = milliseconds(7, 1, shortest)
  const own = lines.map((line) => ({ ...line, group: line.id, plusDb: 0.4 }))
  const row = (what: string, work: () => unknown): BenchRow => ({
    what,
    ours: milliseconds(7, 1, work),
    baseline,
    unit: 'ms',
  })
  const size = `${LINES} lines, ${TRIALS} builds`
  return [
    row(`builds, ${size}`, () => draw(lines, 1)),
    row(`builds, ${size} of 16 lanes`, () => draw(lines, 16)),
    row(`builds, ${size} of 16 lanes, each line on its own with unequal sides`, () => draw(own, 16)),
    row(`builds, ${size}, ${GEOMETRY} with varied cross-sections`, () =>
      draw([...Array.from({ length: GEOMETRY }, (_, n) => geometry(n)), ...lines.slice(GEOMETRY)], 1),
    ),
  ]
}
