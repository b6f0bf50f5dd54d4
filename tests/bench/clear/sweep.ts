/** A channel over frequency as short and plain as it can be said, one object per complex number: lines and pads in a row. */
type Complex = { readonly re: number; readonly im: number }

/** A line: √f and f terms in dB/m at 1 GHz, s/m, Ω and m; a pad: farad of each conductor. */
export type ClearPiece =
  | {
      readonly root: number
      readonly linear: number
      readonly delay: number
      readonly z: number
      readonly length: number
    }
  | { readonly farad: number }
type Chain = readonly [a: Complex, b: Complex, c: Complex, d: Complex]

const add = (x: Complex, y: Complex): Complex => ({ re: x.re + y.re, im: x.im + y.im })
const times = (x: Complex, y: Complex): Complex => ({ re: x.re * y.re - x.im * y.im, im: x.re * y.im + x.im * y.re })
const scaled = (x: Complex, by: number): Complex => ({ re: x.re * by, im: x.im * by })
const join = ([a, b, c, d]: Chain, [e, f, g, h]: Chain): Chain => [
  add(times(a, e), times(b, g)),
  add(times(a, f), times(b, h)),
  add(times(c, e), times(d, g)),
  add(times(c, f), times(d, h)),
]

/** cosh γl, Z sinh γl, sinh γl/Z: exact for a short, mildly lossy chain, where a chain of ABCD loses no digits yet. */
function chainOf(piece: ClearPiece, hz: number): Chain {
  const one = { re: 1, im: 0 }
  if ('farad' in piece) return [one, { re: 0, im: 0 }, { re: 0, im: Math.PI * hz * piece.farad }, one]
  const ghz = hz / 1e9
  const alpha = ((piece.root * Math.sqrt(ghz) + piece.linear * ghz) * piece.length * Math.LN10) / 20
  const beta = 2 * Math.PI * hz * piece.delay * piece.length
  const cosh = { re: Math.cosh(alpha) * Math.cos(beta), im: Math.sinh(alpha) * Math.sin(beta) }
  const sinh = { re: Math.sinh(alpha) * Math.cos(beta), im: Math.cosh(alpha) * Math.sin(beta) }
  return [cosh, scaled(sinh, piece.z), scaled(sinh, 1 / piece.z), cosh]
}

/** @returns insertion loss in dB at each frequency, in the reference R: −20 log10|2/(A + B/R + C·R + D)| */
export function clearSweep(pieces: readonly ClearPiece[], hz: readonly number[], reference: number): number[] {
  return hz.map((at) => {
    const [a, b, c, d] = pieces.map((piece) => chainOf(piece, at)).reduce(join)
    const whole = add(add(a, d), add(scaled(b, 1 / reference), scaled(c, reference)))
    return 20 * Math.log10(Math.hypot(whole.re, whole.im) / 2)
  })
}
