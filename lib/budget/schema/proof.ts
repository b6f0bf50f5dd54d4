import { z } from 'zod'
import { choice, flag, integer, note, order, quantity, reference, removed, text } from './scalars'
import { DISCIPLINES } from './words'

/** An attached file, addressed by its SHA-256. */
export const evidence = z.strictObject({
  order,
  removed,
  name: text(200, 'File name.'),
  sha256: text(64, 'SHA-256 of the file, in hexadecimal.'),
  mediaType: text(100, 'Media type.'),
  size: integer(0, 2 ** 31, 'Size in bytes.'),
  ports: integer(1, 16, 'Ports of a network.'),
  modes: choice(['single-ended', 'mixed-as-two-ports', 'mixed-mode'], 'What the ports of a network are.'),
  reference: quantity('resistance', { min: 1, max: 200 }, 'Reference impedance of the file.'),
  highest: quantity('frequency', { min: 0, max: 1e12, unit: 'GHz' }, 'Highest frequency in the file.'),
  fixtures: choice(['in', 'removed', 'none'], 'Test fixtures: in the data, removed, or none used.'),
  fixturesRemovedBy: text(200, 'How the fixtures were removed.'),
  note,
})

/** A figure that accompanies the loss, typed until it is computed: COM, ERL, ICN, ILD and the like. */
export const figure = z.strictObject({
  order,
  removed,
  name: text(60, 'Name of the figure.'),
  value: text(60, 'Value with its unit.'),
  limit: text(60, 'Limit with its unit.'),
  met: flag('The person says that the limit is met.'),
  by: text(120, 'Who says so.'),
  evidence: reference('evidence', 'File that proves it.'),
  note,
})

/** A discipline whose signature a revision needs. */
export const requiredSignOff = z.strictObject({
  order,
  removed,
  discipline: choice(DISCIPLINES, 'Discipline that signs.'),
})
