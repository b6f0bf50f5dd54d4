/** Records kept by kind, and different contents per record: budgets may share ids. */
const MOST = 20_000
const PER_RECORD = 4

type Named = { readonly fields: readonly string[]; readonly values: readonly unknown[]; readonly name: string }

/** Kind → id → contents. Kinds are few; an id is a key of its section, so that looking it up costs no new hash. */
const kept = new Map<string, Map<string, Named[]>>()
let made = 0

/**
 * A short name for what a record says: the same values have the same name, other values another. The values are compared, not
 * the object's identity, because a caller may change a budget in place or build it anew for every edit.
 * @param kind what the record is, such as 'lines'
 * @param id only records of one kind and id are compared
 * @param record flat
 */
export function contentName(kind: string, id: string, record: object): string {
  const ofKind = kept.get(kind) ?? new Map<string, Named[]>()
  kept.set(kind, ofKind)
  const named = ofKind.get(id) ?? []
  for (const one of named) if (same(one, record as Readonly<Record<string, unknown>>)) return one.name
  if (ofKind.size >= MOST) ofKind.clear()
  made++
  const one = { fields: Object.keys(record), values: Object.values(record), name: `${kind}/${id}#${made}` }
  ofKind.set(id, [one, ...named.slice(0, PER_RECORD - 1)])
  return one.name
}

/** Walks the record's own order, which is several times as fast as looking fields up; records in another order have another name. */
function same({ fields, values }: Named, record: Readonly<Record<string, unknown>>): boolean {
  let n = 0
  for (const field in record) {
    if (field !== fields[n] || record[field] !== values[n]) return false
    n++
  }
  return n === fields.length
}

const joined = new Map<string, { readonly first: string; readonly second: string; readonly name: string }>()

/** Three names as one: the same string object for the same three, so that maps keyed by it need not hash it anew. */
export function joinedName(own: string, first: string, second: string): string {
  const known = joined.get(own)
  if (known && known.first === first && known.second === second) return known.name
  if (joined.size >= MOST) joined.clear()
  const name = `${own}|${first}|${second}`
  joined.set(own, { first, second, name })
  return name
}
