/**
 * What a rough foil multiplies the surface resistance and the surface reactance of smooth metal by, each a function of the
 * skin depth in m. Both are 1 where the skin is much thicker than the foil is rough.
 */
export type Roughness = {
  readonly resistance: (skinDepth: number) => number
  readonly reactance: (skinDepth: number) => number
}

const one = () => 1

export const SMOOTH: Roughness = { resistance: one, reactance: one }

/** One multiplier for both parts: not strictly causal, which costs a small error of phase and none of loss. */
const real = (factor: (skinDepth: number) => number): Roughness => ({ resistance: factor, reactance: factor })

/**
 * K = 1 + (2/π) atan(1.4 (Rq/δ)²) (Hammerstad and Jensen, IEEE MTT-S 1980, after Morgan 1949). Never more than 2; fair to
 * 5 … 10 GHz and Rq up to 2 µm, too low on rough foils above.
 * @param rq m, root mean square height
 */
export function hammerstad(rq: number): Roughness {
  return real((skinDepth) => 1 + (2 / Math.PI) * Math.atan(1.4 * (rq / skinDepth) ** 2))
}

/**
 * K = 1 + exp(−(δ/(2 Rq))^1.6) (Groiss, Bardi, Biro, Preis, Richter, IEEE Trans. Magn. 32(3), 1996; from memory). Never more than 2.
 * @param rq m, root mean square height, above 0
 */
export function groiss(rq: number): Roughness {
  return real((skinDepth) => 1 + Math.exp(-((skinDepth / (2 * rq)) ** 1.6)))
}

/** Spheres of one size on a foil: their radius in m, and the surface of all of them over the flat area below. */
export type Nodules = { readonly radius: number; readonly areaRatio: number }

/**
 * Huray's snowballs (The Foundations of Signal Integrity, 2009; from memory): K = base + (3/2) Σ ratio/(1 + δ/a + δ²/(2a²)).
 * With x = δ/(2a) the sum's denominator is |1 + (1 − j)x|², so that Rs·K is the real part of the causal impedance
 * (1 + j)·Rs·[base + (3/2) Σ ratio/(1 + (1 − j)x)], a function of √(jω) alone; its imaginary part has 1 + 2x above the
 * same denominator.
 * @param base area of the foil without spheres over the flat area, 1 or more
 */
export function huray(base: number, nodules: readonly Nodules[]): Roughness {
  const some = nodules.filter(({ radius }) => radius > 0)
  const sum = (skinDepth: number, reactive: number) => {
    let factor = base
    for (const { radius, areaRatio } of some) {
      const ratio = skinDepth / radius
      factor += (1.5 * areaRatio * (1 + reactive * ratio)) / (1 + ratio + (ratio * ratio) / 2)
    }
    return factor
  }
  return { resistance: (skinDepth) => sum(skinDepth, 0), reactance: (skinDepth) => sum(skinDepth, 1) }
}

/** From memory: 14 equal spheres (9 + 4 + 1) of radius 0.06 Rz on a square of 36 radii². */
const RADIUS_PER_RZ = 0.06
const SPHERE_AREA_RATIO = (14 * 4 * Math.PI) / 36

/**
 * Cannonball stack: Huray's spheres with what the data sheet's Rz alone gives (Simonovich, DesignCon 2015; factors from memory).
 * @param rz m, ten-point height
 */
export function cannonball(rz: number): Roughness {
  return huray(1, [{ radius: RADIUS_PER_RZ * rz, areaRatio: SPHERE_AREA_RATIO }])
}

/** Root mean square height from ten-point height, a rough conversion from memory: between Rz/4 and Rz/6. */
export function rqOfRz(rz: number): number {
  return rz / 5
}
