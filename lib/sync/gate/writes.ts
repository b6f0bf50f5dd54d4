import type * as Y from 'yjs'
import type { Change } from '../../sheet/change'
import { judgeWrites } from '../../sheet/overtaken'
import { placeKey } from '../../sheet/place'

/**
 * Completes the visible changes of an update by what became of its writes: a write that another one won over is a change of
 * its own, and one that replaced a value its author had not seen says so (write path, rule 5).
 */
export function withWrites(
  changes: readonly Change[],
  update: Uint8Array,
  doc: Y.Doc,
  before: ReadonlyMap<number, number>,
): Change[] {
  const { overtaken, unseen } = judgeWrites(update, doc, before)
  const blind = new Set(unseen.map(placeKey))
  const seen = changes.map((change): Change => {
    return change.kind === 'set' && blind.has(placeKey(change)) ? { ...change, unseen: true } : change
  })
  const lost = overtaken
    .filter(({ written, kept }) => written !== kept)
    .map(({ kept, ...place }): Change => ({ ...place, kind: 'overtaken', before: kept, after: kept }))
  return [...seen, ...lost]
}
