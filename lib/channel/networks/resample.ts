import { formatScaled } from '../units'
import type { Network } from './network'
import type { Refusal } from './refusal'

/**
 * A network at other frequencies. Between two points the magnitude and the unwrapped phase of each parameter are linear in frequency: a
 * straight line between the complex numbers cuts off the arc that a delay turns, a loss that is not there. (Where the loss changes by Δ
 * dB from point to point, linear in magnitude is up to Δ²/70 dB under linear in dB; but reflections grow from zero, which has no dB.)
 * Where two points lie a quarter turn or more apart it does go straight: so a reflection passes its null, whose phase jumps.
 * Whether the points of a through lie close enough says tooCoarse(). Exact on the points; nothing outside of them.
 * @param hz Hz, in any order
 */
export function resample(network: Network, hz: Float64Array): Network | Refusal {
  const first = network.hz[0]
  const last = network.hz.at(-1)
  if (first === undefined || last === undefined) return { reason: 'The file has no frequencies.' }
  const outside = hz.find((f) => !(f >= first && f <= last))
  if (outside !== undefined)
    return {
      reason: `The data run from ${frequency(first)} to ${frequency(last)}; ${frequency(outside)} lies outside.`,
    }
  const size = 2 * network.ports ** 2
  const s = new Float64Array(size * hz.length)
  for (let k = 0; k < hz.length; k++) {
    const f = hz[k] as number
    const low = pointBelow(network.hz, f)
    const below = network.hz[low] as number
    const share = f === below ? 0 : (f - below) / ((network.hz[low + 1] as number) - below)
    for (let part = 0; part < size; part += 2) between(network.s, low * size + part, size, share, s, k * size + part)
  }
  return { ...network, hz, s }
}

/** The index of the last point that is not above f. */
function pointBelow(points: Float64Array, f: number): number {
  let low = 0
  let high = points.length
  while (high - low > 1) {
    const middle = (low + high) >> 1
    if ((points[middle] as number) <= f) low = middle
    else high = middle
  }
  return low
}

/** One parameter at a share from 0 to 1 of the way from point `at` to the next. */
function between(s: Float64Array, at: number, size: number, share: number, out: Float64Array, to: number): void {
  const re = s[at] as number
  const im = s[at + 1] as number
  if (share === 0) {
    out[to] = re
    out[to + 1] = im
    return
  }
  const nextR = s[at + size] as number
  const nextI = s[at + size + 1] as number
  const along = nextR * re + nextI * im
  if (along > 0) {
    const turn = share * Math.atan2(nextI * re - nextR * im, along)
    const grown = 1 + share * (Math.sqrt((nextR * nextR + nextI * nextI) / (re * re + im * im)) - 1)
    out[to] = grown * (re * Math.cos(turn) - im * Math.sin(turn))
    out[to + 1] = grown * (re * Math.sin(turn) + im * Math.cos(turn))
  } else {
    out[to] = re + share * (nextR - re)
    out[to + 1] = im + share * (nextI - im)
  }
}

function frequency(hz: number): string {
  return Number.isFinite(hz) && hz !== 0 ? formatScaled(hz, 'frequency') : `${hz} Hz`
}
