import { type Budget, fieldMeta, head, type RecordOf, SECTIONS, type SectionName } from './schema'

/** The record that an id names, removed or not. An id such as 'constructor' must not find what every object has. */
export function recordOf<S extends SectionName>(budget: Budget, section: S, id: string | null): RecordOf<S> | null {
  const records = budget[section]
  return id !== null && Object.hasOwn(records, id) ? ((records[id] as RecordOf<S> | undefined) ?? null) : null
}

/** The record that an id names, unless it was taken out. */
export function livingRecord<S extends SectionName>(budget: Budget, section: S, id: string | null): RecordOf<S> | null {
  const record = recordOf(budget, section, id)
  return record === null || record.removed ? null : record
}

/** Living records with their ids, in channel order: by fractional index, ties by id. */
export function inOrder<S extends SectionName>(budget: Budget, section: S): [string, RecordOf<S>][] {
  const living = Object.entries(budget[section]).filter(([, record]) => !record.removed) as [string, RecordOf<S>][]
  return living.sort(([idA, a], [idB, b]) => compareOrder(a.order, idA, b.order, idB))
}

export function compareOrder(orderA: string, idA: string, orderB: string, idB: string): number {
  if (orderA !== orderB) return orderA < orderB ? -1 : 1
  return idA < idB ? -1 : idA > idB ? 1 : 0
}

/** What one record of each section is called. */
export const RECORD_WORDS: Readonly<Record<'head' | SectionName, string>> = {
  head: 'budget',
  assemblies: 'assembly',
  lossClasses: 'loss class',
  layers: 'layer',
  lines: 'line',
  planes: 'plane',
  allowances: 'allowance',
  shares: 'share',
  corners: 'corner',
  evidence: 'evidence',
  figures: 'figure',
  signOffs: 'required sign-off',
}

/** A record as messages name it: by its name, or by its id where it has none. */
export function nameOf(section: SectionName | 'head', id: string | null, record: object | null): string {
  if (section === 'head') return 'The link'
  const name = record !== null && 'name' in record && typeof record.name === 'string' ? record.name.trim() : ''
  return name === '' ? `${RECORD_WORDS[section]} without a name (${id})` : `'${name}'`
}

/** What a field is, in the schema's words, to stand inside a sentence. */
export function fieldWords(section: SectionName | 'head', field: string): string {
  const shape: Readonly<Record<string, object>> = section === 'head' ? head.shape : SECTIONS[section].shape
  const schema = Object.hasOwn(shape, field) ? shape[field] : undefined
  const what = schema ? fieldMeta.get(schema as never)?.what : undefined
  const first = what?.split(/[;.:,]/)[0]
  return first ? first.charAt(0).toLowerCase() + first.slice(1) : field
}
