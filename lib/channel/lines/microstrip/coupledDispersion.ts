/**
 * Effective permittivity of the odd mode of a coupled microstrip over frequency: Kirschning and Jansen, IEEE Trans. MTT 32(1),
 * 1984 (from memory), whose weaker dispersion of the odd mode becomes that of the single line where the gap is wide.
 * @param u width/height
 * @param g gap/height
 * @param height m
 * @param nominal relative permittivity that the factors are taken at: they hardly feel how it moves over frequency
 */
export function coupledDispersion(u: number, g: number, height: number, nominal: number) {
  const base = 0.27488 - 0.065683 * Math.exp(-8.7513 * u) + 0.6315 * u
  const scale = 0.33622 * (1 - Math.exp(-0.03442 * nominal))
  const high = 0.0363 * Math.exp(-4.6 * u) * (1 + 2.751 * (1 - Math.exp(-((nominal / 15.916) ** 8))))
  const p8 = 0.7168 * (1 + 1.076 / (1 + 0.0576 * (nominal - 1)))
  const falling = 0.7913 * Math.atan(2.481 * (nominal / 8) ** 0.946)
  const p10 = 0.242 * (nominal - 1) ** 0.55
  const narrow = 0.6366 * Math.atan(1.263 * (u / 3) ** 1.629)
  const share = 1 / (1 + 1.183 * u ** 1.376)
  const nearness = 0.8928 * Math.exp(-((1.695 * p10) / (0.414 + 1.605 * p10)) * g ** 1.092)
  return (effective: number, dielectric: number, hz: number): number => {
    const fn = hz * height * 1e-6
    const width = base + (0.525 * u) / (1 + 0.0157 * fn) ** 20
    const slope = 0.1844 + high * (1 - Math.exp(-((fn / 38.7) ** 4.97)))
    const p9 = p8 - falling * (1 - Math.exp(-((fn / 20) ** 1.424)))
    const p11 = narrow * (Math.exp(-0.3401 * fn) - 1)
    const p12 = p9 + (1 - p9) * share
    const p14 = 0.8928 + 0.1072 * (1 - Math.exp(-0.42 * (fn / 20) ** 3.215))
    const p15 = Math.abs(1 - (nearness * (1 + p11) * p12) / p14)
    const p = width * scale * (slope * fn * p15) ** 1.5763
    return dielectric - (dielectric - effective) / (1 + p)
  }
}

/** Hz · m up to which it holds (from memory): 25 GHz · mm. */
export const COUPLED_DISPERSION_LIMIT = 25e6
