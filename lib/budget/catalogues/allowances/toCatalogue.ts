import { formatScaled } from '../../../channel/units'
import type { SignallingEvaluation } from '../../evaluation'
import { livingRecord } from '../../record'
import type { Allowance, Budget } from '../../schema'
import type { AllowanceEntry } from './entry'
import { OWN_COPY_WINS } from './words'

/** As long as the caution of an entry may be. */
const CAUTION = 400

/**
 * An allowance of a budget as an entry for the server's own catalogue: what its source says, the interface of the link that
 * it stands in, and its note as caution. Where no published planes are given, those of the budget are taken by their codes.
 */
export function allowanceToCatalogue(
  allowance: Allowance,
  budget: Budget,
  { lineRate, nyquist }: SignallingEvaluation,
): AllowanceEntry {
  const { name, limit, at, leastLoss, returnLossFloor, curve, presumedPackage, presumes, body, clause } = allowance
  const codeOf = (plane: string | null) => livingRecord(budget, 'planes', plane)?.code ?? null
  return {
    ...{ name, limit, at, leastLoss, returnLossFloor, curve, presumedPackage, presumes, body, clause },
    publishedFrom: allowance.publishedFrom ?? codeOf(allowance.from),
    publishedTo: allowance.publishedTo ?? codeOf(allowance.to),
    confidence: allowance.confidence ?? 'own',
    bitRate: lineRate === null ? null : formatScaled(lineRate, 'bitRate', 12),
    code: budget.head.code,
    codedBits: budget.head.codedBits,
    codedSymbols: budget.head.codedSymbols,
    nyquist: nyquist === null ? null : formatScaled(nyquist, 'frequency', 12),
    eitherWay: null,
    status: null,
    split: [],
    caution: cautionOf(allowance.note),
  }
}

/** The note without the sentence that every entry adds when it is taken; cut where it is too long, never inside a character. */
function cautionOf(note: string): string | null {
  const text = note.replace(OWN_COPY_WINS, '').trim()
  if (text.length <= CAUTION) return text === '' ? null : text
  const kept = text.slice(0, CAUTION - 1).replace(/[\ud800-\udbff]$/, '')
  return `${kept.trimEnd()}…`
}
