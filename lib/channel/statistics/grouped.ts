/**
 * Root of the sum of squares of what varies on its own; inside a group everything varies together and adds linearly
 * (JCGM 100:2008, 5.2.2, with a correlation of 1 inside a group and 0 between groups).
 */
export function groupedRootSumSquare(parts: Iterable<{ readonly group: string; readonly value: number }>): number {
  const groups = new Map<string, number>()
  for (const part of parts) groups.set(part.group, (groups.get(part.group) ?? 0) + part.value)
  let sum = 0
  for (const value of groups.values()) sum += value * value
  return Math.sqrt(sum)
}
