import type { Network } from './network'
import { MIXTURE, mixPorts } from './portwise'

/**
 * What a and b are where a reference is complex; at real references all three are the same.
 * power: (v + Z·i)/2√Re Z and (v − Z*·i)/2√Re Z (Kurokawa 1965); a Network always holds these.
 * pseudo: √Re Z/2|Z|·(v ± Z·i) (Marks and Williams, J. Res. NIST 97, 1992).
 * travelling: (v ± Z·i)/2√Z.
 */
export type Waves = 'power' | 'pseudo' | 'travelling'

/**
 * The same network between other references, computed in S directly: through Z it would be singular wherever a lossless line is a
 * multiple of a half wave long.
 * @param reference Ω: one real number for all ports, or real and imaginary part of each port side by side
 * @param waves of `network` and of the answer. Where a reference is complex, only 'power' gives what the rest of this folder takes
 * @returns the network itself where nothing changes; NaN at a frequency where an active network has no such waves
 * @throws RangeError for a reference without positive real part
 */
export function renormalise(network: Network, reference: number | Float64Array, waves: Waves = 'power'): Network {
  const { ports } = network
  const wanted = typeof reference === 'number' ? realReference(ports, reference) : reference
  if (wanted.length !== 2 * ports) throw new RangeError(`${wanted.length / 2} references for ${ports} ports.`)
  const mixtures = new Float64Array(MIXTURE * ports)
  let same = true
  for (let port = 0; port < ports; port++) {
    const oldR = network.reference[2 * port] as number
    const oldI = network.reference[2 * port + 1] as number
    const newR = wanted[2 * port] as number
    const newI = wanted[2 * port + 1] as number
    if (!(oldR > 0 && newR > 0)) throw new RangeError('A reference must have a positive real part.')
    same &&= oldR === newR && oldI === newI
    if (waves === 'power') powerMixture(mixtures, MIXTURE * port, oldR, oldI, newR, newI)
    else otherMixture(mixtures, MIXTURE * port, oldR, oldI, newR, newI, waves)
  }
  if (same) return network
  return { ...network, s: mixPorts(network.s, ports, mixtures).matrices, reference: wanted }
}

function realReference(ports: number, ohm: number): Float64Array {
  const reference = new Float64Array(2 * ports)
  for (let port = 0; port < ports; port++) reference[2 * port] = ohm
  return reference
}

/** a' = [(Z* + Z')·a + (Z − Z')·b]/2√(Re Z·Re Z') and b' = [(Z* − Z'*)·a + (Z + Z'*)·b]/2√(Re Z·Re Z'). */
function powerMixture(out: Float64Array, at: number, r: number, x: number, newR: number, newX: number): void {
  const scale = 1 / (2 * Math.sqrt(r * newR))
  out[at] = out[at + 6] = scale * (r + newR)
  out[at + 2] = out[at + 4] = scale * (r - newR)
  out[at + 1] = out[at + 5] = scale * (newX - x)
  out[at + 3] = out[at + 7] = scale * (x - newX)
}

/** a' = k·[(1 + Z'/Z)·a + (1 − Z'/Z)·b]/2 and b' with the signs changed; k = |Z|/|Z'|·√(Re Z'/Re Z), or √Z/√Z'. */
function otherMixture(
  out: Float64Array,
  at: number,
  r: number,
  x: number,
  newR: number,
  newX: number,
  waves: 'pseudo' | 'travelling',
): void {
  const square = r * r + x * x
  const newSquare = newR * newR + newX * newX
  const ratioR = (newR * r + newX * x) / square
  const ratioI = (newX * r - newR * x) / square
  let kr = Math.sqrt((square * newR) / (newSquare * r)) / 2
  let ki = 0
  if (waves === 'travelling') {
    const size = Math.sqrt(Math.sqrt(square / newSquare)) / 2
    const angle = (Math.atan2(x, r) - Math.atan2(newX, newR)) / 2
    kr = size * Math.cos(angle)
    ki = size * Math.sin(angle)
  }
  out[at] = out[at + 6] = kr * (1 + ratioR) - ki * ratioI
  out[at + 1] = out[at + 7] = kr * ratioI + ki * (1 + ratioR)
  out[at + 2] = out[at + 4] = kr * (1 - ratioR) + ki * ratioI
  out[at + 3] = out[at + 5] = ki * (1 - ratioR) - kr * ratioI
}
