import type { ShareUse } from '../evaluation'
import { ownerOf } from '../lineItem'
import { LOSS, typedValue } from '../quantities'
import { inOrder, recordOf } from '../record'
import type { Budget, RecordOf } from '../schema'
import type { Counted } from './sum'

type Target = ShareUse['of']

/** Whom a share is given to; null where it names nobody or more than one. */
export function targetOf(share: RecordOf<'shares'>): Target | null {
  const { assembly, line, discipline } = share
  const targets: Target[] = []
  if (assembly !== null) targets.push({ kind: 'assembly', ref: assembly })
  if (line !== null) targets.push({ kind: 'line', ref: line })
  if (discipline !== null) targets.push({ kind: 'discipline', ref: discipline })
  return targets.length === 1 ? (targets[0] ?? null) : null
}

/** What each share of an allowance has used of what it was given: nominal, in the judged corner and lane. */
export function sharesOf(budget: Budget, allowance: string, lines: readonly Counted[]): ShareUse[] {
  return inOrder(budget, 'shares').flatMap(([id, share]) => {
    const of = targetOf(share)
    const shareDb = typedValue(LOSS, share.loss)
    if (share.allowance !== allowance || of === null || shareDb === null) return []
    const own = lines.filter((line) => belongs(line, of))
    const known = own.filter(({ loss, sign }) => sign !== 0 && loss.nominal !== null)
    const usedDb = known.reduce((sum, { sign, loss }) => sum + sign * (loss.nominal ?? 0), 0)
    const undecidedLines = own
      .filter(({ loss, sign }) => sign !== 0 && loss.nominal === null)
      .map(({ item }) => item.id)
    return [{ id, of, shareDb, usedDb, freeDb: shareDb - usedDb, undecidedLines }]
  })
}

function belongs({ item }: Counted, of: Target): boolean {
  if (of.kind === 'line') return item.id === of.ref
  if (of.kind === 'assembly') return item.assembly !== null && item.line.assembly === of.ref
  return ownerOf(item) === of.ref
}

/**
 * Decibels given away in all. A line's share inside an assembly that has one itself is part of it; shares of disciplines are
 * another way to cut the same allowance, so the larger of the two sums counts.
 */
export function givenDb(budget: Budget, shares: readonly ShareUse[]): number {
  const assemblies = new Set(shares.filter(({ of }) => of.kind === 'assembly').map(({ of }) => of.ref))
  let pieces = 0
  let disciplines = 0
  for (const { of, shareDb } of shares) {
    if (of.kind === 'discipline') disciplines += shareDb
    else if (of.kind === 'assembly' || !assemblies.has(recordOf(budget, 'lines', of.ref)?.assembly ?? ''))
      pieces += shareDb
  }
  return Math.max(pieces, disciplines)
}
