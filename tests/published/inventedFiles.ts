import { lineTwoPort } from '../../lib/channel/lines/lineTwoPort'
import { cascade, network, singleEnded, TWO_PORT } from '../../lib/channel/networks'
import { packagePropagation } from '../../lib/channel/packages/packageLine'
import { shuntCapacitance } from '../../lib/channel/pads'
import { writeTouchstone } from '../../lib/channel/touchstone'

/** A piece of the inventions: a line of a causal attenuation, or a capacitance across it. */
type Part =
  | { readonly ohm: number; readonly ps: number; readonly rootDb: number; readonly linearDb: number }
  | { readonly femtofarad: number }

/** Np in a decibel. */
const NEPER = Math.LN10 / 20

/**
 * Parts in a row. A line's losses are given at `ghz`: what grows with √f and what grows with f; the phase belongs to them, so that
 * nothing arrives before it was sent.
 * @returns S11, S12, S21, S22 in the reference, 8 numbers a frequency
 */
function row(parts: readonly Part[], ghz: number, hz: Float64Array, reference: number): Float64Array {
  const chain = parts.map((part) => {
    if ('femtofarad' in part) return shuntCapacitance(part.femtofarad * 1e-15, hz, reference)
    const { ohm, ps, rootDb, linearDb } = part
    const a1 = (rootDb * NEPER) / Math.sqrt(ghz * 1e9)
    const a2 = (linearDb * NEPER) / (ghz * 1e9)
    return lineTwoPort(packagePropagation({ gamma0: 0, a1, a2, tau: ps * 1e-12 }, ohm, hz), 1, reference)
  })
  return cascade(chain, hz.length)
}

/** 10 MHz, then `count` equal steps. */
const grid = (count: number, step: number) =>
  Float64Array.from({ length: count + 1 }, (_, k) => (k === 0 ? 1e7 : k * step))

/** Six digits, as an instrument writes; more would be of no use and twice the size. */
const rounded = (s: Float64Array) => s.map((part) => Math.round(part * 1e5) / 1e5)

const comments = (...lines: string[]) => ['Invented for the demonstration: no such part exists.', ...lines]

/** Larch's mezzanine connector: a mated pair, pads on both boards, ports 1,3 > 2,4. */
function mezzanineConnector(): string {
  const hz = grid(200, 0.15e9)
  const differential = row(
    [
      { femtofarad: 45 },
      { ohm: 92, ps: 18, rootDb: 0.1, linearDb: 0.08 },
      { ohm: 104, ps: 34, rootDb: 0.22, linearDb: 0.2 },
      { ohm: 92, ps: 18, rootDb: 0.1, linearDb: 0.08 },
      { femtofarad: 45 },
    ],
    13.28125,
    hz,
    100,
  )
  // Both conductors together see a looser line to ground, which is a little faster.
  const common = row([{ ohm: 31, ps: 66, rootDb: 0.5, linearDb: 0.4 }], 13.28125, hz, 25)
  const s = new Float64Array(32 * hz.length)
  for (let k = 0; k < hz.length; k++)
    for (const [of, first] of [
      [differential, 0],
      [common, 2],
    ] as const)
      for (let element = 0; element < TWO_PORT; element++) {
        const [into, from, part] = [first + (element >> 2), first + ((element >> 1) & 1), element & 1]
        s[2 * (16 * k + 4 * into + from) + part] = of[TWO_PORT * k + element] ?? Number.NaN
      }
  const modes = { ports: 4, hz, s, reference: Float64Array.of(100, 0, 100, 0, 25, 0, 25, 0) }
  const pairs = singleEnded(modes, [
    [0, 2],
    [1, 3],
  ])
  const lines = comments(
    'Mezzanine connector, mated pair with the pads of both boards.',
    'Ports 1 and 3: main board, + and -. Ports 2 and 4: mezzanine board.',
    'Fixtures removed by their thru (2x-thru).',
  )
  return writeTouchstone({ ...pairs, s: rounded(pairs.s) }, { version: '1', format: 'RI', comments: lines })
}

/** Larch's line on the mezzanine board: 55 mm of a stripline of 95 Ω. */
function mezzanineLine(): string {
  const hz = grid(600, 0.05e9)
  const s = row(
    [{ femtofarad: 10 }, { ohm: 95, ps: 358, rootDb: 1.05, linearDb: 0.8 }, { femtofarad: 10 }],
    13.28125,
    hz,
    100,
  )
  const lines = comments(
    'Differential pair on the mezzanine board, 55 mm of stripline, saved as two ports.',
    'Fixtures removed by their thru (2x-thru).',
  )
  return writeTouchstone(network(2, hz, rounded(s), 100), { version: '1', format: 'RI', comments: lines })
}

/** Sedge's cable assembly with both test fixtures: what must not stand in place of the cable. */
function cableInFixtures(): string {
  const hz = grid(640, 0.0125e9)
  const fixture: Part = { ohm: 103, ps: 1010, rootDb: 2.05, linearDb: 1.395 }
  const connector: Part = { ohm: 95, ps: 60, rootDb: 0.35, linearDb: 0.25 }
  const termination: Part = { ohm: 104, ps: 70, rootDb: 0.2, linearDb: 0.15 }
  const bulk: Part = { ohm: 100, ps: 13_050, rootDb: 5.2, linearDb: 1.85 }
  const s = row([fixture, connector, termination, bulk, termination, connector, fixture], 5.15625, hz, 100)
  const lines = comments(
    'Cable assembly of 3 m, differential pair saved as two ports.',
    'Both test fixtures are still in.',
  )
  return writeTouchstone(network(2, hz, rounded(s), 100), { version: '1', format: 'RI', comments: lines })
}

/** The Touchstone files of seed-scenarios, by name. */
export const INVENTED_FILES: Readonly<Record<string, () => string>> = {
  'larch-connector.s4p': mezzanineConnector,
  'larch-mezzanine-line.s2p': mezzanineLine,
  'sedge-cable-in-fixtures.s2p': cableInFixtures,
}
