import { crossCheck } from '../../budget/crossCheck'
import { type Budget, LIMITS, SECTIONS, type SectionName } from '../../budget/schema'
import type { Change } from '../../sheet/change'
import { isSection, refuseValue } from '../../sheet/layout'
import { refuse } from './refusal'

/**
 * Judges the merged result where the values of an edit alone do not say it: whole records, notes that several people typed
 * in, limits over several records. @throws Refuse
 * @param lanes keys of lane values that the edit writes
 */
export function judgeResult(before: Budget, after: Budget, changes: readonly Change[], lanes: readonly string[]): void {
  const made = new Map<string, SectionName>()
  for (const change of changes) {
    if (change.kind === 'text') judgeNote(change)
    if (change.kind === 'add' && isSection(change.section)) made.set(`${change.section}/${change.id}`, change.section)
  }
  for (const [path, section] of made) judgeRecord(after, section, path.slice(section.length + 1))
  for (const section of new Set(made.values())) judgeCount(after, section)
  // Costs a look at every lane value, so only where a line or a lane value is new.
  if (made.size === 0 && lanes.every((key) => Object.hasOwn(before.laneValues, key))) return
  const reason = crossCheck(after)
  if (reason !== null) refuse('invalid-result', reason)
}

function judgeNote(change: Change): void {
  if (!isSection(change.section)) return
  const reason = refuseValue(change.section, change.field, change.after)
  if (reason !== null) refuse('invalid-result', reason)
}

function judgeRecord(after: Budget, section: SectionName, id: string): void {
  const result = SECTIONS[section].safeParse(after[section][id])
  if (result.success) return
  const [issue] = result.error.issues
  refuse('invalid-result', `'${id}' in '${section}', ${issue?.path.join('.')}: ${issue?.message}`)
}

function judgeCount(after: Budget, section: SectionName): void {
  const limit = LIMITS.recordsPerSection
  if (Object.keys(after[section]).length > limit)
    refuse('invalid-result', `A budget has at most ${limit} records in '${section}', those taken out included.`)
}
