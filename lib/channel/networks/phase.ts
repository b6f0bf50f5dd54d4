import { TWO_PORT } from './network'

/**
 * The phase of S21 without jumps: each step between neighbouring frequencies is taken as the shortest, so points must be closer than half
 * a turn (see tooCoarse()).
 * @param samples of a two-port, 8 numbers a frequency
 * @returns rad; NaN from the first frequency on at which S21 is NaN
 */
export function unwrappedPhase(samples: Float64Array): Float64Array {
  const phase = new Float64Array(samples.length / TWO_PORT)
  for (let k = 0; k < phase.length; k++) {
    const at = TWO_PORT * k + 4
    phase[k] =
      k === 0
        ? Math.atan2(samples[at + 1] as number, samples[at] as number)
        : (phase[k - 1] as number) + step(samples, at)
  }
  return phase
}

/** The angle from the S21 of the frequency before, −π to π. */
function step(samples: Float64Array, at: number): number {
  const re = samples[at] as number
  const im = samples[at + 1] as number
  const beforeR = samples[at - TWO_PORT] as number
  const beforeI = samples[at + 1 - TWO_PORT] as number
  return Math.atan2(im * beforeR - re * beforeI, re * beforeR + im * beforeI)
}

/**
 * −dφ/dω of S21 by central differences of the unwrapped phase, one-sided at both ends.
 * @param hz Hz, strictly rising
 * @param samples of a two-port, 8 numbers a frequency
 * @returns s; NaN of a single frequency
 */
export function groupDelay(hz: Float64Array, samples: Float64Array): Float64Array {
  const phase = unwrappedPhase(samples)
  const delay = new Float64Array(phase.length)
  for (let k = 0; k < delay.length; k++) {
    const low = Math.max(k - 1, 0)
    const high = Math.min(k + 1, delay.length - 1)
    const turned = (phase[high] as number) - (phase[low] as number)
    delay[k] = -turned / (2 * Math.PI * ((hz[high] as number) - (hz[low] as number)))
  }
  return delay
}

/** Where S21 turns most between two neighbouring frequencies. */
export type Step = {
  readonly fromHz: number
  readonly toHz: number
  /** rad, 0 to π. */
  readonly turn: number
}

/** From a quarter turn between two points on, they are too far apart to tell how the phase went from one to the other. */
const TOO_COARSE = Math.PI / 2

/**
 * Whether the points of a two-port lie close enough to interpolate between them. A null of S21 between two points looks the same as
 * points that are too far apart; turns of more than half a period cannot be told from smaller ones (common practice, no source).
 * @returns the widest step of over 90°, or null: close enough
 */
export function tooCoarse(hz: Float64Array, samples: Float64Array): Step | null {
  let widest: Step | null = null
  for (let k = 1; k < hz.length; k++) {
    const turn = Math.abs(step(samples, TWO_PORT * k + 4))
    if (turn > Math.max(TOO_COARSE, widest?.turn ?? 0))
      widest = { fromHz: hz[k - 1] as number, toHz: hz[k] as number, turn }
  }
  return widest
}
