import type { Budget, Scalar } from '../../budget/schema'
import type { Operation } from '../change'
import { placeKey, placesOf, valueAt } from '../place'
import type { Deed } from './record'

export type Fit = {
  /** Operations that can be done again. */
  readonly fits: readonly Operation[]
  /** Those that cannot, with what they were made on and why. */
  readonly conflicts: readonly { readonly operation: Operation; readonly base: Scalar; readonly reason: string }[]
}

/**
 * Which operations of a deed can be done again on a budget: those whose field still has the value that they were made on.
 * What already stands as the person wanted it is neither.
 * @param sameEpoch false after a new epoch: the server may then have the edit although its acknowledgement was lost, so
 * typing is not put into a note that has changed since, where it could come twice
 */
export function fitDeed(budget: Budget, deed: Deed, sameEpoch: boolean): Fit {
  const fits: Operation[] = []
  const conflicts: Fit['conflicts'][number][] = []
  /** What fitting operations before have put or will put at a place. */
  const after = new Map<string, Scalar>()
  const added = new Set<string>()

  for (const [index, operation] of deed.operations.entries()) {
    const base = deed.bases[index] ?? null
    if (operation.op === 'add') {
      if (Object.hasOwn(budget[operation.section], operation.id)) continue
      fits.push(operation)
      added.add(`${operation.section}/${operation.id}`)
      continue
    }
    const [place] = placesOf(operation)
    if (place === undefined) continue
    const key = placeKey(place)
    const owner = place.section === 'laneValues' ? 'lines' : place.section
    const fresh = added.has(`${owner}/${place.id}`)
    const there = fresh || owner === 'head' || (place.id !== null && Object.hasOwn(budget[owner], place.id))
    const wanted = operation.op === 'note' ? operation.text : operation.value
    const before = fresh ? base : (valueAt(budget, place) ?? null)
    const present = after.has(key) ? (after.get(key) ?? null) : before
    if (!there) {
      conflicts.push({ operation, base, reason: 'The row that it belongs to is not in the budget.' })
    } else if (present === base || (operation.op === 'note' && sameEpoch)) {
      fits.push(operation)
      after.set(key, wanted)
    } else if (present !== wanted) {
      conflicts.push({ operation, base, reason: `Somebody has changed this since; it reads ${said(present)} now.` })
    }
  }
  return { fits, conflicts }
}

function said(value: Scalar): string {
  return value === null || value === '' ? 'empty' : `'${String(value)}'`
}
