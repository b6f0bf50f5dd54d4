import { twoTermAttenuation } from './twoTerms'

/** dB/m, from the least lossy of a kind in common use to the lossiest. */
export type Band = { readonly low: number; readonly high: number }

/** Hz. Below, the skin effect is not yet what the laws say. */
const LOWEST = 5e8
const INCH = 0.0254

/**
 * What traces on boards usually lose. Common practice, no source, put together from rules of thumb. Low: 8 mil of smooth
 * copper, 0.065 √f, on an ultra-low-loss laminate (Dk 3.2, Df 0.001: 2.312 √Dk Df = 0.004 f). High: 4 mil, 0.127 √f, on a rough
 * foil (times 1.6), on standard FR-4 (Dk 4.6, Df 0.025: 0.124 f); dB/in, f in GHz. At 10 GHz 0.25 to 1.87 dB/in.
 * @returns null below 0.5 GHz
 */
export function usualTraceLoss(hz: number): Band | null {
  if (hz < LOWEST) return null
  return {
    low: twoTermAttenuation(0.065 / INCH, 0.004 / INCH, hz),
    high: twoTermAttenuation(0.2 / INCH, 0.124 / INCH, hz),
  }
}

/**
 * What the bulk of twin-axial cable usually loses. Common practice, no source: about 2.5 dB/m (24 AWG) to 8.5 dB/m (34 AWG) at
 * 12.89 GHz, and by their √f and f terms elsewhere.
 * @returns null below 0.5 GHz
 */
export function usualCableLoss(hz: number): Band | null {
  if (hz < LOWEST) return null
  return { low: twoTermAttenuation(0.6, 0.03, hz), high: twoTermAttenuation(2, 0.1, hz) }
}
