import { inOrder, livingRecord } from './record'
import type { Assembly, Basis, Budget, Grade, Line, LossClass, Owner } from './schema'

/** A line with the records that it rests on. */
export type LineItem = {
  readonly id: string
  readonly line: Line
  /** The lane whose values the line has; null: the line as it stands for all lanes. */
  readonly lane: number | null
  readonly assembly: Assembly | null
  /** The loss class, where the line's model uses one. */
  readonly lossClass: LossClass | null
}

export function lineItems(budget: Budget): LineItem[] {
  return inOrder(budget, 'lines').map(([id, line]) => itemOf(budget, id, line, null))
}

export function itemOf(budget: Budget, id: string, line: Line, lane: number | null): LineItem {
  return {
    id,
    line,
    lane,
    assembly: livingRecord(budget, 'assemblies', line.assembly),
    lossClass: line.model === 'class' ? livingRecord(budget, 'lossClasses', line.lossClass) : null,
  }
}

export function ownerOf({ line, assembly }: LineItem): Owner | null {
  return line.owner ?? assembly?.owner ?? null
}

export function basisOf({ line, lossClass }: LineItem): Basis | null {
  return line.basis ?? lossClass?.basis ?? null
}

export function gradeOf({ line, lossClass }: LineItem): Grade {
  return line.grade ?? lossClass?.grade ?? 'nominal'
}

/** Said in place of a group: the line varies on its own. */
const OWN = 'none'

/**
 * What a line varies together with: its own group, else its assembly's, else the assembly itself. 'none' holds only with a
 * note that says why; without one the assembly's group stays, which is the larger sum.
 */
export function groupOf({ id, line, assembly }: LineItem): string {
  const own = line.group?.trim() ?? ''
  if (own === OWN && hasGroupNote(line)) return id
  if (own !== '' && own !== OWN) return own
  return assembly?.group?.trim() || (assembly === null ? null : line.assembly) || id
}

export function groupOffWithoutNote(line: Line): boolean {
  return line.group?.trim() === OWN && !hasGroupNote(line)
}

function hasGroupNote(line: Line): boolean {
  return (line.groupNote?.trim() ?? '') !== ''
}
