import { z } from 'zod'
import { allowanceEntry } from '../../../lib/budget/catalogues/allowances'
import { laminateEntry } from '../../../lib/budget/catalogues/laminates'
import { ownEntry } from '../../../lib/budget/catalogues/ownEntry'
import { packageEntry } from '../../../lib/budget/catalogues/packages'
import type { CatalogueItem } from '../../../lib/sync/services'
import { component, time } from './components'

component('AllowanceEntry', allowanceEntry)
component('LaminateEntry', laminateEntry)
component('PackageEntry', packageEntry)

export const newEntry = component('NewCatalogueEntry', ownEntry)

const added = {
  id: z.string(),
  person: z.string().meta({ description: 'Id of the person who added it.' }),
  personName: z.string(),
  time,
  mayRemove: z.boolean().meta({ description: 'Whether who asks may remove it.' }),
}

export const catalogueItem = component(
  'CatalogueItem',
  z.discriminatedUnion('kind', [
    z.strictObject({ ...added, kind: z.literal('allowance'), entry: allowanceEntry }),
    z.strictObject({ ...added, kind: z.literal('laminate'), entry: laminateEntry }),
    z.strictObject({ ...added, kind: z.literal('package'), entry: packageEntry }),
  ]) satisfies z.ZodType<CatalogueItem>,
)
