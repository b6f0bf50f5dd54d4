import { belowCopperFloor } from '../../channel/lines/copperFloor'
import { formatQuantity, formatScaled } from '../../channel/units'
import type { FlagCode } from '../flags'
import { LENGTH, RESISTANCE, typedValue } from '../quantities'
import type { ModelInput } from './model'

type Owner<F extends string> = {
  readonly name: string
  say(code: FlagCode, field: F, message: string, todo: string): null
}

/** A line without an impedance of its own may be one of 100 Ω in a link of 85 Ω: a higher impedance has a lower floor. */
const OTHER_DESIGN = 1.2

/**
 * Refuses a trace's attenuation that even smooth copper of its width exceeds: no laminate can be better than its copper.
 * @param owner the record that says the attenuation, and in which field
 * @param dbPerMetre at the frequency that it is stated at, dB/m
 * @param hz that frequency
 * @returns true after writing down why the number is impossible
 */
export function refuseImpossible<F extends string>(
  input: ModelInput,
  owner: Owner<F>,
  field: F,
  dbPerMetre: number,
  hz: number,
): boolean {
  const { line, lossClass, reference } = input
  const width = typedValue(LENGTH, line.width ?? lossClass?.width ?? null)
  const own = typedValue(RESISTANCE, line.impedance)
  const impedance = own ?? (reference === null ? null : reference * OTHER_DESIGN)
  if (line.kind !== 'trace' || width === null || impedance === null) return false
  const thickness = typedValue(LENGTH, line.thickness) ?? undefined
  const floor = belowCopperFloor(dbPerMetre, width, impedance, hz, thickness)
  if (floor === null) return false
  const [typed, least] = [dbPerMetre, floor].map((db) => formatQuantity(db, 'lossPerLength', 'dB/in', 3))
  owner.say(
    'below-copper-floor',
    field,
    `${owner.name}: ${typed} at ${formatScaled(hz, 'frequency')} is impossible; smooth copper of ${formatQuantity(width, 'length', 'mil', 3)} alone loses more than ${least}.`,
    'Check the unit, the frequency and the width.',
  )
  return true
}
