import { type AllowanceEntry, allowanceFromCatalogue } from '../../../../../lib/budget/catalogues/allowances'
import { FREQUENCY, typedValue } from '../../../../../lib/budget/quantities'
import type { Budget } from '../../../../../lib/budget/schema'
import { holdsAt } from '../../../../../lib/channel/lines'
import { planeCodeWord } from '../../../../words/terms'
import { wordOf } from '../words/choices'
import { type CatalogueRow, said } from './row'

/** @param nyquist of the link, Hz */
export function allowanceRow(
  id: string,
  entry: AllowanceEntry,
  budget: Budget,
  nyquist: number | null,
  own: CatalogueRow<AllowanceEntry>['own'],
): CatalogueRow<AllowanceEntry> {
  const { name, limit, at, bitRate, code, confidence, status, caution } = entry
  const hz = typedValue(FREQUENCY, entry.nyquist)
  return {
    id,
    entry,
    own,
    caution,
    title: name ?? 'Allowance without a name',
    figure: said([limit ?? 'no single limit', at === null ? null : `at ${at}`]).join(' '),
    facts: said([
      planes(entry, budget),
      said([entry.body, entry.clause]).join(', '),
      said([code, bitRate]).join(' '),
      confidence && wordOf(confidence),
      status,
      entry.curve === null ? null : 'with a limit curve',
      split(entry),
    ]),
    fits: nyquist !== null && hz !== null && holdsAt(hz, nyquist),
  }
}

/** The planes of the source, and which of them this budget does not have. */
function planes(entry: AllowanceEntry, budget: Budget): string {
  const { publishedFrom, publishedTo, from, to } = allowanceFromCatalogue(entry, budget)
  if (!publishedFrom || !publishedTo) return 'planes not said'
  const words = [planeCodeWord(publishedFrom), planeCodeWord(publishedTo)] as const
  const missing = [from === null ? words[0] : null, to === null ? words[1] : null].filter((word) => word !== null)
  const lacks = missing.length === 0 ? '' : ` (${missing.join(' and ')} not in this budget)`
  return `${words[0]} to ${words[1]}${lacks}`
}

function split({ split }: AllowanceEntry): string | null {
  if (split.length === 0) return null
  const parts = split.map(({ what, loss, overlap }, i) => `${overlap ? '− ' : i > 0 ? '+ ' : ''}${what} ${loss}`)
  return `Split: ${parts.join(' ')}`
}
