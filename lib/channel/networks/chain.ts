import { multiply } from './matrix'
import { type Network, TWO_PORT } from './network'
import { type Refusal, refusedAt } from './refusal'

/**
 * Transfer (T) and ABCD matrices of two-ports and back, for conversion and display; a chain is computed by cascade(). T is
 * [a1; b1] = T·[b2; a2], with the wave that goes in on the left (other books use [b1; a1] = T·[a2; b2]); ABCD is
 * [v1; i1] = ABCD·[v2; −i2]. D. Frickey, IEEE Trans. MTT 42(2), 1994, at complex references of both ports (power waves).
 * Shapes: 8 numbers a frequency, the four elements row by row, real and imaginary part side by side. Refused where S21 is 0, for
 * then neither matrix exists.
 * @throws RangeError for a network that is no two-port
 */
export function transferOf(network: Network): Float64Array | Refusal {
  if (network.ports !== 2) throw new RangeError(`A transfer matrix of ${network.ports} ports.`)
  const { s, hz } = network
  const t = new Float64Array(s.length)
  for (let k = 0; k < s.length; k += TWO_PORT) {
    const s11r = s[k] as number
    const s11i = s[k + 1] as number
    const s12r = s[k + 2] as number
    const s12i = s[k + 3] as number
    const s21r = s[k + 4] as number
    const s21i = s[k + 5] as number
    const s22r = s[k + 6] as number
    const s22i = s[k + 7] as number
    const square = s21r * s21r + s21i * s21i
    if (!(square > 0)) return refusedAt(hz[k / TWO_PORT] ?? 0, 'S21 is 0: such a two-port has no T and no ABCD matrix')
    const r = s21r / square
    const i = -s21i / square
    t[k] = r
    t[k + 1] = i
    t[k + 2] = -(s22r * r - s22i * i)
    t[k + 3] = -(s22r * i + s22i * r)
    const t21r = s11r * r - s11i * i
    const t21i = s11r * i + s11i * r
    t[k + 4] = t21r
    t[k + 5] = t21i
    t[k + 6] = s12r - (s22r * t21r - s22i * t21i)
    t[k + 7] = s12i - (s22r * t21i + s22i * t21r)
  }
  return t
}

/** @param reference Ω of both ports, real and imaginary part side by side */
export function fromTransfer(hz: Float64Array, t: Float64Array, reference: Float64Array): Network | Refusal {
  const s = new Float64Array(t.length)
  for (let k = 0; k < t.length; k += TWO_PORT) {
    const t11r = t[k] as number
    const t11i = t[k + 1] as number
    const t12r = t[k + 2] as number
    const t12i = t[k + 3] as number
    const t21r = t[k + 4] as number
    const t21i = t[k + 5] as number
    const square = t11r * t11r + t11i * t11i
    if (!(square > 0)) return refusedAt(hz[k / TWO_PORT] ?? 0, 'the matrix describes no network')
    const r = t11r / square
    const i = -t11i / square
    const s11r = t21r * r - t21i * i
    const s11i = t21r * i + t21i * r
    s[k] = s11r
    s[k + 1] = s11i
    s[k + 2] = (t[k + 6] as number) - (s11r * t12r - s11i * t12i)
    s[k + 3] = (t[k + 7] as number) - (s11r * t12i + s11i * t12r)
    s[k + 4] = r
    s[k + 5] = i
    s[k + 6] = -(t12r * r - t12i * i)
    s[k + 7] = -(t12r * i + t12i * r)
  }
  return { ports: 2, hz, s, reference }
}

/** ABCD matrices: A and D are numbers, B is in Ω, C in S; see {@link transferOf}. */
export function chainOf(network: Network): Float64Array | Refusal {
  const t = transferOf(network)
  if ('reason' in t) return t
  const [r1 = 0, x1 = 0, r2 = 0, x2 = 0] = network.reference
  const scale = 1 / (2 * Math.sqrt(r1 * r2))
  const left = Float64Array.of(scale * r1, -scale * x1, scale * r1, scale * x1, scale, 0, -scale, 0)
  const right = Float64Array.of(1, 0, r2, -x2, 1, 0, -r2, -x2)
  return between(left, t, right)
}

/** @param abcd see {@link chainOf}; @param reference Ω of both ports, real and imaginary part side by side */
export function fromChain(hz: Float64Array, abcd: Float64Array, reference: Float64Array): Network | Refusal {
  const [r1 = 0, x1 = 0, r2 = 0, x2 = 0] = reference
  const scale = 1 / (2 * Math.sqrt(r1 * r2))
  const left = Float64Array.of(scale, 0, scale * r1, scale * x1, scale, 0, -scale * r1, scale * x1)
  const right = Float64Array.of(r2, x2, r2, -x2, 1, 0, -1, 0)
  return fromTransfer(hz, between(left, abcd, right), reference)
}

/** left·matrix·right at every frequency. */
function between(left: Float64Array, matrices: Float64Array, right: Float64Array): Float64Array {
  const product = new Float64Array(matrices.length)
  const one = new Float64Array(TWO_PORT)
  const half = new Float64Array(TWO_PORT)
  const whole = new Float64Array(TWO_PORT)
  for (let k = 0; k < matrices.length; k += TWO_PORT) {
    for (let part = 0; part < TWO_PORT; part++) one[part] = matrices[k + part] as number
    multiply(left, one, half, 2, 2)
    multiply(half, right, whole, 2, 2)
    product.set(whole, k)
  }
  return product
}
