import { z } from 'zod'
import { choice, note, order, quantity, reference, removed, text } from './scalars'
import { ASSEMBLY_KINDS, BASES, GRADES, HUMIDITIES, OWNERS, TOLERANCE_MEANINGS } from './words'

/** What somebody builds. Lines refer to it; a laminate is changed in one place. */
export const assembly = z.strictObject({
  order,
  removed,
  name: text(120, 'Name of the assembly.'),
  kind: choice(ASSEMBLY_KINDS, 'What it is.'),
  owner: choice(OWNERS, 'Discipline that answers for it.'),
  ownerPerson: text(120, 'Person who answers for it.'),
  supplier: text(120, 'Supplier.'),
  group: text(60, 'Correlation group of its lines; empty: the assembly itself.'),
  laminate: text(120, 'Laminate, in generic words; values come from the fabricator.'),
  temperature: quantity('temperature', { min: -60, max: 200 }, 'Operating temperature.'),
  humidity: choice(HUMIDITIES, 'Operating humidity.'),
  thickness: quantity('length', { min: 0, max: 0.05, unit: 'mm' }, 'Finished thickness of the board.'),
  note,
})

/** One row of an assembly's loss table: layer and width give dB per length at a frequency. */
export const lossClass = z.strictObject({
  order,
  removed,
  assembly: reference('assemblies', 'Assembly that it belongs to.'),
  name: text(120, 'Name of the loss class.'),
  layer: text(60, 'Layer.'),
  width: quantity('length', { min: 1e-6, max: 0.02, unit: 'mil' }, 'Trace width.'),
  lossPerLength: quantity('lossPerLength', { min: 0, max: 2000, unit: 'dB/in' }, 'Attenuation per length.'),
  at: quantity('frequency', { min: 1e5, max: 3e11, unit: 'GHz' }, 'Frequency of the attenuation.'),
  points: text(2000, "Further points of attenuation per length, such as '1 GHz 0.2 dB/in; 5 GHz 0.6 dB/in'."),
  scale: quantity('number', { min: 0.2, max: 5 }, "A coupon's 'measured / model' factor for this class."),
  basis: choice(BASES, 'Where the number comes from.'),
  grade: choice(GRADES, 'What the number claims.'),
  conditionTemperature: quantity('temperature', { min: -60, max: 200 }, 'Temperature that the number holds at.'),
  conditionHumidity: choice(HUMIDITIES, 'Humidity that the number holds at.'),
  toleranceMinus: quantity(['loss', 'ratio'], { min: 0, max: 100 }, 'Tolerance downwards, of the line or in %.'),
  tolerancePlus: quantity(['loss', 'ratio'], { min: 0, max: 100 }, 'Tolerance upwards, of the line or in %.'),
  toleranceMeaning: choice(TOLERANCE_MEANINGS, 'What ± means.'),
  evidence: reference('evidence', 'File that proves it.'),
  note,
})

/** One layer of an assembly's stack-up, top first. */
export const layer = z.strictObject({
  order,
  removed,
  assembly: reference('assemblies', 'Assembly that it belongs to.'),
  name: text(60, 'Name of the layer.'),
  role: choice(['signal', 'plane', 'core', 'prepreg', 'mask'], 'What the layer is.'),
  thickness: quantity('length', { min: 1e-6, max: 0.01, unit: 'µm' }, 'Thickness.'),
  dk: quantity('number', { min: 1, max: 20 }, 'Relative permittivity at the anchor frequency.'),
  df: quantity('number', { min: 0, max: 0.2 }, 'Loss tangent at the anchor frequency.'),
  anchor: quantity('frequency', { min: 1e5, max: 3e11, unit: 'GHz' }, 'Frequency that Dk and Df were measured at.'),
  method: text(120, 'Method that Dk and Df were measured by.'),
  resin: quantity('ratio', { min: 0, max: 1 }, 'Resin content.'),
  foil: text(60, 'Foil, in generic words.'),
  roughnessTop: quantity('length', { min: 0, max: 2e-5, unit: 'µm' }, 'Rz of the upper side.'),
  roughnessBottom: quantity('length', { min: 0, max: 2e-5, unit: 'µm' }, 'Rz of the lower side.'),
})
