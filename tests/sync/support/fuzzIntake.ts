import { expect } from 'vitest'
import * as Y from 'yjs'
import { readBudget, seedUpdate } from '../../../lib/sheet/seed'
import { keyOfUpdate } from '../../../lib/sync/room/editKey'
import { Intake } from '../../../lib/sync/room/intake'
import type { QueuedEdit } from '../../../lib/sync/room/queued'
import { any, forge, type } from './forge'
import { type Random, seeded } from './random'
import { PEOPLE } from './sessions'
import { copyOf, editOf, noteOf, putRecord, recordOf } from './sheet'
import { smallBudget } from './world'

/** A live document, the intake over it, and what has been committed. */
export class Bench {
  readonly live = new Y.Doc()
  readonly intake: Intake
  readonly committed: Uint8Array[] = []
  private readonly listeners = new Set<(update: Uint8Array) => void>()

  constructor() {
    const seed = seedUpdate(smallBudget(), 1)
    Y.applyUpdate(this.live, seed)
    this.committed.push(seed)
    this.intake = new Intake(this.live)
    this.live.on('update', (update: Uint8Array) => {
      for (const listener of this.listeners) listener(update)
    })
  }

  onCommit(listener: (update: Uint8Array) => void): void {
    this.listeners.add(listener)
  }

  offer(update: Uint8Array, clientId: number): string | null {
    const verdict = this.intake.offer(update, clientId, true)
    if (verdict.refused) return verdict.refused.code
    this.intake.queue(queued(update, clientId, verdict))
    return null
  }

  begin(most: number): void {
    this.intake.take(most)
  }

  finish(): void {
    const landed = this.intake.landed()
    this.live.transact(() => {
      for (const item of landed) {
        if (item.kind !== 'edit') continue
        Y.applyUpdate(this.live, item.update)
        this.committed.push(item.update)
      }
    })
  }

  replayed(): Y.Doc {
    const doc = new Y.Doc()
    for (const update of this.committed) Y.applyUpdate(doc, update)
    return doc
  }
}

let keys = 0
function queued(update: Uint8Array, clientId: number, verdict: Pick<QueuedEdit, 'changes' | 'after'>): QueuedEdit {
  return {
    kind: 'edit',
    actor: { identity: PEOPLE.ann, door: 'screen' },
    from: null,
    epoch: 1,
    key: keyOfUpdate(`edit-${clientId}-${keys++}`, update),
    clientId,
    update,
    changes: verdict.changes,
    after: verdict.after,
    answer: () => undefined,
  }
}

/** A page that edits its own copy, hears of commits late, and begins anew when it is refused. */
class Writer {
  doc: Y.Doc
  private heard: Uint8Array[] = []

  constructor(
    private readonly bench: Bench,
    private id: number,
  ) {
    this.doc = copyOf(bench.live, id)
    bench.onCommit((update) => this.heard.push(update))
  }

  hear(): void {
    for (const update of this.heard.splice(0)) Y.applyUpdate(this.doc, update)
  }

  write(random: Random): string | null {
    const update = random.chance(0.04) ? badUpdate(this.doc, this.id, random) : editOf(this.doc, honest(random))
    const code = this.bench.offer(update, this.id)
    if (code !== null) this.renew()
    return code
  }

  renew(): void {
    this.id += 100
    this.heard = []
    this.doc = copyOf(this.bench.live, this.id)
  }
}

let made = 0
function honest(random: Random): (doc: Y.Doc) => void {
  const line = random.pick(['trace', 'cable'])
  const deeds: ((doc: Y.Doc) => void)[] = [
    (doc) => recordOf(doc, 'lines', line).set('loss', `${random.below(20)} dB`),
    (doc) => recordOf(doc, 'lines', line).set('removed', random.chance(0.5)),
    (doc) => doc.getMap('head').set('laneCount', 1 + random.below(16)),
    (doc) => doc.getMap('laneValues').set(`${line}/${1 + random.below(3)}/length`, random.pick([null, '1 in', '2 in'])),
    (doc) => putRecord(doc, 'lines', `made-${made++}`, { order: 'a5', name: 'Made' }),
    (doc) => {
      const note = noteOf(doc, 'lines', line)
      if (note.length > 3 && random.chance(0.4)) note.delete(random.below(note.length - 2), 2)
      else note.insert(random.below(note.length + 1), random.pick(['a', 'bc', '🙂', ' d ']))
    },
  ]
  return random.pick(deeds)
}

function badUpdate(doc: Y.Doc, clientId: number, random: Random): Uint8Array {
  const clock = Y.getState(doc.store, clientId)
  const item = recordOf(doc, 'lines', 'trace')._map.get('loss')
  if (!item) throw new Error('no item')
  const block = (struct: Parameters<typeof forge>[0][number]['structs'][number]) =>
    forge([{ client: clientId, clock, structs: [struct] }])
  return random.pick([
    () => block({ parent: 'lines', key: `bare-${clientId}`, ...type(1) }),
    () => block({ origin: item.lastId, ...any('no loss') }),
    () => forge([], { [item.id.client]: [[item.id.clock, item.length]] }),
    () => forge([{ client: clientId, clock: clock + 5, structs: [{ gc: 1 }] }]),
  ])()
}

/**
 * Four people write at random, some of it badly, while commits are in flight and some fail. Checks at the end of every seed
 * that shadow, live and a plain replay of what was committed are the same. @returns how often what happened
 */
export function fuzzIntake(first: number, last: number): Record<string, number> {
  const counts: Record<string, number> = {}
  for (let seed = first; seed <= last; seed++) {
    const random = seeded(seed)
    const bench = new Bench()
    const writers = [10, 20, 30, 40].map((id) => new Writer(bench, id))
    for (let step = 0; step < 60; step++) {
      const writer = random.pick(writers)
      if (random.chance(0.5)) writer.hear()
      const code = writer.write(random) ?? 'accepted'
      counts[code] = (counts[code] ?? 0) + 1
      if (random.chance(0.2)) {
        bench.begin(1 + random.below(5))
        // What comes while the commit is in flight.
        for (const other of writers) if (random.chance(0.5)) other.write(random)
        if (random.chance(0.15)) {
          bench.intake.clear()
          for (const other of writers) other.renew()
          counts.failures = (counts.failures ?? 0) + 1
        } else bench.finish()
      }
    }
    while (bench.intake.hasWaiting) {
      bench.begin(100)
      bench.finish()
    }
    const replayed = bench.replayed()
    const where = `seed ${seed}`
    expect(readBudget(bench.live), where).toEqual(readBudget(replayed))
    expect(bench.intake.budget, where).toEqual(readBudget(bench.live))
    expect(Y.encodeStateVector(bench.live), where).toEqual(Y.encodeStateVector(replayed))
    for (const doc of [bench.live, replayed])
      expect([doc.store.pendingStructs, doc.store.pendingDs], where).toEqual([null, null])
  }
  return counts
}
