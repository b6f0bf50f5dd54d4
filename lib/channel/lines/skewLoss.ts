/**
 * Loss of the differential signal when its two halves arrive Δt apart: −20 log10 cos(π f Δt), the sum of two phasors
 * that differ by 2π f Δt.
 * @param skew s, either sign
 * @param hz Hz
 * @returns dB, or null from half a period on, where the differential signal has vanished
 */
export function skewLoss(skew: number, hz: number): number | null {
  const turns = Math.abs(skew) * hz
  if (turns === 0) return 0
  if (turns >= 0.5) return null
  return -20 * Math.log10(Math.cos(Math.PI * turns))
}
