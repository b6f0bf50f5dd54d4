import { fixtureImpedances, removeFixtures } from '../../../channel/fixtures'
import type { Network } from '../../../channel/networks/network'
import type { Refusal } from '../../../channel/networks/refusal'

export type Alone = {
  /** The device between the fixtures, or why it could not be had. */
  readonly device: Network | Refusal
  /** Ω, where the fixtures differ so much from their thru that the removal corrects for it; else null. */
  readonly differ: { readonly thru: number; readonly near: number; readonly far: number } | null
}

/** Fixtures whose impedance differs by more than this from that of their thru are corrected for it. */
const DIFFERS = 0.03

const kept = new WeakMap<Network, WeakMap<Network, Alone>>()

/** Takes both fixtures off a file by the measurement of them back to back; the same two files once. */
export function aloneOf(file: Network, fixtures: Network): Alone {
  const ofFile = kept.get(file) ?? new WeakMap<Network, Alone>()
  kept.set(file, ofFile)
  const known = ofFile.get(fixtures)
  if (known) return known
  const alone = remove(file, fixtures)
  ofFile.set(fixtures, alone)
  return alone
}

function remove(file: Network, fixtures: Network): Alone {
  const found = fixtureImpedances(file, fixtures)
  if ('reason' in found) return { device: found, differ: null }
  const { thru, near, far } = found
  const impedanceCorrection = Math.max(Math.abs(near / thru - 1), Math.abs(far / thru - 1)) > DIFFERS
  return {
    device: removeFixtures(file, fixtures, { impedanceCorrection }),
    differ: impedanceCorrection ? found : null,
  }
}
