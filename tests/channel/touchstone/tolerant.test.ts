import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { readClearly } from '../../bench/clear/touchstone'
import { fileOf } from './reading'

const s = (text: string, name?: string) => [...fileOf(text, name).network.s]
const warnings = (text: string, name?: string) => fileOf(text, name).warnings

describe('option lines', () => {
  it.each([
    ['# GHz S RI R 75', 'GHz', 'RI', 75],
    ['#r 75 ri s ghz', 'GHz', 'RI', 75],
    ['  \t# mHZ\tS Db', 'MHz', 'DB', 50],
    ['#', 'GHz', 'MA', 50],
    ['# kHz R 1e2 ! RI', 'kHz', 'MA', 100],
    ['# S R 50. RI Hz', 'Hz', 'RI', 50],
  ])('%s', (line, unit, format, ohm) => {
    const file = fileOf(`! made by hand\n${line}\n1 0 0`)
    expect(file).toMatchObject({ unit, format, parameter: 'S', version: '1.0', warnings: [] })
    expect([...file.network.reference]).toEqual([ohm, 0])
  })

  it('missing: the default, with a warning', () => {
    const file = fileOf('2 1 0')
    expect([...file.network.hz, ...file.network.s]).toEqual([2e9, 1, 0])
    expect(file.warnings).toEqual([
      { line: null, message: 'There is no option line; it was taken to be # GHz S MA R 50.' },
    ])
  })

  it('behind the data: used for all of them, with a warning', () => {
    const file = fileOf('1 0.5 0.25\n2 0.5 0.25\n# Hz RI R 20\n3 0.5 0.25\n')
    expect([...file.network.hz]).toEqual([1, 2, 3])
    expect([...file.network.reference]).toEqual([20, 0])
    expect(file.warnings).toEqual([
      { line: 3, message: 'The option line stands behind the first data; it was used for all of them.' },
    ])
  })

  it('a second one is left out, with a warning', () => {
    expect(warnings('# Hz S RI\n1 0 0\n# GHz Y DB R 1\n2 0 0\n')).toEqual([
      { line: 3, message: 'Only the first option line counts; this one was left out.' },
    ])
  })
})

describe('version 2', () => {
  const rows = '[Network Data]\n1 0.1 0.2 0.3 0.4 0.5 0.6 0.7 0.8\n'
  const head =
    '[version]  2.1 ! first\n# hz ri\n[NUMBER  OF PORTS] 2\n[two-port data order] 12_21\n[Number of Frequencies] 1\n'

  it('keywords in any case and spacing, references over several lines, information left out', () => {
    const file = fileOf(
      `${head}[Reference] ! per port\n 40\n\n! and\n60\n[Begin Information]\n# Hz Z\n[Maker] any\n1 2 3\n[ end information ]\n[Matrix Format] FULL\n${rows}[end]\nanything`,
      'link.ts',
    )
    expect(file).toMatchObject({ version: '2.1', warnings: [] })
    expect([...file.network.reference]).toEqual([40, 0, 60, 0])
    expect([...file.network.s]).toEqual([0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8])
  })

  it('what is missing without harm, unknown or in disagreement is warned of', () => {
    const text = `[Version] 2.0\n# Hz RI\n[Number of Ports] 2\n[Two-Port Data Order] 12_21\n[Colour] green and blue\n[Number of Noise Frequencies] 2\n${rows}[Noise Data]\n1 1 0.5 10 20\n`
    expect(warnings(text, 'link.s4p')).toEqual([
      { line: 5, message: '[Colour] is unknown and left out.' },
      { line: null, message: "The file's ending says 4 ports, [Number of Ports] 2; the latter counts." },
      { line: 7, message: '[Number of Frequencies] is missing; whether the file is whole was not checked.' },
      { line: 11, message: '[Number of Noise Frequencies] is 2, but there are 1.' },
      { line: 11, message: '[End] is missing at the end of the file.' },
    ])
  })

  it('admittances in siemens are not divided by anything: 0.02 S in 50 Ω reflects nothing', () => {
    const text =
      '[Version] 2.0\n# Hz Y RI\n[Number of Ports] 1\n[Number of Frequencies] 1\n[Network Data]\n1 0.02 0\n[End]'
    expect(s(text)).toEqual([0, 0])
  })
})

describe('impedances by hand', () => {
  it('G-parameters are H-parameters with voltage and current exchanged, so their S has the other sign', () => {
    const g = s('# Hz G RI R 50\n1 0.5 0.1 2 -1 0.25 0 0.75 0.3\n', 'link.s2p')
    const h = s('# Hz H RI R 50\n1 0.5 0.1 2 -1 0.25 0 0.75 0.3\n', 'link.s2p')
    expect(g).toEqual(h.map((part) => -part))
  })

  it('a series resistor of 25 Ω between 50 and 100 Ω, as H in ohms: S11 = (125 − 50)/175, S21 = 2·√(50·100)/175', () => {
    const text =
      '[Version] 2.0\n# Hz H RI\n[Number of Ports] 2\n[Two-Port Data Order] 12_21\n[Number of Frequencies] 1\n[Reference] 50 100\n[Network Data]\n1 25 0 1 0 -1 0 0 0\n[End]'
    const through = (2 * Math.sqrt(5000)) / 175
    expect(s(text)).toEqual([75 / 175, 0, through, 0, through, 0, -25 / 175, 0].map((x) => expect.closeTo(x, 14)))
  })

  it('references of each port and normalised impedances: read as normalised by both, with a warning (from memory)', () => {
    const file = fileOf('# Hz Z RI R 50 100\n1 2 0 1 0 1 0 2 0\n', 'link.s2p')
    expect(file.version).toBe('1.1')
    expect([...file.network.s]).toEqual([0.25, 0, 0.25, 0, 0.25, 0, 0.25, 0].map((x) => expect.closeTo(x, 14)))
    expect(file.warnings[0]?.message).toBe(
      'Z-parameters were taken as normalised by √(Ri·Rj) of their ports; see whether they were saved so.',
    )
  })
})

describe('noise data of version 1', () => {
  const rows = '# Hz S RI R 20\n1 0 0 0 0 0 0 0 0\n3 0 0 0 0 0 0 0 0\n'

  it('begin at a frequency no higher than the last on a line of five numbers', () => {
    expect([...(fileOf(`${rows}3 1 0.5 10 0.5`, 'link.s2p').noise ?? [])]).toEqual([3, 1, 0.5, 10, 10])
    expect([...(fileOf(`${rows}2 1 .5 10 .5 ! Rn\n1 2 .5 10 1`, 'link.s2p').noise ?? [])]).toEqual([
      2, 1, 0.5, 10, 10, 1, 2, 0.5, 10, 20,
    ])
  })

  it('do not begin with a row of the last frequency', () => {
    const file = fileOf(`${rows}3 0 0 0 0 0 0 0 0`, 'link.s2p')
    expect(file.noise).toBeNull()
    expect(file.warnings).toEqual([
      { line: 4, message: '3 Hz stands here again, with the same values; the first of the rows counts.' },
    ])
  })
})

describe('comments and warnings', () => {
  it('keep the first 4,096 bytes, a character that is cut left out', () => {
    const { comments } = fileOf(`! first\n#\n1 0 0 ! behind\n!${'ä'.repeat(4000)}`)
    expect(comments.startsWith('first\nbehind\nää')).toBe(true)
    expect(comments).not.toContain('�')
    expect(new TextEncoder().encode(comments).length).toBeLessThanOrEqual(4096)
  })

  it('are no more than 50 and the number of those left', () => {
    const many = warnings(`# Hz RI\n${'1 0 0\n'.repeat(101)}`)
    expect(many).toHaveLength(51)
    expect(many[50]).toEqual({ line: null, message: 'There are 50 more of these.' })
  })
})

describe('any version 1 file, however broken into lines', () => {
  const number = fc.oneof(
    fc.double({ min: -2, max: 2, noNaN: true }).map(String),
    fc
      .double({ min: -2, max: 2, noNaN: true })
      .map((value) => value.toExponential(20).replace(/e([+-])(\d)$/, 'e$100$2')),
    fc.integer({ min: -999, max: 999 }).map((value) => `${value / 1000}`),
  )
  const blank = fc.constantFrom(' ', '\n', '\r\n', '\r', '\t', '  ', ' ! said in between\n', '\n! and here\n')

  it('is read as the clear reader reads it, to the bit; the seed is printed on failure', () => {
    const files = fc.integer({ min: 1, max: 5 }).chain((ports) => {
      const size = 2 * ports * ports
      const row = fc.array(fc.tuple(number, blank), { minLength: size, maxLength: size })
      return fc.record({
        ports: fc.constant(ports),
        options: fc.constantFrom('# GHz S RI R 50', '# R 75 MA Hz', '#kHz db', '#'),
        rows: fc.array(row, { minLength: 1, maxLength: 6 }),
      })
    })
    fc.assert(
      fc.property(files, ({ ports, options, rows }) => {
        const data = rows.map((row, k) => `${k + 1}.5 ${row.map(([value, between]) => value + between).join('')}`)
        const text = `${options}\n${data.join('\n')}`
        const clear = readClearly(text, ports)
        const { network } = fileOf(text, `link.s${ports}p`)
        expect([...network.hz]).toEqual(clear.points.map((point) => point.hz))
        const flat = clear.points.flatMap((point) => point.s.flat().flatMap(({ re, im }) => [re, im]))
        expect(flat.every((part, k) => Object.is(part, network.s[k]))).toBe(true)
        expect(network.s.length).toBe(flat.length)
      }),
      { numRuns: 300 },
    )
  })
})
