import { insertionLoss } from '../networks/losses'
import { type Network, TWO_PORT } from '../networks/network'
import { tooCoarse, unwrappedPhase } from '../networks/phase'

export type ThroughFacts = {
  /** Hz and dB at the lowest frequency above zero. A plain conductor loses next to nothing there. */
  readonly lowest: { readonly hz: number; readonly lossDb: number }
  /** s, slope of the phase of S21 over the file by least squares; null where points lie a quarter turn apart. */
  readonly delay: number | null
  /** dB by which the upper third of the file loses less than the lower third on average; 0 where it loses more. */
  readonly risesDb: number
}

/**
 * What S21 of a two-port tells about fixtures left in the file or taken out wrongly: loss at the low end, a delay to compare with
 * that of the declared length, a loss that falls with frequency (common practice, no source). Thirds, since a resonance makes
 * any good part rise here and there.
 * @returns null where S21 is zero somewhere, or for fewer than three frequencies above zero
 */
export function throughFacts({ hz, s }: Network): ThroughFacts | null {
  const first = hz[0] === 0 ? 1 : 0
  const above = hz.subarray(first)
  const samples = s.subarray(TWO_PORT * first)
  const count = above.length
  const loss = insertionLoss(samples)
  if (count < 3 || !loss.every(Number.isFinite)) return null
  const third = Math.floor(count / 3)
  return {
    lowest: { hz: above[0] as number, lossDb: loss[0] as number },
    delay: tooCoarse(above, samples) ? null : -slope(above, unwrappedPhase(samples)) / (2 * Math.PI),
    risesDb: Math.max(0, mean(loss.subarray(0, third)) - mean(loss.subarray(count - third))),
  }
}

function mean(values: Float64Array): number {
  let sum = 0
  for (const value of values) sum += value
  return sum / values.length
}

function slope(x: Float64Array, y: Float64Array): number {
  const mx = mean(x)
  const my = mean(y)
  let product = 0
  let square = 0
  for (let i = 0; i < x.length; i++) {
    const dx = (x[i] as number) - mx
    product += dx * ((y[i] as number) - my)
    square += dx * dx
  }
  return product / square
}
