import { readTouchstone } from '../../channel/touchstone'
import type { EvidenceNetwork } from '../evaluation'

/**
 * Reads the network out of a file's bytes; slow for a large one, so it is called off the main thread.
 * @param name says by its ending how many ports the file has
 */
export function readNetwork(bytes: Uint8Array, name: string): EvidenceNetwork {
  const read = readTouchstone(bytes, name)
  if ('network' in read) return { network: read.network }
  return { problem: read.line === null ? read.message : `Line ${read.line}: ${read.message}` }
}
