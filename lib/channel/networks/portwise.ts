import { solve } from './matrix'

/** Numbers that one port's mixture takes: p, q, r, t, real and imaginary part side by side. */
export const MIXTURE = 8

/**
 * Other quantities of the same ports: at every port x = p·a + q·b and y = r·a + t·b are mixtures of its waves into (a) and out of (b)
 * the network. As b = S·a, y = (R + T·S)·(P + Q·S)⁻¹·x. Renormalisation and the conversions to and from impedances and admittances
 * are all of this form, so none goes through another that may not exist.
 * @param s [frequency][row][column], 2·ports² numbers a frequency
 * @param mixtures p, q, r, t of each port, {@link MIXTURE} numbers a port
 * @returns `matrices`: what turns x into y, shaped like s; `without`: the first frequency (its index) where there is none, whose
 *   numbers are NaN, or −1
 */
export function mixPorts(
  s: Float64Array,
  ports: number,
  mixtures: Float64Array,
): { matrices: Float64Array; without: number } {
  const size = 2 * ports * ports
  const matrices = new Float64Array(s.length)
  const divisor = new Float64Array(size)
  const dividend = new Float64Array(size)
  let without = -1
  for (let base = 0; base < s.length; base += size) {
    // Both transposed: N·M⁻¹ is the transpose of the solution of Mᵀ·X = Nᵀ.
    for (let row = 0; row < ports; row++)
      for (let column = 0; column < ports; column++) {
        const from = base + 2 * (row * ports + column)
        const to = 2 * (column * ports + row)
        mix(divisor, to, mixtures, row * MIXTURE, row === column, s[from] as number, s[from + 1] as number)
        mix(dividend, to, mixtures, row * MIXTURE + 4, row === column, s[from] as number, s[from + 1] as number)
      }
    if (!solve(divisor, dividend, ports, ports)) {
      if (without < 0) without = base / size
      dividend.fill(Number.NaN)
    }
    for (let row = 0; row < ports; row++)
      for (let column = 0; column < ports; column++) {
        const from = 2 * (column * ports + row)
        const to = base + 2 * (row * ports + column)
        matrices[to] = dividend[from] as number
        matrices[to + 1] = dividend[from + 1] as number
      }
  }
  return { matrices, without }
}

/** One element of P + Q·S, or of R + T·S. */
function mix(
  out: Float64Array,
  to: number,
  mixtures: Float64Array,
  port: number,
  diagonal: boolean,
  re: number,
  im: number,
): void {
  const qr = mixtures[port + 2] as number
  const qi = mixtures[port + 3] as number
  out[to] = qr * re - qi * im + (diagonal ? (mixtures[port] as number) : 0)
  out[to + 1] = qr * im + qi * re + (diagonal ? (mixtures[port + 1] as number) : 0)
}
