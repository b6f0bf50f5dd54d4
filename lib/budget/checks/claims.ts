import type { FlagDraft } from '../flags'
import { basisOf, gradeOf, groupOffWithoutNote, type LineItem } from '../lineItem'
import { COVERS } from '../schema'
import { toleranceDb, toleranceOf } from '../tolerance'
import type { LineCheck } from './check'
import { lineFlag } from './lineFlag'

/** A typical value below this many decibels is too small to matter. */
const TYPICAL_MATTERS_DB = 0.5

/** What a line claims about its number, and what does not go together. */
export const claims: LineCheck = function* (item, { nominal }) {
  yield* grades(item, nominal)
  if (groupOffWithoutNote(item.line)) {
    yield lineFlag(
      item,
      'group-off-without-note',
      'groupNote',
      'is said to vary on its own without a reason; it stays in the group of its assembly.',
      'Write why it varies on its own, or clear the group.',
    )
  }
  yield* coverCodes(item)
}

function* grades(item: LineItem, nominal: number | null): Generator<FlagDraft> {
  const grade = gradeOf(item)
  const tolerance = toleranceOf(item.line, item.lossClass)
  const stated = tolerance === null ? 'none' : toleranceDb(tolerance, nominal ?? 1, 0)
  const raised = typeof stated !== 'string' && stated.plusDb > 0
  if (grade === 'maximum' && raised) {
    yield lineFlag(
      item,
      'maximum-with-tolerance',
      'tolerancePlus',
      'is a guaranteed maximum and has a tolerance on top.',
      'Set the tolerance upwards to 0 dB, or say that the number is nominal.',
    )
  }
  if (item.line.processIncluded && raised) {
    yield lineFlag(
      item,
      'process-with-tolerance',
      'processIncluded',
      'already contains the spread of fabrication and has a tolerance on top.',
      'Keep one of the two.',
    )
  }
  if (grade === 'typical' && nominal !== null && nominal > TYPICAL_MATTERS_DB) {
    const source = basisOf(item)
    yield lineFlag(
      item,
      'typical-not-maximum',
      'grade',
      `is a typical value${source ? ` (${source})` : ''}, not a guaranteed maximum.`,
      'Ask its owner for the maximum, or give a tolerance that reaches it.',
    )
  }
}

/** Kinds whose numbers are most often misread for want of saying what they include. */
const MUST_SAY = ['connector', 'cable', 'package']

function* coverCodes(item: LineItem): Generator<FlagDraft> {
  const { kind, covers } = item.line
  if (kind === null) return
  if (covers === null) {
    if (!MUST_SAY.includes(kind)) return
    yield lineFlag(item, 'covers-not-said', 'covers', 'does not say what its number includes.', 'Tick what it covers.')
    return
  }
  const known: readonly string[] = COVERS[kind]
  const foreign = covers.split(' ').filter((code) => code !== '' && !known.includes(code))
  if (foreign.length === 0) return
  yield lineFlag(
    item,
    'covers-not-of-kind',
    'covers',
    `is a ${kind} and covers ${foreign.join(', ')}, which its kind cannot.`,
    'Tick what it covers again.',
  )
}
