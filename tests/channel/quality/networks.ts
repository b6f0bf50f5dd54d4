import { lineTwoPort } from '../../../lib/channel/lines/lineTwoPort'
import { type Network, network } from '../../../lib/channel/networks/network'

/** Frequencies 1 to count times the step. */
export const multiples = (count: number, step: number) => Float64Array.from({ length: count }, (_, i) => (i + 1) * step)

/** A causal line: wideband √f loss with the phase that belongs to it, γ = a(1+j)√f + jωτ, and 60 Ω. */
export function causalLine(hz: Float64Array, { length = 0.1, ohm = 60, reference = 50 } = {}): Network {
  const alpha = hz.map((f) => 2 * Math.sqrt(f / 1e10))
  const beta = hz.map((f, i) => 2 * Math.PI * f * 6e-9 + (alpha[i] ?? 0))
  const line = { alpha, beta, zRe: hz.map(() => ohm), zIm: hz.map(() => 0) }
  return network(2, hz, lineTwoPort(line, length, reference), reference)
}

/** Run backwards in time: the complex conjugate of S. */
export const reversed = (forward: Network): Network => ({
  ...forward,
  s: forward.s.map((value, i) => (i % 2 ? -value : value)),
})
