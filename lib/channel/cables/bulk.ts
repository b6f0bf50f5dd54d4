/** dB/m at 1 GHz that grow with √f, with f and with f². */
export type CableTerms = { readonly root: number; readonly linear: number; readonly square: number }

/**
 * Attenuation of a cable's bulk, k1·√f + k2·f + k3·f² with f in GHz: the form that cable data sheets are fitted with.
 * @returns dB/m at each frequency
 */
export function bulkAttenuation({ root, linear, square }: CableTerms, hz: Float64Array): Float64Array {
  const db = new Float64Array(hz.length)
  for (let i = 0; i < hz.length; i++) {
    const ghz = (hz[i] as number) / 1e9
    db[i] = root * Math.sqrt(ghz) + linear * ghz + square * ghz * ghz
  }
  return db
}
