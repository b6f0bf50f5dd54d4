import { type Network, TWO_PORT } from '../networks/network'

/** Hz. A file that starts above says nothing about its low end. */
const LOW_START = 1e8
/** Hz. Up to here a passive line loses by √f and little else. */
const LOW_END = 5e8
const FEWEST = 4

/**
 * What is left of the loss of S21 towards 0 Hz: the constant of a least-squares fit a + b √f over the points up to 500 MHz. A
 * contact, an attenuator or a fixture that was taken out wrongly leaves a constant; skin effect does not, however long the line.
 * It serves a suspicion and is the loss of nothing (common practice, no source).
 * @returns dB, or null where the file starts above 100 MHz or has fewer than four points up to 500 MHz
 */
export function lowEndLoss({ hz, s }: Network): number | null {
  let [n, sumX, sumY, sumXX, sumXY] = [0, 0, 0, 0, 0]
  for (let k = 0; k < hz.length && (hz[k] as number) <= LOW_END; k++) {
    const at = TWO_PORT * k + 4
    const x = Math.sqrt(hz[k] as number)
    const y = -20 * Math.log10(Math.hypot(s[at] as number, s[at + 1] as number))
    if (!Number.isFinite(y)) continue
    n++
    sumX += x
    sumY += y
    sumXX += x * x
    sumXY += x * y
  }
  if (n < FEWEST || (hz[0] as number) > LOW_START) return null
  return (sumY * sumXX - sumX * sumXY) / (n * sumXX - sumX * sumX)
}
