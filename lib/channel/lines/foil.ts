import type { Roughness } from '../materials/roughness'
import { skinDepth, surfaceResistance } from '../materials/skinEffect'
import type { CrossSection } from './crossSection'

/** From here on the metal is thick to 12 digits. */
const THICK = 14

export type Metal = {
  /** S/m. */
  readonly conductivity: number
  readonly roughness: Roughness
}

/**
 * Series resistance and internal reactance of the conductors, Ω/m. With ξ = Rs·crowding/Rdc the law of a foil whose current
 * enters from both faces, R + jX = Rdc·(1 + j)ξ·coth((1 + j)ξ) (Dowell, Proc. IEE 113(8), 1966), scaled so that both its
 * limits are those of this cross-section: Rdc at 0 Hz, (1 + j)·Rs·crowding where the skin is thin. It is causal, R is never
 * under Rdc, and between them (a thickness of 1 to 3 skin depths) it may be off by some 10 % of R. What roughness adds is added to
 * the thin-skin part, as the foil's law is one of smooth metal.
 * @param resistance filled with R
 * @param reactance filled with X
 */
export function foilImpedance(
  { crowding, area }: Pick<CrossSection, 'crowding' | 'area'>,
  { conductivity, roughness }: Metal,
  hz: Float64Array,
  resistance: Float64Array,
  reactance: Float64Array,
): void {
  const direct = 1 / (conductivity * area)
  const surface = surfaceResistance(conductivity, 1) * crowding
  const depth = skinDepth(conductivity, 1)
  for (let i = 0; i < hz.length; i++) {
    const root = Math.sqrt(hz[i] as number)
    const thin = surface * root
    const xi = thin / direct
    const delta = depth / root
    let real = 1
    let imaginary = 1
    if (xi < THICK) {
      const grown = Math.exp(2 * xi)
      const [sinh, cosh] = [(grown - 1 / grown) / 2, (grown + 1 / grown) / 2]
      const [sine, cosine] = [Math.sin(2 * xi), Math.cos(2 * xi)]
      real = (sinh + sine) / (cosh - cosine)
      imaginary = (sinh - sine) / (cosh - cosine)
    }
    resistance[i] = thin * (real + roughness.resistance(delta) - 1)
    reactance[i] = thin * (imaginary + roughness.reactance(delta) - 1)
  }
}
