import type { Network } from './network'
import { renormalise } from './renormalise'

/** The + and the − port of a pair, from 0. */
export type Pair = readonly [plus: number, minus: number]

/**
 * Single-ended ports in pairs as differential and common mode: d = (plus − minus)/√2, c = (plus + minus)/√2 for both waves, so that
 * S = M·S·Mᵀ with an orthonormal M (Bockelman and Eisenstadt, IEEE Trans. MTT 43(7), 1995). Of a pair at Z0 the differential reference
 * is 2·Z0, the common Z0/2; a pair at two references is first brought to that of its + port.
 * @param pairs every port in exactly one
 * @returns ports in the order d1 … dN, c1 … cN
 * @throws RangeError for pairs that leave a port out or take one twice
 */
export function mixedMode(network: Network, pairs: readonly Pair[]): Network {
  const order = inOrder(network, pairs)
  const reference = network.reference.slice()
  for (const [plus, minus] of pairs) {
    reference[2 * minus] = reference[2 * plus] as number
    reference[2 * minus + 1] = reference[2 * plus + 1] as number
  }
  const even = renormalise(network, reference)
  const modes = new Float64Array(reference.length)
  for (const [k, [plus]] of pairs.entries())
    for (const part of [0, 1]) {
      modes[2 * k + part] = 2 * (reference[2 * plus + part] as number)
      modes[2 * (pairs.length + k) + part] = (reference[2 * plus + part] as number) / 2
    }
  const { s, hz, ports } = network
  return { ports, hz, reference: modes, s: rotate(even.s, new Float64Array(s.length), ports, order, 'toModes') }
}

/** The inverse of {@link mixedMode}: ports d1 … dN, c1 … cN back to those of the pairs; Z0 is half the differential reference. */
export function singleEnded(network: Network, pairs: readonly Pair[]): Network {
  const order = inOrder(network, pairs)
  const reference = new Float64Array(network.reference.length)
  const modes = network.reference.slice()
  for (const [k, [plus, minus]] of pairs.entries())
    for (const part of [0, 1]) {
      const differential = modes[2 * k + part] as number
      modes[2 * (pairs.length + k) + part] = differential / 4
      reference[2 * plus + part] = reference[2 * minus + part] = differential / 2
    }
  const { s, hz, ports } = network
  const even = renormalise(network, modes)
  return { ports, hz, reference, s: rotate(even.s, new Float64Array(s.length), ports, order, 'toPorts') }
}

/** The + ports of all pairs, then the − ports. */
function inOrder(network: Network, pairs: readonly Pair[]): Int32Array {
  const order = [...pairs.map(([plus]) => plus), ...pairs.map(([, minus]) => minus)]
  const all = new Set(order.filter((port) => Number.isInteger(port) && port >= 0 && port < network.ports))
  if (order.length !== network.ports || all.size !== network.ports)
    throw new RangeError(`${pairs.length} pairs that do not hold each of ${network.ports} ports once.`)
  return Int32Array.from(order)
}

/**
 * Of each pair of pairs the 2×2 block [++ +−; −+ −−] becomes [dd dc; cd cc] or back: M·block·Mᵀ. The rows and columns of the ports are
 * where `order` says, those of the modes in order.
 */
function rotate(
  s: Float64Array,
  out: Float64Array,
  ports: number,
  order: Int32Array,
  way: 'toModes' | 'toPorts',
): Float64Array {
  const n = ports / 2
  const size = 2 * ports * ports
  const toModes = way === 'toModes'
  for (let i = 0; i < n; i++)
    for (let j = 0; j < n; j++) {
      const i1 = order[i] as number
      const i2 = order[n + i] as number
      const j1 = order[j] as number
      const j2 = order[n + j] as number
      const block = [i1 * ports + j1, i1 * ports + j2, i2 * ports + j1, i2 * ports + j2]
      const modes = [i * ports + j, i * ports + n + j, (n + i) * ports + j, (n + i) * ports + n + j]
      const [f11 = 0, f12 = 0, f21 = 0, f22 = 0] = toModes ? block : modes
      const [t11 = 0, t12 = 0, t21 = 0, t22 = 0] = toModes ? modes : block
      // M is [1 −1; 1 1]/√2 to the modes and its transpose back.
      const sign = toModes ? 1 : -1
      for (let base = 0; base < s.length; base += size)
        for (let part = base; part < base + 2; part++) {
          const a = s[part + 2 * f11] as number
          const b = sign * (s[part + 2 * f12] as number)
          const c = sign * (s[part + 2 * f21] as number)
          const d = s[part + 2 * f22] as number
          out[part + 2 * t11] = (a - b - c + d) / 2
          out[part + 2 * t12] = (sign * (a + b - c - d)) / 2
          out[part + 2 * t21] = (sign * (a - b + c - d)) / 2
          out[part + 2 * t22] = (a + b + c + d) / 2
        }
    }
  return out
}
