import { describe, expect, it } from 'vitest'
import { readTouchstone } from '../../../lib/channel/touchstone'

const MEGABYTE = 1_000_000
const HEAD = '# Hz S RI R 50\n'

/** `head`, then `piece` over and over to `size` bytes. */
function repeated(head: string, piece: string, size: number): Uint8Array {
  const bytes = Buffer.alloc(size, piece)
  bytes.write(head, 0, 'latin1')
  return bytes
}

/** What came of it, and the memory beside the file itself that was taken for it. */
function outcome(bytes: Uint8Array, name: string) {
  const before = process.memoryUsage()
  const file = readTouchstone(bytes, name)
  const after = process.memoryUsage()
  const taken = after.heapUsed + after.arrayBuffers - before.heapUsed - before.arrayBuffers
  return {
    file,
    problem: 'message' in file ? file : null,
    points: 'network' in file ? file.network.hz.length : 0,
    taken,
  }
}

/** Sizes and time are bounded by what stands beside each; the time by vitest's limit for one test. Common practice, no source. */
describe('hostile files end in bounded time and memory', () => {
  it('100 MB without a line end: one word', () => {
    const { problem, taken } = outcome(repeated(HEAD, 'x', 100 * MEGABYTE), 'a.s4p')
    expect(problem).toEqual({
      line: 2,
      message: `'${'x'.repeat(24)}…' is not a finite number; see whether the file is a whole Touchstone file.`,
    })
    expect(taken).toBeLessThan(10 * MEGABYTE)
  })

  it('100 MB of one number', () => {
    const { problem, taken } = outcome(repeated(HEAD, '7', 100 * MEGABYTE), 'a.s4p')
    expect(problem?.line).toBe(2)
    expect(taken).toBeLessThan(10 * MEGABYTE)
  })

  it.each([
    ['a keyword', '[', 'y', 1],
    ['a keyword’s value', '[Version] ', '2', 1],
    ['an option', '# ', 'G', 1],
    ['R with a number for every third byte', '# R', ' 50', 1],
    ['words of the mixed-mode order', '[Version] 2.0\n#\n[Number of Ports] 2\n[Mixed-Mode Order]', ' S1', 4],
    ['references', '[Version] 2.0\n#\n[Number of Ports] 2\n[Reference]', ' 50', 4],
  ])('100 MB of %s', (_, head, piece, line) => {
    const { problem, taken } = outcome(repeated(head, piece, 100 * MEGABYTE), 'a.s2p')
    expect(problem?.line).toBe(line)
    expect(taken).toBeLessThan(20 * MEGABYTE)
  })

  it('10 million numbers on one line: read', () => {
    const rows = Array.from({ length: 303_030 }, (_, k) => `${k}${' 0'.repeat(32)}`).join(' ')
    const { points } = outcome(new TextEncoder().encode(HEAD + rows), 'a.s4p')
    expect(points).toBe(303_030)
  })

  it('10 million numbers on one line, all the same: a million rows of one frequency, the last of them cut', () => {
    const { points, file } = outcome(repeated(HEAD, '1 ', 20 * MEGABYTE), 'a.s2p')
    expect('network' in file ? points : file.message).toMatch(/^The data end inside the row/)
  })

  it('50 million numbers: refused at the 20 millionth', () => {
    const { problem, taken } = outcome(repeated(HEAD, '1\n', 100 * MEGABYTE), 'a.s4p')
    expect(problem?.message).toBe('The file has more than 20 million numbers; save it with fewer frequencies.')
    expect(taken).toBeLessThan(500 * MEGABYTE)
  })

  it('10 million comment lines, then a row: read', () => {
    const comments = repeated(`${HEAD}!`, '! abcdef\n', 9 * 10 * MEGABYTE)
    const { file, taken } = outcome(Buffer.concat([comments, Buffer.from('\n1 0 0\n')]), 'a.s1p')
    expect('comments' in file ? file.comments.length : 0).toBeGreaterThan(3000)
    expect('network' in file && [...file.network.hz]).toEqual([1])
    expect(taken).toBeLessThan(20 * MEGABYTE)
  })

  it('10 million option lines: read, the warnings bounded', () => {
    const { file } = outcome(
      Buffer.concat([repeated('#Hz \n1 1 0\n', '#\n', 20 * MEGABYTE), Buffer.from('\n')]),
      'a.s1p',
    )
    expect('warnings' in file && file.warnings.length).toBe(51)
  })

  it('10 million lines of information without its end', () => {
    const { problem } = outcome(
      repeated('[Version] 2.0\n[Begin Information]\n', '[End Info]\n', 110 * MEGABYTE),
      'a.ts',
    )
    expect(problem?.line).toBe(2)
  })

  it('100 MB of blanks, of line ends, of zero bytes', () => {
    expect(outcome(repeated(HEAD, ' ', 100 * MEGABYTE), 'a.s2p').problem?.line).toBeNull()
    expect(outcome(repeated(HEAD, '\r\n', 100 * MEGABYTE), 'a.s2p').problem?.line).toBeNull()
    expect(outcome(repeated(HEAD, '\u0000', 100 * MEGABYTE), 'a.s2p').problem?.line).toBe(2)
  })

  it('100 MB of random bytes', () => {
    const bytes = new Uint8Array(100 * MEGABYTE)
    let state = 1
    for (let k = 0; k < bytes.length; k++) {
      state = (Math.imul(state, 1664525) + 1013904223) | 0
      bytes[k] = state >>> 24
    }
    expect(outcome(bytes, 'a.s2p').problem).not.toBeNull()
  })

  it('a file of 16 ports and 4,000 points, cut at any byte of its last row: refused by the line on which that begins', () => {
    const row = (k: number) => `${k}${' 0.123456789 -0.5'.repeat(256)}\n`
    const rows = Array.from({ length: 4000 }, (_, k) => row(k)).join('')
    const whole = new TextEncoder().encode(HEAD + rows)
    expect(outcome(whole, 'a.s16p').points).toBe(4000)
    for (let cut = 10; cut < 4000; cut += 797)
      expect(outcome(whole.subarray(0, whole.length - cut), 'a.s16p').problem?.line).toBe(4001)
  })
})
