/**
 * Sampled S-parameters of a linear network: power waves (Kurokawa, IEEE Trans. MTT 13(2), 1965), so that |S| of a passive
 * network is at most 1 at every real or complex reference.
 */
export type Network = {
  readonly ports: number
  /** Hz, strictly rising; 0 is allowed as the first. */
  readonly hz: Float64Array
  /** Real and imaginary part side by side: [frequency][receiving port][driven port], 2·ports² numbers a frequency. */
  readonly s: Float64Array
  /** Ω of each port, real and imaginary part side by side; the same at all frequencies. */
  readonly reference: Float64Array
}

/** Numbers that one frequency of a two-port takes: S11, S12, S21, S22, real and imaginary part side by side. */
export const TWO_PORT = 8

/** A network whose ports all have one real reference. */
export function network(ports: number, hz: Float64Array, s: Float64Array, referenceOhm: number): Network {
  const reference = new Float64Array(2 * ports)
  for (let port = 0; port < ports; port++) reference[2 * port] = referenceOhm
  return { ports, hz, s, reference }
}
