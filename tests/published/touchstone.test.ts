import { readdirSync, readFileSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { describe, expect, it } from 'vitest'
import { readTouchstone, type TouchstoneFile, writeTouchstone } from '../../lib/channel/touchstone'
import { readClearly } from '../bench/clear/touchstone'
import { isThere, WHEN_THERE } from './measuredFile'
import { oracle } from './networksOracle'

type Expected = {
  note: string
  ports: number
  reference_ohm: number[]
  f_hz: number[]
  s: { re: number[][][]; im: number[][][] }
  noise: number[][] | null
}
const folder = resolve(import.meta.dirname, 'oracles/touchstone')
/** Computed with numpy; its S agree with a general RF library where that reads the file (reference/numerics.md). */
const expectedOf = oracle<{ synthetic: Record<string, Expected> }>('touchstone/expected').synthetic
const files = readdirSync(folder).filter((name) => /p$/.test(name))

function read(name: string, text: string | Uint8Array): TouchstoneFile {
  const file = readTouchstone(typeof text === 'string' ? new TextEncoder().encode(text) : text, name)
  if ('message' in file) throw new Error(`${name}, line ${file.line}: ${file.message}`)
  return file
}
const oracleFile = (name: string) => read(name, readFileSync(join(folder, name)))

/** [frequency][row][column] as one array, real and imaginary part side by side, without the rows in `left`. */
function flat({ s, ports }: Expected, left: readonly number[]): number[] {
  return s.re.flatMap((matrix, point) =>
    left.includes(point)
      ? []
      : Array.from({ length: ports * ports }, (_, k) => [Math.floor(k / ports), k % ports] as const).flatMap(
          ([row, column]) => [matrix[row]?.[column] ?? Number.NaN, s.im[point]?.[row]?.[column] ?? Number.NaN],
        ),
  )
}

function worst(a: ArrayLike<number>, b: ArrayLike<number>): number {
  expect(a.length).toBe(b.length)
  return Array.from(a).reduce((most, value, k) => Math.max(most, Math.abs(value - (b[k] ?? Number.NaN))), 0)
}

describe('files of every kind, against values computed with numpy', () => {
  it('are all there', () => {
    expect(files.toSorted()).toEqual(Object.keys(expectedOf).toSorted())
  })

  it.each(files)('%s', (name) => {
    const expected = expectedOf[name]
    if (!expected) throw new Error(`No expected values of ${name}.`)
    const { network, parameter, format, noise, unit } = oracleFile(name)
    const left = name === 'repeated_frequency.s1p' ? [2] : []
    expect(network.ports).toBe(expected.ports)
    expect([...network.reference]).toEqual(expected.reference_ohm.flatMap((ohm) => [ohm, 0]))
    expect([...network.hz]).toEqual(expected.f_hz.filter((_, point) => !left.includes(point)))
    const exact = format === 'RI' && parameter === 'S'
    expect(worst(network.s, flat(expected, left))).toBeLessThanOrEqual(exact ? 0 : 1e-13)
    if (!expected.noise) return expect(noise).toBeNull()
    expect(unit).toBe('GHz')
    const ohm = name.startsWith('v2') ? 1 : expected.reference_ohm[0]
    const rows = expected.noise.flatMap(([ghz, ...others]) => [
      Number(`${ghz}e9`),
      ...others.slice(0, 3),
      (others[3] ?? Number.NaN) * (ohm ?? Number.NaN),
    ])
    return expect([...(noise ?? [])]).toEqual(rows)
  })

  it('the row of a frequency that stands there twice is left out and warned of with its line', () => {
    expect(oracleFile('repeated_frequency.s1p').warnings).toEqual([
      { line: 4, message: '2 GHz stands here again, with other values; the first of the rows counts.' },
    ])
  })

  it('comments are read as UTF-8 or latin-1', () => {
    expect(oracleFile('comment_latin1.s2p').comments).toContain('Messgerät 50 µ')
  })
})

/** Examples of the Touchstone File Format Specification, versions 2.0 and 2.1, numbered as in 2.1. */
describe('examples of the standard', () => {
  const impedances = `100 A -4\n200 B -22\n300 C -45\n400 D -62\n500 E -89\n`
  const withZ = (values: readonly string[]) =>
    values.reduce((text, z, k) => text.replace('ABCDE'.charAt(k), z), impedances)
  const normalised = `# MHz Z MA R 75\n!freq magZ11 angZ11\n${withZ(['0.99', '0.80', '0.707', '0.40', '0.01'])}`
  const inOhms = `[Version] 2.0\n# MHz Z MA\n[Number of Ports] 1\n[Number of Frequencies] 5\n[Reference] 20.0\n[Network Data]\n${withZ(['74.25', '60', '53.025', '30', '0.75'])}[End]\n`
  const zOf = ({ network }: TouchstoneFile) =>
    Array.from(network.hz, (_, point) => {
      const ohm = network.reference[0] ?? Number.NaN
      const re = network.s[2 * point] ?? Number.NaN
      const im = network.s[2 * point + 1] ?? Number.NaN
      const square = (1 - re) ** 2 + im ** 2
      return [(ohm * (1 - re * re - im * im)) / square, (ohm * 2 * im) / square]
    }).flat()

  it('9 and 10: one impedance, normalised to 75 Ω in version 1 and in Ω with 20 Ω in version 2', () => {
    const one = read('nine.s1p', normalised)
    const other = read('ten.ts', inOhms)
    expect([one.network.reference[0], other.network.reference[0]]).toEqual([75, 20])
    const z = [74.25, 60, 53.025, 30, 0.75].flatMap((ohm, k) => {
      const angle = ([-4, -22, -45, -62, -89][k] ?? Number.NaN) * (Math.PI / 180)
      return [ohm * Math.cos(angle), ohm * Math.sin(angle)]
    })
    expect(worst(zOf(one), z)).toBeLessThan(1e-11)
    expect(worst(zOf(other), z)).toBeLessThan(1e-11)
  })

  it('11 and 12: hybrid parameters of version 1 and 2 with 1 Ω are the same network, that of the defining equations', () => {
    const row = '2 .95 -26 3.57 157 .04 76 .66 -14\n'
    const one = read('eleven.s2p', `# kHz H MA R 1\n${row}`)
    const two = read(
      'twelve.ts',
      `[Version] 2.0\n# kHz H MA R 1\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 1\n[Matrix Format] Full\n[Network Data]\n${row}[End]`,
    )
    expect([...two.network.s]).toEqual([...one.network.s])
    expect(one.network.hz[0]).toBe(2000)
    const h = [0, 1, 2, 3].map((k) => polar([0.95, 3.57, 0.04, 0.66][k] ?? 0, [-26, 157, 76, -14][k] ?? 0))
    const [h11, h21, h12, h22] = h as [C, C, C, C]
    expect(worst(one.network.s, hybridToS(h11, h12, h21, h22))).toBeLessThan(1e-14)
  })

  it('17 and 18: Rn is in Ω in version 2 and divided by R in version 1', () => {
    const data = '2 .95 -26 3.57 157 .04 76 .66 -14\n22 .60 -144 1.30 40 .14 40 .56 -85\n'
    const two = read(
      'seventeen.ts',
      `[Version] 2.0\n#\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 2\n[Number of Noise Frequencies] 2\n[Reference] 50 25.0\n[Network Data]\n${data}[Noise Data]\n4 .7 .64 69 19\n18 2.7 .46 -33 20\n[End]\n`,
    )
    const one = read(
      'eighteen.s2p',
      `#\n! NETWORK PARAMETERS\n${data}! NOISE PARAMETERS\n4 .7 .64 69 .38\n18 2.7 .46 -33 .40\n`,
    )
    expect([...(two.noise ?? [])]).toEqual([4e9, 0.7, 0.64, 69, 19, 18e9, 2.7, 0.46, -33, 20])
    expect([...(one.noise ?? [])]).toEqual([...(two.noise ?? [])])
    expect([...one.network.s]).toEqual([...two.network.s])
    expect([...two.network.reference]).toEqual([50, 0, 25, 0])
  })

  const rows = [
    '0.60 161.24',
    '0.40 -42.20 0.60 161.20',
    '0.42 -66.58 0.53 -79.34 0.60 161.24',
    '0.53 -79.34 0.42 -66.58 0.40 -42.20 0.60 161.24',
  ]
  const four = `5.00000 0.60 161.24 0.40 -42.20 0.42 -66.58 0.53 -79.34 !row 1
0.40 -42.20 0.60 161.20 0.53 -79.34 0.42 -66.58 !row 2
0.42 -66.58 0.53 -79.34 0.60 161.24 0.40 -42.20 !row 3
${rows[3]} !row 4`

  it('5 (versions 1.1 and 2.1) and 6: references of each port on the option line and over two lines, a lower triangle', () => {
    const perPort = read('five.s4p', `# GHz S MA R 0.01 0.01 50.0 50.0\n${four}`)
    expect(perPort.version).toBe('1.1')
    expect([...perPort.network.reference]).toEqual([0.01, 0, 0.01, 0, 50, 0, 50, 0])
    const lower = read(
      'six.ts',
      `[Version] 2.0\n# GHz S MA R 50\n[Number of Ports] 4\n[Number of Frequencies] 1\n[Reference] 50 75\n0.01 0.01\n[Matrix Format] Lower\n[Network Data]\n5.00000 ${rows.join('\n')}\n[End]`,
    )
    expect([...lower.network.reference]).toEqual([50, 0, 75, 0, 0.01, 0, 0.01, 0])
    expect([...lower.network.s]).toEqual([...perPort.network.s])
  })

  it('14: the four-port at 5 GHz has the mixed-mode values worked from it by hand (pairs 1, 3 → 2, 4)', () => {
    const { s } = read('fourteen.s4p', `# GHz S MA R 50\n${four}`).network
    const at = (row: number, column: number): C => [s[2 * (4 * row + column)] ?? 0, s[2 * (4 * row + column) + 1] ?? 0]
    const mode = (p: number, n: number, q: number, m: number, sign: 1 | -1): [number, number] => {
      const parts = [at(p, q), at(p, m), at(n, q), at(n, m)]
      const sum = (k: 0 | 1) =>
        parts.reduce((total, part, i) => total + (i === 1 || i === 2 ? sign : 1) * part[k], 0) / 2
      return [Math.hypot(sum(0), sum(1)), (Math.atan2(sum(1), sum(0)) * 180) / Math.PI]
    }
    const close = ([size, angle]: [number, number], expected: [number, number]) => {
      expect(size).toBeCloseTo(expected[0], 4)
      expect(angle).toBeCloseTo(expected[1], 2)
    }
    close(mode(0, 2, 0, 2, -1), [0.93532, 141.804])
    close(mode(1, 3, 0, 2, -1), [0.32079, 51.821])
    close(mode(1, 3, 0, 2, 1), [0.88255, -63.459])
  })

  it('16: mixed-mode admittances keep their order; references are doubled and halved (from memory: by how much)', () => {
    const file = read(
      'sixteen.ts',
      `[Version] 2.0
# MHz Y RI R 50
[Number of Ports] 6
[Number of Frequencies] 1
[Reference] 50 75 75 50 0.01 0.01
[Mixed-Mode Order] D2,3 D6,5 C2,3 C6,5 S4 S1
[Network Data]
5.00 8.0 9.0 2.0 -1.0 3.0 -2.0 1.0 3.0 1.0 0.1 0.2 -0.2
2.0 -1.0 7.0 7.0 1.8 -2.0 -1.0 -1.0 -0.5 0.5 0.2 -0.1
3.0 -2.0 1.8 -2.0 5.8 6.0 1.2 0.8 0.9 0.7 0.3 -0.5
1.0 3.0 -1.0 -1.0 1.2 0.8 6.3 8.0 2.0 -0.5 1.5 0.6
1.0 0.1 -0.5 0.5 0.9 0.7 2.0 -0.5 4.7 -6.0 -1.0 2.0
0.2 -0.2 0.2 -0.1 0.3 -0.5 1.5 0.6 -1.0 2.0 5.5 -7.0
[End]`,
    )
    expect(file.mixedModeOrder).toEqual(['D2,3', 'D6,5', 'C2,3', 'C6,5', 'S4', 'S1'])
    expect([...file.network.reference].filter((_, k) => k % 2 === 0)).toEqual([150, 0.02, 37.5, 0.005, 50, 50])
  })
})

describe('measured and simulated files of a general-purpose library’s examples', () => {
  const shared = resolve(import.meta.dirname, '../../../shared/data')
  const names = ['MSL100.s2p', 'diff_2xthru.s4p', 'diff_dut.s4p', 'diff_fdf.s4p']
  it.skipIf(!isThere(...names)).each(names)(
    `%s is read as the clear reader reads it, to the bit (${WHEN_THERE})`,
    (name) => {
      const bytes = readFileSync(join(shared, name))
      const { network } = read(name, bytes)
      const clear = readClearly(bytes.toString('latin1'), network.ports)
      expect([...network.hz]).toEqual(clear.points.map((point) => point.hz))
      const flatly = clear.points.flatMap((point) => point.s.flat().flatMap(({ re, im }) => [re, im]))
      expect(worst(network.s, flatly)).toBe(0)
      expect(read(name, writeTouchstone(network, { version: '1', format: 'RI' })).network).toEqual(network)
    },
  )
})

type C = readonly [number, number]
const polar = (size: number, degrees: number): C => [
  size * Math.cos((degrees * Math.PI) / 180),
  size * Math.sin((degrees * Math.PI) / 180),
]
const times = ([a, b]: C, [c, d]: C): C => [a * c - b * d, a * d + b * c]
const plus = ([a, b]: C, [c, d]: C, sign = 1): C => [a + sign * c, b + sign * d]
const over = (a: C, [c, d]: C): C => times(a, [c / (c * c + d * d), -d / (c * c + d * d)])

/** The textbook conversion at 1 Ω (Frickey, IEEE Trans. MTT 42(2), 1994, table III). */
function hybridToS(h11: C, h12: C, h21: C, h22: C): number[] {
  const one: C = [1, 0]
  const cross = times(h12, h21)
  const divisor = plus(times(plus(h11, one), plus(h22, one)), cross, -1)
  return [
    ...over(plus(times(plus(h11, one, -1), plus(h22, one)), cross, -1), divisor),
    ...over(times([2, 0], h12), divisor),
    ...over(times([-2, 0], h21), divisor),
    ...over(plus(times(plus(h11, one), plus(one, h22, -1)), cross), divisor),
  ]
}
