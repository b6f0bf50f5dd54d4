import { existsSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { formatPortMap, guessPortMap, network, parsePortMap } from '../../../lib/channel/networks'
import { interleaved, oracle, type Parts } from '../../published/networksOracle'

describe('a port map as typed', () => {
  it.each([
    ['1>2', 2, { from: [0], to: [1] }],
    ['2 > 1', 2, { from: [1], to: [0] }],
    ['5>11', 16, { from: [4], to: [10] }],
    ['1,3>2,4', 4, { from: [0, 2], to: [1, 3] }],
    [' 3 , 1 > 4 , 2 ', 4, { from: [2, 0], to: [3, 1] }],
  ])('%j of %i ports', (text, ports, expected) => {
    const map = parsePortMap(text, ports)
    expect(map).toEqual(expected)
    if (!('reason' in map)) expect(parsePortMap(formatPortMap(map), ports)).toEqual(map)
  })

  const form = "Type '1>2' for a two-port or '1,3>2,4' for two pairs, the + port of each pair first"
  it.each([
    ['', 4, `${form}.`],
    ['1,3', 4, `${form}.`],
    ['1>2>3', 4, `${form}.`],
    ['1,3>2,', 4, `${form}.`],
    ['1,x>2,4', 4, `'x' is no port number. ${form}.`],
    ['1,-3>2,4', 4, `'-3' is no port number. ${form}.`],
    ['1.5>2', 4, `'1.5' is no port number. ${form}.`],
    ['1,3>2,5', 4, 'There is no port 5: the file has 4 ports.'],
    ['0>1', 4, 'There is no port 0: the file has 4 ports.'],
    ['1>2', 1, 'There is no port 2: the file has 1 port.'],
    ['1,3>2,01', 4, 'Port 1 is there twice; every port has one place.'],
    ['1>2,4', 4, 'One end has one port and the other two; both need the same.'],
    ['1,2,3>4,5,6', 8, `An end has one port or a pair, not 3. ${form}.`],
  ])('%j of %i ports: %s', (text, ports, reason) => {
    expect(parsePortMap(text, ports)).toEqual({ reason })
  })
})

/** Row 1 and the through of the other conductor, dB, at 10 MHz, of the simulated fixtures of a general-purpose RF library's examples. */
const FIXTURES = {
  diff_2xthru: [-44.82, -46.26, 0, -53.47],
  diff_dut: [-55.19, -48.11, 0, -60.01],
  diff_fdf: [-53.24, -41.45, -0.01, -51.28],
}

/** A symmetric pair from S11, near end, through, far end in dB, its ports numbered as `order` says: near +, near −, far +, far −. */
function pair([s11, nearEnd, through, farEnd]: readonly number[], [a = 0, b = 0, c = 0, d = 0]: readonly number[]) {
  const s = new Float64Array(32)
  const set = (row: number, column: number, db = 0) => {
    s[2 * (4 * row + column)] = s[2 * (4 * column + row)] = 10 ** (db / 20)
  }
  for (const port of [a, b, c, d]) set(port, port, s11)
  for (const [x, y, db] of [
    [a, b, nearEnd],
    [c, d, nearEnd],
    [a, c, through],
    [b, d, through],
    [a, d, farEnd],
    [b, c, farEnd],
  ] as const)
    set(x, y, db)
  return network(4, Float64Array.of(1e7), s, 50)
}

describe('the map guessed from the low end of the band', () => {
  it.each([
    ['1,2>3,4', [0, 1, 2, 3], true],
    ['1,3>2,4', [0, 2, 1, 3], true],
    ['1,2>4,3', [0, 1, 3, 2], true],
    ['1,4>2,3', [0, 3, 1, 2], false],
    ['1,4>3,2', [0, 3, 2, 1], false],
    ['1,3>4,2', [0, 2, 3, 1], false],
  ])('is %s where the pair is numbered %j; sure, where numbered as usual: %s', (text, order, sure) => {
    const guess = guessPortMap(pair(FIXTURES.diff_fdf, order))
    expect(guess.text).toBe(text)
    expect(guess.sure).toBe(sure)
    expect(guess.map).toEqual(parsePortMap(text, 4))
  })

  it.each(Object.entries(FIXTURES))('is sure of the numbers of %s', (_, row) => {
    expect(guessPortMap(pair(row, [0, 1, 2, 3]))).toMatchObject({ text: '1,2>3,4', sure: true })
  })

  it.skipIf(!existsSync('../shared/data/diff_dut.s4p'))(
    'is sure of the whole simulated files (skipped where ../shared/data is not there)',
    () => {
      for (const name of Object.keys(FIXTURES)) {
        const lines = readFileSync(`../shared/data/${name}.s4p`, 'latin1').split(/\r?\n/)
        const numbers = lines
          .filter((line) => !/^[!#]/.test(line.trim()))
          .flatMap((line) => line.trim().split(/\s+/).filter(Boolean).map(Number))
        const rows = Array.from({ length: numbers.length / 33 }, (_, k) => numbers.slice(33 * k, 33 * k + 33))
        expect(lines.some((line) => /^#\s*hz\s+s\s+ri/i.test(line))).toBe(true)
        const hz = Float64Array.from(rows, (row) => row[0] ?? Number.NaN)
        const guess = guessPortMap(network(4, hz, Float64Array.from(rows.flatMap((row) => row.slice(1))), 50))
        expect(guess).toMatchObject({ text: '1,2>3,4', sure: true })
      }
    },
  )

  it('finds the order of the coupled line of numpy', () => {
    const { cases } = oracle<{ cases: Record<string, { f_hz: number[]; s: Parts }> }>('o4_mixedmode')
    const line = cases.coupled_line_sequential
    if (!line) throw new Error('the case of the coupled line is missing')
    const guess = guessPortMap(network(4, Float64Array.from(line.f_hz), interleaved(line.s), 50))
    expect(guess).toMatchObject({ text: '1,2>3,4', sure: true })
    expect(guess.why).toBe(
      'Up to 100 MHz port 1 sends most to port 3 (S31 is −0.2 dB, the next is S21 with −27.4 dB). Port 2 is at the near end.',
    )
  })

  it('is not sure where nothing stands out, as at 5 GHz in the Touchstone specification’s example', () => {
    const guess = guessPortMap(pair([-4.44, -7.96, -7.54, -5.51], [0, 1, 2, 3]))
    expect(guess.text).toBe('1,2>4,3')
    expect(guess.sure).toBe(false)
  })

  it('is not sure where the second conductor is broken', () => {
    const broken = pair(FIXTURES.diff_dut, [0, 1, 2, 3])
    for (const at of [2 * (4 * 3 + 1), 2 * (4 * 1 + 3)]) broken.s[at] = 0.001
    expect(guessPortMap(broken)).toMatchObject({ text: '1,2>3,4', sure: false })
  })

  it('looks past a point at 0 Hz and says what it cannot tell', () => {
    const atZero = network(4, Float64Array.of(0), new Float64Array(32), 50)
    expect(guessPortMap(atZero)).toMatchObject({ map: null, text: '', sure: false })
    expect(guessPortMap(network(3, Float64Array.of(1e9), new Float64Array(18), 50))).toEqual({
      map: null,
      text: '',
      sure: false,
      why: 'It has 3 ports. Say which ones are the two ends.',
    })
    expect(guessPortMap(network(2, Float64Array.of(1e9), new Float64Array(8), 50))).toMatchObject({
      text: '1>2',
      sure: true,
    })
    const one = pair(FIXTURES.diff_dut, [0, 2, 1, 3])
    const both = network(4, Float64Array.of(0, 1e7), Float64Array.of(...new Float64Array(32), ...one.s), 50)
    expect(guessPortMap(both)).toMatchObject({ text: '1,3>2,4', sure: true })
  })
})
