import { formatScaled } from '../units'
import type { Network } from './network'
import { formatPortMap, type PortMap } from './portMap'

export type PortGuess = {
  /** Null where a file cannot be guessed; then it must be said. */
  readonly map: PortMap | null
  readonly text: string
  readonly sure: boolean
  /** A sentence for a person. */
  readonly why: string
}

/** Low frequencies are those up to this part of the highest one: there a line passes nearly all and couples little. */
const LOW = 1 / 50
/** A through is plain where it lies this far above every other way out of port 1: 6 dB. */
const PLAIN = 2

/**
 * Which ports of a file are the two ends of a pair, by the low end of its band (common practice, no source). The far end of port 1 is
 * where |S21|, |S31|, |S41| is largest. Of the two ports left, the lower one is taken for the near end, as files are usually numbered,
 * unless the higher one gets 6 dB more from port 1: over a short length near-end coupling is the larger. Which port of a pair is + does
 * not show in the numbers: port 1's conductor is taken for +. Sure only if both conductors are plain and the coupling agrees.
 */
export function guessPortMap(network: Network): PortGuess {
  const { ports, hz } = network
  if (ports === 2) return guessed({ from: [0], to: [1] }, true, 'The file has two ports.')
  const first = hz.findIndex((f) => f > 0)
  const end = hz.findLastIndex((f) => f <= (hz.at(-1) ?? 0) * LOW) + 1
  const count = Math.max(end, first + 1)
  if (ports !== 4 || first < 0) {
    const why = ports === 4 ? 'It has no frequency above 0 Hz.' : `It has ${ports} ports.`
    return { map: null, text: '', sure: false, why: `${why} Say which ones are the two ends.` }
  }
  const from1 = [1, 2, 3].map((port) => ({ port, size: size(network, port, 0, first, count) }))
  const [through, second] = [...from1].sort((one, other) => other.size - one.size)
  const [low, high] = from1.filter(({ port }) => port !== through?.port)
  if (!through || !second || !low || !high) throw new RangeError('A network of four ports has six ways between two.')

  const crossed = high.size > PLAIN * low.size
  const [near, far] = crossed ? [high, low] : [low, high]
  const other = size(network, far.port, near.port, first, count)
  const plain = Math.min(through.size, other) >= PLAIN * second.size && through.size > 0
  const map: PortMap = { from: [0, near.port], to: [through.port, far.port] }
  const numbering = crossed
    ? `Port ${near.port + 1} gets more from port 1 than port ${far.port + 1} and is taken for the near end, against the usual numbering.`
    : high.size > low.size
      ? `Port ${near.port + 1} is taken for the near end, as usual, though port ${far.port + 1} gets more from port 1.`
      : `Port ${near.port + 1} is at the near end.`
  const upTo = formatScaled(hz[count - 1] ?? 0, 'frequency', 3)
  const why =
    `Up to ${upTo} port 1 sends most to port ${through.port + 1} (S${through.port + 1}1 is ${decibels(through.size)}, ` +
    `the next is S${second.port + 1}1 with ${decibels(second.size)}). ${numbering}`
  return guessed(map, plain && high.size <= low.size, why)
}

function guessed(map: PortMap, sure: boolean, why: string): PortGuess {
  return { map, text: formatPortMap(map), sure, why }
}

/** Root mean square of |S| over the frequencies from `first` up to `end`. */
function size({ s, ports }: Network, receiving: number, driven: number, first: number, end: number): number {
  let sum = 0
  for (let k = first; k < end; k++) {
    const at = 2 * ((k * ports + receiving) * ports + driven)
    sum += (s[at] as number) ** 2 + (s[at + 1] as number) ** 2
  }
  return Math.sqrt(sum / (end - first))
}

function decibels(size: number): string {
  return size > 0 ? `${(20 * Math.log10(size)).toFixed(1).replace('-', '−')} dB` : '0'
}
