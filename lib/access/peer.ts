import { isIPv4, isIPv6 } from 'node:net'

/** Set by the server from the socket after it has deleted every copy that a client sent; nothing else is believed. */
const PEER_HEADER = 'x-halfbaud-peer'

/**
 * The address that a request came from, as the throttle counts it: an IPv4 address, or the /64 network of an IPv6 address,
 * because one household or host usually holds a whole /64 (RFC 6177; common practice).
 */
export function peerOf(headers: Headers): string {
  const address = headers.get(PEER_HEADER) ?? ''
  const mapped = address.replace(/^::ffff:/i, '')
  if (isIPv4(mapped)) return mapped
  const plain = address.replace(/%.*$/, '')
  return isIPv6(plain) ? `${network64(plain)}/64` : 'unknown'
}

function network64(address: string): string {
  const [head = '', tail] = address.toLowerCase().split('::')
  const first = head === '' ? [] : head.split(':')
  const last = tail ? tail.split(':') : []
  const gap = tail === undefined ? [] : Array<string>(8 - first.length - last.length).fill('0')
  const groups = [...first, ...gap, ...last]
  return groups
    .slice(0, 4)
    .map((group) => Number.parseInt(group, 16).toString(16))
    .join(':')
}
