import type { Network } from '../networks/network'
import type { Format } from './file'
import type { TwoPortOrder } from './header'

export type WriteOptions = {
  /** '1' is 1.0, or 1.1 where the references differ. */
  readonly version: '1' | '2.0'
  readonly format: Format
  /** Lines of comment at the beginning. */
  readonly comments?: readonly string[]
}

const DEGREES = 180 / Math.PI
/** The standard breaks lines of version 1 behind four complex numbers. */
const PAIRS_A_LINE = 4
/** Decibels that read back as zero, which itself has none: 10^−325 is no double. */
const DECIBELS_OF_ZERO = -6500

/**
 * A network as a Touchstone file in Hz, to be read back by any reader of the standard. Each number is the shortest that is read
 * back to the same bits, so RI loses nothing; MA and DB round as their functions do.
 * @throws RangeError for a complex reference, which the standard cannot hold (renormalise first), or a value that is not finite
 */
export function writeTouchstone(network: Network, { version, format, comments = [] }: WriteOptions): string {
  const resistances = realReferences(network)
  const { ports, hz } = network
  const same = resistances.every((ohm) => ohm === resistances[0])
  const lines = comments.flatMap((comment) => comment.split(/\r\n|\r|\n/)).map((line) => `! ${line}`.trimEnd())
  if (version === '2.0') lines.push('[Version] 2.0')
  lines.push(`# Hz S ${format} R ${version === '1' && !same ? resistances.join(' ') : resistances[0]}`)
  if (version === '2.0') {
    lines.push(`[Number of Ports] ${ports}`)
    if (ports === 2) lines.push('[Two-Port Data Order] 12_21')
    lines.push(`[Number of Frequencies] ${hz.length}`, `[Reference] ${resistances.join(' ')}`, '[Network Data]')
  }
  const order = version === '1' && ports === 2 ? '21_12' : '12_21'
  for (let point = 0; point < hz.length; point++) writeRow(lines, network, point, format, order)
  if (version === '2.0') lines.push('[End]')
  return `${lines.join('\n')}\n`
}

function realReferences(network: Network): string[] {
  return Array.from({ length: network.ports }, (_, port) => {
    if (network.reference[2 * port + 1] !== 0)
      throw new RangeError(`Port ${port + 1} has a complex reference; renormalise the network to a real one first.`)
    return shortest(network.reference[2 * port] as number)
  })
}

function writeRow(lines: string[], network: Network, point: number, format: Format, order: TwoPortOrder): void {
  const { ports, s } = network
  let line = shortest(network.hz[point] as number)
  let onLine = 0
  for (let element = 0; element < ports * ports; element++) {
    const newRow = ports > 2 && element % ports === 0 && element > 0
    if (newRow || onLine === PAIRS_A_LINE) {
      lines.push(line)
      line = ''
      onLine = 0
    }
    const row = Math.floor(element / ports)
    const column = element % ports
    const at = 2 * (point * ports * ports + (order === '21_12' ? column * ports + row : element))
    line += `${line === '' ? '' : ' '}${pair(s[at] as number, s[at + 1] as number, format)}`
    onLine++
  }
  lines.push(line)
}

function pair(re: number, im: number, format: Format): string {
  if (format === 'RI') return `${shortest(re)} ${shortest(im)}`
  const size = Math.hypot(re, im)
  const angle = shortest(Math.atan2(im, re) * DEGREES)
  if (format === 'MA') return `${shortest(size)} ${angle}`
  return `${shortest(size === 0 ? DECIBELS_OF_ZERO : 20 * Math.log10(size))} ${angle}`
}

/** ECMAScript's Number::toString is the shortest text that reads back to the same double; only the sign of −0 is missing. */
function shortest(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError(`${value} cannot be written.`)
  return Object.is(value, -0) ? '-0' : String(value)
}
