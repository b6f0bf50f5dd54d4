import { z } from 'zod'
import { line } from '../../schema/lines'
import { choice, quantity, text } from '../../schema/scalars'
import { BASES, CONFIDENCES } from '../../schema/words'

const dk = (what: string) => quantity('number', { min: 1, max: 20 }, what)
const df = (what: string) => quantity('number', { min: 0, max: 0.2 }, what)

/** A laminate as a catalogue keeps it: a suggestion to type the fabricator's values over. */
export const laminateEntry = z.strictObject({
  name: text(120, 'Laminate, in generic words or as the fabricator calls it.'),
  ...line.pick({ dk: true, df: true, anchor: true, method: true, resin: true }).shape,
  dkFrom: dk('Lowest Dk of the class.'),
  dkTo: dk('Highest Dk of the class.'),
  dfFrom: df('Lowest Df of the class.'),
  dfTo: df('Highest Df of the class.'),
  basis: choice(BASES, 'Where the values come from.'),
  tolerance: quantity('ratio', { min: 0, max: 1 }, 'What a loss computed from them may be off, to each side.'),
  confidence: choice(CONFIDENCES, 'How sure the values are.'),
  caution: text(400, 'What to mind when it is used.'),
})
export type LaminateEntry = z.output<typeof laminateEntry>
