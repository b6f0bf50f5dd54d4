import { formatQuantity } from '../../channel/units'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import { RESISTANCE, typedValue } from '../quantities'
import { nameOf } from '../record'
import type { LineKind } from '../schema'
import type { Beside, LineCheck } from './check'
import { type EvidenceRecord, evidenceIdOf } from './evidence'
import { lineFlag } from './lineFlag'

/** Fabrication moves an impedance by up to 10 %; 85 Ω in a link of 100 Ω is another design. */
const APART = 0.1

/** A package's impedance is its own matter: published reference packages run from 78 to 110 Ω. */
const MATCHED: readonly (LineKind | null)[] = ['trace', 'cable', 'connector']

/** Impedances and modes: the line's own and its file's, against the reference of the budget. */
export const proof: LineCheck = function* (item, beside) {
  const own = typedValue(RESISTANCE, item.line.impedance)
  const { reference, evidence } = beside
  if (own !== null && reference !== null && MATCHED.includes(item.line.kind) && apart(own, reference)) {
    yield lineFlag(
      item,
      'impedance-differs',
      'impedance',
      `has ${ohms(own)} differential in a link of ${ohms(reference)}.`,
      'Check that its number was made for this impedance; the joints reflect beside what the line loses.',
    )
  }
  if (evidence !== null) yield* file(item, beside, evidence)
}

function* file(item: LineItem, { reference }: Beside, evidence: EvidenceRecord): Generator<FlagDraft> {
  const name = nameOf('evidence', evidenceIdOf(item), evidence)
  const { modes } = evidence
  const asked = evidence.ports === 2 && item.line.model !== 'network'
  if (asked && modes === null) {
    yield lineFlag(
      item,
      'two-port-not-answered',
      'evidence',
      `rests on ${name}, a file of two ports, and whether they are single-ended or one pair is not said.`,
      "Say at the evidence what its ports are: 'single-ended' or 'mixed-as-two-ports'.",
    )
  }
  if (asked && modes === 'single-ended') {
    yield lineFlag(
      item,
      'single-ended-taken-as-differential',
      'evidence',
      `rests on ${name}, which holds one conductor; a differential budget needs the pair.`,
      'Ask for the four-port file, or for the differential mode saved as two ports.',
    )
  }
  const written = typedValue(RESISTANCE, evidence.reference)
  if (written === null || reference === null || (evidence.ports === 2 && modes !== 'mixed-as-two-ports')) return
  // Two conductors of 50 Ω to ground are a pair of 100 Ω.
  const differential = modes === 'single-ended' || modes === null ? 2 * written : written
  if (!apart(differential, reference)) return
  yield lineFlag(
    item,
    'reference-differs',
    'evidence',
    `rests on ${name}, which is written in ${ohms(differential)} differential; the link has ${ohms(reference)}.`,
    'Correct the reference of the evidence if it was mistyped; a loss read off the file must be renormalised first.',
  )
}

function apart(own: number, reference: number): boolean {
  return Math.abs(own / reference - 1) > APART + 1e-9
}

function ohms(value: number): string {
  return formatQuantity(value, 'resistance', 'Ω', 4)
}
