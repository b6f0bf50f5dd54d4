import { allowances } from './allowances'
import { cableRuns } from './cableRuns'
import type { Check } from './check'
import { claims } from './claims'
import { conditions } from './conditions'
import { lineFields } from './lineFields'
import { neighbours } from './neighbours'
import { packages } from './packages'
import { references } from './references'
import { shares } from './shares'
import { skews } from './skews'
import { special } from './special'

export type { Checked } from './check'

/** Everything that a worksheet checks by itself beside the numbers. */
export const CHECKS: readonly Check[] = [
  allowances,
  lineFields,
  claims,
  conditions,
  neighbours,
  cableRuns,
  packages,
  special,
  shares,
  skews,
  references,
]
