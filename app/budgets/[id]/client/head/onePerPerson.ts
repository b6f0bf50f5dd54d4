import type { Present } from '../../../../../lib/sheet/wire'

/** A person with two windows is one person here; oneself comes last. */
export function onePerPerson(people: readonly Present[]): readonly Present[] {
  const seen = new Map<string, Present>()
  for (const person of people) if (!seen.has(person.person)) seen.set(person.person, person)
  return [...seen.values()].sort((a, b) => Number(a.me) - Number(b.me))
}
