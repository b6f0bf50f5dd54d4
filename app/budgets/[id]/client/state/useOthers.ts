'use client'
import { useMemo } from 'react'
import type { Present } from '../../../../../lib/sheet/wire'

/** People other than oneself by the place that they are at, as `data-place` names it. */
export function useOthers(people: readonly Present[]): ReadonlyMap<string, readonly Present[]> {
  return useMemo(() => {
    const standing = new Map<string, Present[]>()
    for (const person of people) {
      if (person.me || !person.cell) continue
      const { section, id, field } = person.cell
      const key = `${section}/${id ?? ''}/${field ?? ''}`
      standing.set(key, [...(standing.get(key) ?? []), person])
    }
    return standing
  }, [people])
}
