/** The cascade as short and plain as it can be said, one object per complex number: what the fast one is checked and timed against. */
type Complex = { readonly re: number; readonly im: number }
type TwoPort = readonly [s11: Complex, s12: Complex, s21: Complex, s22: Complex]

const add = (x: Complex, y: Complex): Complex => ({ re: x.re + y.re, im: x.im + y.im })
const times = (x: Complex, y: Complex): Complex => ({ re: x.re * y.re - x.im * y.im, im: x.re * y.im + x.im * y.re })
const inverse = (x: Complex): Complex => {
  const square = x.re * x.re + x.im * x.im
  return { re: x.re / square, im: -x.im / square }
}
const product = (...factors: Complex[]): Complex => factors.reduce(times)

/** Redheffer's star product: what is reflected back and forth at the join sums to 1/(1 − S22a·S11b). */
function join([a11, a12, a21, a22]: TwoPort, [b11, b12, b21, b22]: TwoPort): TwoPort {
  const echoes = inverse(add({ re: 1, im: 0 }, times({ re: -1, im: 0 }, times(a22, b11))))
  return [
    add(a11, product(a12, b11, a21, echoes)),
    product(a12, b12, echoes),
    product(a21, b21, echoes),
    add(b22, product(b21, a22, b12, echoes)),
  ]
}

const at = (samples: Float64Array, point: number): TwoPort => {
  const s = (k: number): Complex => ({ re: samples[8 * point + 2 * k] ?? 0, im: samples[8 * point + 2 * k + 1] ?? 0 })
  return [s(0), s(1), s(2), s(3)]
}

/** @returns S11, S12, S21, S22 of the chain, real and imaginary part side by side, at each of `count` frequencies */
export function clearCascade(chain: readonly Float64Array[], count: number): Float64Array {
  const points = Array.from({ length: count }, (_, point) => chain.map((samples) => at(samples, point)).reduce(join))
  return Float64Array.from(points.flatMap((twoPort) => twoPort.flatMap(({ re, im }) => [re, im])))
}
