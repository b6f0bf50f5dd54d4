import { type Budget, LIMITS } from './schema'

/**
 * Limits that concern several records at once, for whoever lets an edit in. A reference to a record that does not exist is not
 * refused, because two people may remove and refer at the same time: the evaluation flags it.
 * @returns null, or a sentence that says what to do
 */
export function crossCheck(budget: Budget): string | null {
  const lines = Object.keys(budget.lines).length
  if (lines > LIMITS.lines)
    return `A budget holds at most ${LIMITS.lines} lines, those taken out included; this one would hold ${lines}.`
  const laneKeys = Object.keys(budget.laneValues)
  if (laneKeys.length > LIMITS.laneValues) return `A budget holds at most ${LIMITS.laneValues} lane values.`
  for (const key of laneKeys) {
    const line = key.slice(0, key.indexOf('/'))
    if (!Object.hasOwn(budget.lines, line))
      return `The lane value '${key}' names a line that does not exist; add the line first.`
  }
  return null
}
