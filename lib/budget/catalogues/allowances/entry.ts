import { z } from 'zod'
import { allowance } from '../../schema/allowances'
import { head } from '../../schema/head'
import { flag, quantity, text } from '../../schema/scalars'

/** One part of a published split. */
const part = z.strictObject({
  what: text(120, 'What the decibels are given to.'),
  loss: quantity('loss', { min: 0, max: 200 }, 'Decibels of the limit; an overlap is typed positive too.'),
  overlap: flag('Both neighbours contain it, so it is subtracted once.'),
})

/** A loss limit as a catalogue keeps it: the fields of an allowance that its source says, and what it belongs to. */
export const allowanceEntry = z.strictObject({
  ...allowance.pick({
    name: true,
    limit: true,
    at: true,
    publishedFrom: true,
    publishedTo: true,
    leastLoss: true,
    returnLossFloor: true,
    curve: true,
    presumedPackage: true,
    presumes: true,
    body: true,
    clause: true,
    confidence: true,
  }).shape,
  ...head.pick({ bitRate: true, code: true, codedBits: true, codedSymbols: true }).shape,
  nyquist: quantity('frequency', { min: 1e5, max: 3e11, unit: 'GHz' }, 'Nyquist frequency of the interface.'),
  eitherWay: flag('It is published for both directions: the planes may be taken mirrored.'),
  status: text(120, 'What the limit is: normative, recommended, a budget.'),
  split: z.array(part).max(12, 'At most 12 parts.').default([]),
  caution: text(400, 'What to mind when it is used.'),
})
export type AllowanceEntry = z.output<typeof allowanceEntry>
