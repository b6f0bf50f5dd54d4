import type { Network } from './network'
import { MIXTURE, mixPorts } from './portwise'
import { type Refusal, refusedAt } from './refusal'

/**
 * Impedance and admittance matrices of a network and back, at complex references of each port: v = (Z0*·a + Z0·b)/√Re Z0 and
 * i = (a − b)/√Re Z0 (Kurokawa, IEEE Trans. MTT 13(2), 1965; for two ports the same as D. Frickey, IEEE Trans. MTT 42(2), 1994).
 * Shapes are those of Network.s; Ω and S. A matrix that does not exist is refused: an ideal through has neither of the two.
 */
export function impedanceOf(network: Network): Float64Array | Refusal {
  const mixtures = mixturesOf(network.reference, (out, at, r, x) => {
    current(out, at, r)
    voltage(out, at + 4, r, x)
  })
  return allOrReason(network.hz, mixPorts(network.s, network.ports, mixtures), 'the network has no impedance matrix')
}

/** See {@link impedanceOf}; S. */
export function admittanceOf(network: Network): Float64Array | Refusal {
  const mixtures = mixturesOf(network.reference, (out, at, r, x) => {
    voltage(out, at, r, x)
    current(out, at + 4, r)
  })
  return allOrReason(network.hz, mixPorts(network.s, network.ports, mixtures), 'the network has no admittance matrix')
}

/**
 * @param z Ω, [frequency][row][column]
 * @param reference Ω of each port, real and imaginary part side by side
 */
export function fromImpedance(hz: Float64Array, z: Float64Array, reference: Float64Array): Network | Refusal {
  const mixtures = mixturesOf(reference, (out, at, r, x) => {
    const scale = 1 / (2 * Math.sqrt(r))
    out.set([scale * r, scale * x, scale, 0, -scale * r, scale * x, scale, 0], at)
  })
  return asNetwork(hz, z, reference, mixtures)
}

/** @param y S, [frequency][row][column]; @param reference as in {@link fromImpedance} */
export function fromAdmittance(hz: Float64Array, y: Float64Array, reference: Float64Array): Network | Refusal {
  const mixtures = mixturesOf(reference, (out, at, r, x) => {
    const scale = 1 / (2 * Math.sqrt(r))
    out.set([scale, 0, scale * r, scale * x, scale, 0, -scale * r, scale * x], at)
  })
  return asNetwork(hz, y, reference, mixtures)
}

function mixturesOf(
  reference: Float64Array,
  write: (out: Float64Array, at: number, r: number, x: number) => void,
): Float64Array {
  const mixtures = new Float64Array((MIXTURE * reference.length) / 2)
  for (let port = 0; 2 * port < reference.length; port++)
    write(mixtures, MIXTURE * port, reference[2 * port] as number, reference[2 * port + 1] as number)
  return mixtures
}

function voltage(out: Float64Array, at: number, r: number, x: number): void {
  const scale = 1 / Math.sqrt(r)
  out.set([scale * r, -scale * x, scale * r, scale * x], at)
}

function current(out: Float64Array, at: number, r: number): void {
  const scale = 1 / Math.sqrt(r)
  out.set([scale, 0, -scale, 0], at)
}

function asNetwork(
  hz: Float64Array,
  given: Float64Array,
  reference: Float64Array,
  mixtures: Float64Array,
): Network | Refusal {
  const ports = reference.length / 2
  const s = allOrReason(hz, mixPorts(given, ports, mixtures), 'the matrix describes no network')
  return 'reason' in s ? s : { ports, hz, s, reference }
}

function allOrReason(
  hz: Float64Array,
  { matrices, without }: ReturnType<typeof mixPorts>,
  why: string,
): Float64Array | Refusal {
  return without < 0 ? matrices : refusedAt(hz[without] ?? 0, why)
}
