import { z } from 'zod'
import { allowance } from '../../schema/allowances'
import { line } from '../../schema/lines'
import { quantity, text } from '../../schema/scalars'

/** A package as a catalogue keeps it: the parameters of the package line of IEEE 802.3 Annex 93A. */
export const packageEntry = z.strictObject({
  name: text(120, 'Package, and which of its lengths.'),
  ...line.pick({
    packageGamma0: true,
    packageA1: true,
    packageA2: true,
    packageTau: true,
    impedance: true,
    length: true,
    secondImpedance: true,
    secondLength: true,
    padCapacitance: true,
  }).shape,
  dieCapacitance: quantity(
    'capacitance',
    { min: 0, max: 1e-9, unit: 'fF' },
    "Capacitance of the die's pad, each conductor to ground; a line of its own, outside the package.",
  ),
  ...allowance.pick({ body: true, clause: true, confidence: true }).shape,
  caution: text(400, 'What to mind when it is used.'),
})
export type PackageEntry = z.output<typeof packageEntry>
