import { allowances } from './allowances'
import { cableRuns } from './cableRuns'
import type { Check } from './check'
import { conditions } from './conditions'
import { corners } from './corners'
import { coupons } from './coupons'
import { fixtures } from './fixtures'
import { guesses } from './guesses'
import { laneOutliers } from './laneOutliers'
import { layers } from './layers'
import { lengths } from './lengths'
import { lineFields } from './lineFields'
import { lines } from './lines'
import { neighbours } from './neighbours'
import { networkFiles } from './networkFiles'
import { packages } from './packages'
import { portPairs } from './portPairs'
import { references } from './references'
import { renormalised } from './renormalised'
import { shares } from './shares'
import { skews } from './skews'
import { special } from './special'
import { stubs } from './stubs'

export type { Checked } from './check'

/** Everything that a worksheet checks by itself beside the numbers. */
export const CHECKS: readonly Check[] = [
  allowances,
  guesses,
  lineFields,
  lines,
  conditions,
  corners,
  fixtures,
  networkFiles,
  portPairs,
  renormalised,
  coupons,
  neighbours,
  cableRuns,
  lengths,
  layers,
  laneOutliers,
  stubs,
  packages,
  special,
  shares,
  skews,
  references,
]
