import { z } from 'zod'
import { choice, integer, note, order, quantity, reference, removed, text } from './scalars'
import { CONFIDENCES, DISCIPLINES, PLANE_CODES, STATISTICS } from './words'

/** A reference plane between two lines. */
export const plane = z.strictObject({
  order,
  removed,
  code: choice(PLANE_CODES, 'Which plane it is.'),
  name: text(120, 'Name on this link, such as the end that it is at.'),
  standard: text(120, 'Standard that the test point belongs to.'),
})

/** A loss limit at a frequency of its own, from one plane to another. */
export const allowance = z.strictObject({
  order,
  removed,
  name: text(120, 'Name of the allowance.'),
  limit: quantity('loss', { min: 0, max: 200 }, 'Loss allowed.'),
  at: quantity('frequency', { min: 1e5, max: 3e11, unit: 'GHz' }, 'Frequency that the limit is stated at.'),
  usedAt: quantity(
    'frequency',
    { min: 1e5, max: 3e11, unit: 'GHz' },
    'Frequency that the limit is used at instead; it is moved along its own curve, never otherwise.',
  ),
  from: reference('planes', 'Plane that it starts at.'),
  to: reference('planes', 'Plane that it ends at.'),
  publishedFrom: choice(PLANE_CODES, 'Plane that the source starts it at.'),
  publishedTo: choice(PLANE_CODES, 'Plane that the source ends it at.'),
  requiredMargin: quantity('loss', { min: 0, max: 100 }, 'Margin that this project wants to keep.'),
  leastLoss: quantity('loss', { min: 0, max: 200 }, 'Least loss; a shorter channel may overload the receiver.'),
  returnLossFloor: quantity('loss', { min: 0, max: 60 }, 'Least return loss up to the Nyquist frequency.'),
  curve: text(4000, "Limit curve in pieces: 'f_lo..f_hi GHz: c0 + c1 sqrt(f) + c2 f + c3 f^2 + c4 f^3'."),
  presumedPackage: quantity('loss', { min: 0, max: 60 }, 'Package loss at each end that the limit presumes at most.'),
  presumes: text(400, 'What else the limit presumes.'),
  judgedCorner: reference('corners', 'Corner that it is judged at; empty: the reference corner.'),
  judgedStatistic: choice(STATISTICS, 'Statistic that it is judged at; empty: nominal.'),
  judgedLane: integer(1, 256, 'Lane that it is judged at; empty: the worst.'),
  body: text(120, 'Body that publishes it.'),
  clause: text(200, 'Document and clause.'),
  confidence: choice(
    CONFIDENCES,
    'How sure the figure is: read in a source, two sources, from memory, or the own project.',
  ),
  note,
})

/** The part of an allowance given to an assembly, a line or a discipline beforehand. */
export const share = z.strictObject({
  order,
  removed,
  allowance: reference('allowances', 'Allowance that it is part of.'),
  assembly: reference('assemblies', 'Assembly that it is given to.'),
  line: reference('lines', 'Line that it is given to.'),
  discipline: choice(DISCIPLINES, 'Discipline that it is given to.'),
  loss: quantity('loss', { min: 0, max: 200 }, 'Decibels given.'),
})

/** A named set of conditions. */
export const corner = z.strictObject({
  order,
  removed,
  name: text(60, 'Name of the corner.'),
  temperature: quantity('temperature', { min: -60, max: 200 }, 'Temperature.'),
  humidity: choice(['dry', 'wet'], 'Humidity.'),
  fabrication: choice(['nominal', 'low-loss', 'high-loss'], 'Extreme of fabrication.'),
  lossPerKelvin: quantity(
    'perKelvin',
    { min: -0.02, max: 0.02 },
    'Growth of trace and cable loss per kelvin, if typed and not computed.',
  ),
  dielectricPerKelvin: quantity(
    'perKelvin',
    { min: -0.02, max: 0.02 },
    'Growth of the loss tangent per kelvin, for lines that are computed from their cross-section.',
  ),
  wetDk: quantity('number', { min: 0, max: 2 }, 'Added to Dk from dry to wet, for computed lines.'),
  wetDf: quantity('number', { min: 0, max: 0.05 }, 'Added to Df from dry to wet, for computed lines.'),
  lossWet: quantity('ratio', { min: 0, max: 1 }, 'Growth of trace loss from dry to wet, if typed and not computed.'),
})
