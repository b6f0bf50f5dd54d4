import { readdirSync, readFileSync } from 'node:fs'
import { join, resolve } from 'node:path'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { readTouchstone } from '../../../lib/channel/touchstone'

const folder = resolve(import.meta.dirname, '../../published/oracles/touchstone')
const valid = readdirSync(folder)
  .filter((name) => /p$/.test(name))
  .map((name) => ({ name, bytes: readFileSync(join(folder, name)) }))

const PIECES = [
  '\n',
  '\r',
  ' ',
  '!',
  '#',
  '[',
  ']',
  '-',
  '.',
  'e',
  'nan',
  '1e999',
  '1e-999',
  '\u0000',
  '[End]',
  '[Version] 2.0\n',
  '# R 0\n',
  '[Network Data]\n',
  '[Reference] ',
  '0 ',
  '9'.repeat(30),
  'é',
]

type Change = {
  readonly at: number
  readonly kind: 'cut' | 'end' | 'insert' | 'byte' | 'double'
  readonly size: number
  readonly piece: number
}
const change: fc.Arbitrary<Change> = fc.record({
  at: fc.double({ min: 0, max: 1, noNaN: true }),
  kind: fc.constantFrom('cut', 'end', 'insert', 'byte', 'double'),
  size: fc.integer({ min: 1, max: 200 }),
  piece: fc.nat(255),
})

function changed(bytes: Uint8Array, { at, kind, size, piece }: Change): Uint8Array {
  const from = Math.floor(at * bytes.length)
  const before = bytes.subarray(0, from)
  const behind = bytes.subarray(from)
  const inserted: Record<Change['kind'], () => Uint8Array[]> = {
    cut: () => [before, bytes.subarray(from + size)],
    end: () => [before],
    insert: () => [before, new TextEncoder().encode(PIECES[piece % PIECES.length]), behind],
    byte: () => [before, Uint8Array.of(piece), behind.subarray(1)],
    double: () => [before, behind.subarray(0, size), behind],
  }
  return Uint8Array.from(Buffer.concat(inserted[kind]()))
}

/** A network that breaks its own contract, or a problem without a sentence; null where all is well. */
function fault(bytes: Uint8Array, name: string): string | null {
  const file = readTouchstone(bytes, name)
  if ('message' in file) {
    const lines = new TextDecoder('latin1').decode(bytes).split(/\r\n|\r|\n/).length
    if (file.line !== null && !(file.line >= 1 && file.line <= lines)) return `line ${file.line} of ${lines}`
    return /^['[A-Z].*\.$/.test(file.message) ? null : file.message
  }
  const { ports, hz, s, reference } = file.network
  if (hz.length === 0 || s.length !== 2 * ports * ports * hz.length || reference.length !== 2 * ports)
    return 'wrong sizes'
  if (!hz.every((f, k) => Number.isFinite(f) && (k === 0 ? f >= 0 : f > (hz[k - 1] ?? f))))
    return 'frequencies do not rise'
  if (!s.every(Number.isFinite)) return 'values are not finite'
  return reference.every((ohm, k) => (k % 2 === 0 ? ohm > 0 && Number.isFinite(ohm) : ohm === 0))
    ? null
    : 'no reference'
}

describe('changed files are read or refused, never more than that; the seed is printed on failure', () => {
  it('valid files with one to four changes', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...valid),
        fc.array(change, { minLength: 1, maxLength: 4 }),
        ({ name, bytes }, changes) => {
          expect(fault(changes.reduce(changed, Uint8Array.from(bytes)), name)).toBeNull()
        },
      ),
      { numRuns: 4000 },
    )
  })

  it('any bytes under any name', () => {
    fc.assert(
      fc.property(
        fc.uint8Array({ maxLength: 300 }),
        fc.constantFrom('a.s1p', 'a.s2p', 'a.ts', 'a', '.s0p', 'a.s99p'),
        (bytes, name) => {
          expect(fault(bytes, name)).toBeNull()
        },
      ),
      { numRuns: 2000 },
    )
  })

  it('any order of the words of the format', () => {
    const words = [
      '[Version] 2.0\n',
      '# Hz S RI R 50\n',
      '#',
      '\n',
      ' ',
      '1',
      '0.5',
      '-2',
      ...PIECES,
      '[Number of Ports] 2\n',
      '[Two-Port Data Order] 12_21\n',
      '[Number of Frequencies] 1\n',
      '[Matrix Format] Lower\n',
      '[Mixed-Mode Order] D1,2 C1,2\n',
      '[Noise Data]\n',
      '[Begin Information]\n',
      '[End Information]\n',
      'Z ',
      'H ',
      'R 50 75 ',
    ]
    fc.assert(
      fc.property(
        fc.array(fc.constantFrom(...words), { maxLength: 60 }),
        fc.constantFrom('a.s1p', 'a.s2p', 'a.ts'),
        (all, name) => {
          expect(fault(new TextEncoder().encode(all.join('')), name)).toBeNull()
        },
      ),
      { numRuns: 3000 },
    )
  })
})
