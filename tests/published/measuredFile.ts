import { existsSync, readFileSync } from 'node:fs'
import { type Network, network } from '../../lib/channel/networks/network'

const path = (name: string) => new URL(`../../../shared/data/${name}`, import.meta.url)

/** Said in the title of each test that reads such a file. */
export const WHEN_THERE = 'read from ../shared/data, skipped where that is not there'

export const isThere = (...names: string[]) => names.every((name) => existsSync(path(name)))

/**
 * One of the measured or simulated files (examples of the general-purpose RF library scikit-rf), all in real and imaginary
 * parts at 50 Ω. Read here in the plainest way, so that these checks do not rest on our own reader.
 */
export function measuredFile(name: string): Network {
  const ports = Number(/s([0-9])p$/.exec(name)?.[1])
  const [head = '', ...lines] = readFileSync(path(name), 'latin1')
    .split(/\r?\n/)
    .filter((line) => line.trim() !== '' && !line.startsWith('!'))
  const unit = /^#\s+GHZ/i.test(head) ? 1e9 : 1
  const numbers = lines.join(' ').trim().split(/\s+/).map(Number)
  const row = 1 + 2 * ports * ports
  const count = numbers.length / row
  const hz = new Float64Array(count)
  const s = new Float64Array((row - 1) * count)
  for (let f = 0; f < count; f++) {
    hz[f] = (numbers[f * row] ?? 0) * unit
    for (let i = 0; i < ports; i++)
      for (let j = 0; j < ports; j++) {
        // Two-ports of version 1 are S11 S21 S12 S22, all others row by row.
        const from = f * row + 1 + 2 * (ports === 2 ? j * ports + i : i * ports + j)
        const to = 2 * ((f * ports + i) * ports + j)
        s[to] = numbers[from] ?? 0
        s[to + 1] = numbers[from + 1] ?? 0
      }
  }
  return network(ports, hz, s, 50)
}

/** Every nth point, from the nth. */
export function everyNth(whole: Network, n: number): Network {
  const size = 2 * whole.ports * whole.ports
  const hz = whole.hz.filter((_, f) => (f + 1) % n === 0)
  const s = whole.s.filter((_, at) => (Math.floor(at / size) + 1) % n === 0)
  return { ...whole, hz, s }
}
