import { ieee10g } from './ieee10g'
import { ieee25g } from './ieee25g'
import { ieee50g } from './ieee50g'
import { ieee100g } from './ieee100g'
import { oif } from './oif'
import { pcie } from './pcie'
import type { PublishedAllowance } from './published'
import { usb } from './usb'

export { type AllowanceEntry, allowanceEntry } from './entry'
export { allowanceFromCatalogue } from './fromCatalogue'
export { allowanceToCatalogue } from './toCatalogue'
export { OWN_COPY_WINS } from './words'

/** Published loss allowances, by body and rate. Sources were read or remembered as each entry's confidence says. */
export const PUBLISHED_ALLOWANCES: readonly PublishedAllowance[] = [
  ...ieee10g,
  ...ieee25g,
  ...ieee50g,
  ...ieee100g,
  ...oif,
  ...pcie,
  ...usb,
]
