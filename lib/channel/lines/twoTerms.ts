/**
 * Attenuation per length from a √f and an f term, each given at 1 GHz: the form of cable data sheets and of fitted
 * board coupons, a1·√f + a2·f with f in GHz.
 * @param rootTerm dB/m at 1 GHz that grows with √f
 * @param linearTerm dB/m at 1 GHz that grows with f
 * @returns dB/m at hz
 */
export function twoTermAttenuation(rootTerm: number, linearTerm: number, hz: number): number {
  const ghz = hz / 1e9
  return rootTerm * Math.sqrt(ghz) + linearTerm * ghz
}
