import type { Refusal } from './refusal'

/** The ports of one end of a channel, from 0: one, or the + and the − port of a pair. */
export type End = readonly [port: number] | readonly [plus: number, minus: number]

/** Which ports of a file are the two ends of a channel: a two-port as it stands, or two single-ended pairs. */
export type PortMap = { readonly from: End; readonly to: End }

const FORM = "Type '1>2' for a two-port or '1,3>2,4' for two pairs, the + port of each pair first"

/**
 * Reads '1>2' (port 1 to port 2, single-ended or already differential, other ports of the file matched) or '1,3>2,4' (from the pair
 * with + on port 1 and − on 3 to that with + on 2 and − on 4). Ports are typed as in the file, from 1.
 * @param ports of the file
 */
export function parsePortMap(text: string, ports: number): PortMap | Refusal {
  const ends = text.split('>').map((end) => end.split(',').map((port) => port.trim()))
  const [from, to] = ends
  if (!from || !to || ends.length > 2) return { reason: `${FORM}.` }
  const typed = [...from, ...to]
  const wrong = typed.find((port) => !/^[0-9]{1,4}$/.test(port))
  if (wrong !== undefined) return { reason: wrong === '' ? `${FORM}.` : `'${wrong}' is no port number. ${FORM}.` }
  const absent = typed.find((port) => Number(port) < 1 || Number(port) > ports)
  if (absent !== undefined)
    return { reason: `There is no port ${Number(absent)}: the file has ${ports} ${ports === 1 ? 'port' : 'ports'}.` }
  const twice = typed.find((port, k) => typed.findIndex((other) => Number(other) === Number(port)) < k)
  if (twice !== undefined) return { reason: `Port ${Number(twice)} is there twice; every port has one place.` }
  if (from.length !== to.length) return { reason: 'One end has one port and the other two; both need the same.' }
  const [near, far] = [asEnd(from), asEnd(to)]
  if (!near || !far) return { reason: `An end has one port or a pair, not ${from.length}. ${FORM}.` }
  return { from: near, to: far }
}

/** Writes a map as {@link parsePortMap} reads it. */
export function formatPortMap({ from, to }: PortMap): string {
  const end = (ports: End) => ports.map((port) => port + 1).join(',')
  return `${end(from)}>${end(to)}`
}

function asEnd(typed: readonly string[]): End | null {
  const [first, second, third] = typed
  if (first === undefined || third !== undefined) return null
  return second === undefined ? [Number(first) - 1] : [Number(first) - 1, Number(second) - 1]
}
