import type { Present } from '../../../../../lib/sheet/wire'

/** People other than oneself by the place that they are at, as `data-place` names it. */
export function othersByPlace(people: readonly Present[]): ReadonlyMap<string, readonly Present[]> {
  const standing = new Map<string, Present[]>()
  for (const person of people) {
    if (person.me || !person.cell) continue
    const { section, id, field } = person.cell
    const key = `${section}/${id ?? ''}/${field ?? ''}`
    standing.set(key, [...(standing.get(key) ?? []), person])
  }
  return standing
}
