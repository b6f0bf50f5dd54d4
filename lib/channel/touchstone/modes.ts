import { Unreadable } from './unreadable'

const MODE = /^(?:S(\d{1,3})|([DC])(\d{1,3}),(\d{1,3}))$/i

/**
 * The references of the matrix rows of a mixed-mode file: R of a single port, 2·R of the difference and R/2 of the sum of two
 * (Touchstone 2.0, 'Mixed-Mode Order'; Bockelman and Eisenstadt, IEEE Trans. MTT 43(7), 1995).
 * @param words as [Mixed-Mode Order] lists them: S4, D2,3 (port 2 minus port 3), C2,3
 * @param ports Ω of each port
 */
export function modeReferences(words: readonly string[], ports: Float64Array, line: number): Float64Array {
  const uses = new Map<string, number>()
  const references = words.map((word) => {
    const [, single, mode, first, second] = MODE.exec(word) ?? []
    if (single !== undefined) {
      use(uses, `S${Number(single)}`)
      return port(ports, single, word, line)
    }
    if (mode === undefined || first === undefined || second === undefined)
      throw new Unreadable(line, `'${word}' is unknown in [Mixed-Mode Order]; write S4, D2,3 or C2,3.`)
    const ohm = port(ports, first, word, line)
    if (ohm !== port(ports, second, word, line) || Number(first) === Number(second))
      throw new Unreadable(line, `'${word}' needs two ports of the same reference.`)
    const pair = [Number(first), Number(second)].sort((a, b) => a - b).join()
    use(uses, `${mode.toUpperCase()}${pair}`)
    return mode.toUpperCase() === 'D' ? 2 * ohm : ohm / 2
  })
  if (!isComplete(uses, ports.length))
    throw new Unreadable(
      line,
      '[Mixed-Mode Order] must have each port once: alone (S), or in one pair with its D and its C.',
    )
  return Float64Array.from(references)
}

function use(uses: Map<string, number>, mode: string): void {
  uses.set(mode, (uses.get(mode) ?? 0) + 1)
}

function port(ports: Float64Array, digits: string, word: string, line: number): number {
  const ohm = ports[Number(digits) - 1]
  if (ohm === undefined)
    throw new Unreadable(line, `'${word}' names a port that is not there; there are ${ports.length}.`)
  return ohm
}

function isComplete(uses: ReadonlyMap<string, number>, ports: number): boolean {
  const seen = new Array<number>(ports + 1).fill(0)
  for (const [mode, times] of uses) {
    if (times !== 1) return false
    const pair = mode.slice(1)
    if (mode.startsWith('D') && !uses.has(`C${pair}`)) return false
    if (mode.startsWith('C') && !uses.has(`D${pair}`)) return false
    if (mode.startsWith('C')) continue
    for (const number of pair.split(',').map(Number)) seen[number] = (seen[number] ?? 0) + 1
  }
  return seen.every((times, number) => times === (number === 0 ? 0 : 1))
}
