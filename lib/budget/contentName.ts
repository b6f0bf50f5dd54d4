/** Names kept in all, and different contents per record: budgets may share ids. */
const MOST = 20_000
const PER_RECORD = 4

type Named = { readonly copy: Readonly<Record<string, unknown>>; readonly name: string }

const kept = new Map<string, Named[]>()
let made = 0

/**
 * A short name for what a record says: the same values have the same name, other values another. The values are compared, not
 * the object's identity, because a caller may change a budget in place or build it anew for every edit.
 * @param key what the record is, such as 'lines/l3'; only records of one key are compared
 * @param record flat; records of one key have the same fields
 */
export function contentName(key: string, record: object): string {
  const values = record as Readonly<Record<string, unknown>>
  const named = kept.get(key) ?? []
  for (const one of named) if (same(one.copy, values)) return one.name
  if (kept.size >= MOST) kept.clear()
  made++
  const name = `${key}#${made}`
  kept.set(key, [{ copy: { ...values }, name }, ...named.slice(0, PER_RECORD - 1)])
  return name
}

function same(a: Readonly<Record<string, unknown>>, b: Readonly<Record<string, unknown>>): boolean {
  for (const field in a) if (a[field] !== b[field]) return false
  return true
}
