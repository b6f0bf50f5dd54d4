import type { Line } from './schema'

/**
 * Whether a line is a length of the same all along, whose loss obeys √f and f laws and grows with temperature: a trace, or a
 * cable's bulk. A cable line that says what it covers, has no length and leaves the bulk out is a termination or a paddle card.
 */
export function isUniform(line: Line): boolean {
  if (line.kind === 'trace') return true
  if (line.kind !== 'cable') return false
  return line.covers === null || line.length !== null || line.covers.split(' ').includes('bulk')
}
