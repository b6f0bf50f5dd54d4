/**
 * FOM_ILD, the deviation of an insertion loss weighted by what a transmitter sends and a receiver lets through (IEEE 802.3 Annex 93A,
 * weights from memory): √(mean of W·ILD²), W = sinc²(f/fb) / (1 + (f/ft)⁴) / (1 + (f/fr)⁸), ft = 0.2365/Tt.
 * @param hz Hz, and beside it dB of deviation, evenly spaced
 * @param symbolRate fb in Bd
 * @param riseTime Tt in s, 20 % to 80 % of the transmitter's edge
 * @param receiverCorner fr in Hz, usually 0.75 fb
 * @returns dB
 */
export function weightedDeviation(
  hz: Float64Array,
  deviation: Float64Array,
  { symbolRate, riseTime, receiverCorner }: { symbolRate: number; riseTime: number; receiverCorner: number },
): number {
  const transmitterCorner = 0.2365 / riseTime
  let sum = 0
  for (let i = 0; i < hz.length; i++) {
    const f = hz[i] as number
    const angle = (Math.PI * f) / symbolRate
    const sinc = f === 0 ? 1 : Math.sin(angle) / angle
    const weighted = (deviation[i] as number) * sinc
    sum += (weighted * weighted) / ((1 + (f / transmitterCorner) ** 4) * (1 + (f / receiverCorner) ** 8))
  }
  return Math.sqrt(sum / hz.length)
}
