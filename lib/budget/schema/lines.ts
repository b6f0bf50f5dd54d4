import { z } from 'zod'
import { choice, flag, integer, note, order, quantity, reference, removed, setOf, text } from './scalars'
import {
  BASES,
  COVER_CODES,
  GRADES,
  HUMIDITIES,
  LINE_KINDS,
  MODELS,
  OWNERS,
  RESERVE_PURPOSES,
  TOLERANCE_MEANINGS,
} from './words'

/** Who answers for the line, what its number includes, claims and rests on. */
const identity = {
  order,
  removed,
  name: text(120, 'Name of the line item.'),
  kind: choice(LINE_KINDS, 'Kind of contributor.'),
  assembly: reference('assemblies', 'Assembly that it is part of.'),
  owner: choice(OWNERS, "Discipline that answers for it; empty: the assembly's."),
  ownerPerson: text(120, 'Person who answers for it.'),
  supplier: text(120, 'Supplier.'),
  covers: setOf(
    COVER_CODES,
    "What the number includes; empty text: nothing beside the line's own piece; not set: not said.",
  ),
  basis: choice(BASES, "Where the number comes from; empty: the loss class's."),
  grade: choice(GRADES, "What the number claims; empty: the loss class's, else nominal."),
  conditionTemperature: quantity('temperature', { min: -60, max: 200 }, 'Temperature that the number holds at.'),
  conditionHumidity: choice(HUMIDITIES, 'Humidity that the number holds at.'),
  processIncluded: flag('The number already contains the spread of fabrication.'),
  toleranceMinus: quantity(['loss', 'ratio'], { min: 0, max: 100 }, 'Tolerance downwards.'),
  tolerancePlus: quantity(['loss', 'ratio'], { min: 0, max: 100 }, 'Tolerance upwards.'),
  toleranceMeaning: choice(TOLERANCE_MEANINGS, 'What ± means; empty: a limit.'),
  toleranceAnywhere: flag('A limit within which every value is as likely as any other.'),
  group: text(60, "Correlation group; empty: the assembly's; 'none' needs a group note."),
  groupNote: text(400, 'Why the line varies on its own.'),
  evidence: reference('evidence', 'File that proves the number.'),
  note,
}

/** Reserve: its purpose. Overlap: the two lines that both contain the part. */
const special = {
  purpose: choice(RESERVE_PURPOSES, 'What a reserve is held back for.'),
  overlapA: reference('lines', 'First line that contains the overlapping part.'),
  overlapB: reference('lines', 'Second line that contains the overlapping part.'),
}

const frequency = { min: 1e5, max: 3e11, unit: 'GHz' }
const size = { min: 0, max: 0.05, unit: 'mm' }

/** The parameters of all models; each model reads its own (lib/budget/models). */
const parameters = {
  model: choice(MODELS, 'How the loss is found.'),
  loss: quantity('loss', { min: 0, max: 200 }, 'Stated loss.'),
  at: quantity('frequency', frequency, 'Frequency of the stated loss.'),
  length: quantity('length', { min: 0, max: 100, unit: 'in' }, 'Length.'),
  lossClass: reference('lossClasses', 'Loss class of the assembly.'),
  lossPerLength: quantity('lossPerLength', { min: 0, max: 2000, unit: 'dB/in' }, 'Attenuation per length.'),
  rootTerm: quantity(
    'lossPerLength',
    { min: 0, max: 2000, unit: 'dB/in' },
    'Part of the attenuation that grows with √f, at 1 GHz.',
  ),
  linearTerm: quantity(
    'lossPerLength',
    { min: 0, max: 2000, unit: 'dB/in' },
    'Part of the attenuation that grows with f, at 1 GHz.',
  ),
  validFrom: quantity('frequency', { ...frequency, min: 0 }, 'Lowest frequency that the number holds at.'),
  validTo: quantity('frequency', frequency, 'Highest frequency that the number holds at.'),
  points: text(4000, "Loss at several frequencies, such as '1 GHz 0.4 dB; 5 GHz 1.1 dB'."),
  squareTerm: quantity(
    'lossPerLength',
    { min: 0, max: 2000, unit: 'dB/m' },
    'Cable: part of the attenuation that grows with f², at 1 GHz.',
  ),
  capacitance: quantity(
    'capacitance',
    { min: 0, max: 1e-3, unit: 'fF' },
    'Capacitance; of a pad, each conductor to ground.',
  ),
  resistance: quantity('resistance', { min: 0, max: 1e4 }, 'Series resistance.'),
  inductance: quantity('inductance', { min: 0, max: 1e-6, unit: 'pH' }, 'Series inductance.'),
  padCapacitance: quantity(
    'capacitance',
    { min: 0, max: 1e-9, unit: 'fF' },
    'Capacitance of the pads to ground, each conductor: of an AC capacitor at each end, of a package at its ball.',
  ),
  impedance: quantity('resistance', { min: 1, max: 400 }, 'Differential impedance of the line itself.'),
  delay: quantity('delayPerLength', { min: 3e-9, max: 3e-8, unit: 'ps/in' }, 'Delay per length.'),
  structure: choice(['microstrip', 'stripline', 'coupled-microstrip', 'coupled-stripline'], 'Cross-section.'),
  layer: text(60, 'Layer.'),
  width: quantity('length', size, 'Trace width at its foot.'),
  gap: quantity('length', size, 'Gap between the two traces of the pair.'),
  thickness: quantity('length', size, 'Copper thickness.'),
  heightBelow: quantity('length', size, 'Dielectric to the plane below.'),
  heightAbove: quantity('length', size, 'Dielectric to the plane above.'),
  etch: quantity('length', size, 'Width lost at the top of the trapezoid, both sides together.'),
  dk: quantity('number', { min: 1, max: 20 }, 'Relative permittivity at the anchor frequency.'),
  df: quantity('number', { min: 0, max: 0.2 }, 'Loss tangent at the anchor frequency.'),
  anchor: quantity('frequency', frequency, 'Frequency that Dk and Df were measured at.'),
  method: text(120, 'Method that Dk and Df were measured by.'),
  resin: quantity('ratio', { min: 0, max: 1 }, 'Resin content of the laminate.'),
  roughness: choice(['smooth', 'hammerstad', 'cannonball', 'huray'], 'Model of foil roughness.'),
  roughnessTop: quantity('length', { min: 0, max: 2e-5, unit: 'µm' }, 'Rz of the upper side.'),
  roughnessBottom: quantity('length', { min: 0, max: 2e-5, unit: 'µm' }, 'Rz of the lower side.'),
  areaRatio: quantity('number', { min: 1, max: 10 }, 'Huray: area of the matte base over the flat area.'),
  nodules: text(400, "Huray: radius and sphere area over flat area, such as '0.5 µm 3.24; 0.2 µm 0.8'."),
  scale: quantity(
    'number',
    { min: 0.2, max: 5 },
    "Geometry: a coupon's 'measured / model' factor for the attenuation.",
  ),
  boardThickness: quantity('length', size, 'Board thickness at the via.'),
  usedDepth: quantity('length', size, 'Depth of the barrel that the signal uses.'),
  stub: quantity('length', size, 'Stub that is left, after back-drilling.'),
  drillTolerance: quantity('length', size, 'Tolerance of the back-drill.'),
  barrel: quantity('length', size, 'Finished drill diameter.'),
  pad: quantity('length', size, 'Pad diameter.'),
  antipad: quantity('length', size, 'Antipad diameter.'),
  pitch: quantity('length', size, 'Distance between the two vias of the pair.'),
  count: integer(1, 64, 'How many alike in a row.'),
  packageGamma0: text(40, 'Annex 93A: γ0 in 1/mm.'),
  packageA1: text(40, 'Annex 93A: a1 in √ns/mm.'),
  packageA2: text(40, 'Annex 93A: a2 in ns/mm.'),
  packageTau: text(40, 'Annex 93A: τ in ns/mm.'),
  secondLength: quantity('length', size, 'Annex 93A: length of the second section, at the ball.'),
  secondImpedance: quantity(
    'resistance',
    { min: 1, max: 400 },
    'Annex 93A: differential impedance of the second section.',
  ),
  mirrored: flag('Package: its ball is on the side of the transmitter, as at the receiver of the link.'),
  endLossA: quantity('loss', { min: 0, max: 100 }, "Cable: loss of the transmitter's end."),
  endLossB: quantity('loss', { min: 0, max: 100 }, "Cable: loss of the receiver's end."),
  taken: choice(
    ['discrete', 'long-uniform', 'per-length'],
    'Network: how it counts; per length: from two lengths of one line, times the length of this one.',
  ),
  portMap: text(40, "Network: ports of the file, such as '1>2' or '1,3>2,4'."),
  fixture: reference('evidence', 'Network: file of the two fixtures back to back (2x-thru), to be removed.'),
  shortEvidence: reference('evidence', 'Network per length: file of the shorter of the two lines.'),
  lengthDifference: quantity(
    'length',
    { min: 0, max: 100, unit: 'in' },
    'Network per length: longer minus shorter line.',
  ),
  varies: text(
    400,
    "What varies from build to build, such as 'width 10 %; dk 3 %; stub 0.1 mm', each a limit to both sides.",
  ),
  skew: quantity('time', { min: 0, max: 1e-9, unit: 'ps' }, 'Skew inside the pair.'),
}

/** One contributor, in channel order. */
export const line = z.strictObject({ ...identity, ...special, ...parameters })

/** The fields that may differ from lane to lane. */
export const LANE_FIELDS = ['length', 'stub', 'skew', 'lossClass', 'loss'] as const
