import { RECORD_WORDS } from '../../../../../lib/budget/record'
import type { Budget, Scalar, SectionName } from '../../../../../lib/budget/schema'
import { metaOf } from '../../../../../lib/sheet/layout'
import { planeWords } from '../../../../words/terms'
import { wordOf } from './choices'

/** A value as a person reads it: as typed, or the word of its code, or the name of the record that it points to. */
export function sayValue(budget: Budget, section: 'head' | SectionName | 'laneValues', field: string, value: Scalar) {
  if (value === null || value === '') return ''
  const meta = section === 'laneValues' ? metaOf('lines', field.split('/')[1] ?? '') : metaOf(section, field)
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  if (typeof value === 'number') return String(value)
  if (meta?.kind === 'choice') return wordOf(value)
  if (meta?.kind === 'set') return value.split(' ').map(wordOf).join(', ')
  if (meta?.kind === 'reference') return recordName(budget, meta.section as SectionName, value)
  return value
}

/** The name of a record as people call it. A removed record keeps its name; one that never was is said to be unknown. */
export function recordName(budget: Budget, section: 'head' | SectionName, id: string | null): string {
  if (section === 'head' || id === null) return budget.head.name ?? 'the budget'
  const plane = section === 'planes' ? budget.planes[id] : undefined
  if (plane) return planeWords(plane)
  const share = section === 'shares' ? budget.shares[id] : undefined
  if (share) return `share of ${shareHolder(budget, share)}`
  const record: Readonly<Record<string, Scalar>> | undefined = budget[section][id]
  if (!record) return `unknown ${RECORD_WORDS[section]}`
  const name = record.name ?? record.discipline
  return typeof name === 'string' && name !== '' ? name : `${RECORD_WORDS[section]} without a name`
}

/** Whom a share is given to. */
function shareHolder(budget: Budget, { assembly, line, discipline }: Budget['shares'][string]): string {
  if (assembly !== null) return recordName(budget, 'assemblies', assembly)
  if (line !== null) return recordName(budget, 'lines', line)
  return discipline === null ? 'nobody yet' : wordOf(discipline)
}
