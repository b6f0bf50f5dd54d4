import { z } from 'zod'
import { allowanceEntry } from './allowances/entry'
import { laminateEntry } from './laminates/entry'
import { packageEntry } from './packages/entry'

/** What people of a server add to its catalogues themselves. */
export const ownEntry = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('allowance'), entry: allowanceEntry }),
  z.strictObject({ kind: z.literal('laminate'), entry: laminateEntry }),
  z.strictObject({ kind: z.literal('package'), entry: packageEntry }),
])
export type OwnEntry = z.output<typeof ownEntry>
