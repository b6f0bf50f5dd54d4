import { TWO_PORT } from './network'

/**
 * Losses of two-ports, positive dB, from samples as cascade() gives them: S11, S12, S21, S22, real and imaginary part side by side. One number
 * a frequency; Infinity where nothing comes through or back, NaN where the samples are.
 */

/** −20 log10|S21|. */
export function insertionLoss(samples: Float64Array): Float64Array {
  return decibelsOf(samples, 4)
}

/** −20 log10|S11| or of S22; negative of an active port. */
export function returnLoss(samples: Float64Array, port: 1 | 2): Float64Array {
  return decibelsOf(samples, port === 1 ? 0 : 6)
}

/**
 * What is lost inside, as against what is reflected: −10 log10(|S21|²/(1 − |S11|²)), the power that comes out over the power that goes
 * in at port 1 with port 2 matched. NaN where no power goes in (|S11| ≥ 1).
 */
export function dissipatedLoss(samples: Float64Array): Float64Array {
  const db = new Float64Array(samples.length / TWO_PORT)
  for (let k = 0; k < db.length; k++) {
    const goesIn = 1 - power(samples, TWO_PORT * k)
    db[k] = goesIn > 0 ? -10 * Math.log10(power(samples, TWO_PORT * k + 4) / goesIn) : Number.NaN
  }
  return db
}

function decibelsOf(samples: Float64Array, part: number): Float64Array {
  const db = new Float64Array(samples.length / TWO_PORT)
  // Subtracted from 0: of a loss of nothing no −0 comes, which JSON does not know.
  for (let k = 0; k < db.length; k++) db[k] = 0 - 10 * Math.log10(power(samples, TWO_PORT * k + part))
  return db
}

function power(samples: Float64Array, at: number): number {
  return (samples[at] as number) ** 2 + (samples[at + 1] as number) ** 2
}
