import { describe, expect, it } from 'vitest'
import * as Y from 'yjs'
import { LIMITS } from '../../../lib/budget/schema'
import { readBudget, seedUpdate } from '../../../lib/sheet/seed'
import { Shadow } from '../../../lib/sync/gate/shadow'
import { any, deleted, type ForgedItem, forge, type } from '../support/forge'
import { copyOf, editOf, noteOf, putRecord, recordOf } from '../support/sheet'
import { smallBudget } from '../support/world'

const ANN = 50
const BEN = 60

function shadowOver(change: (doc: Y.Doc) => void = () => undefined) {
  const live = new Y.Doc()
  live.clientID = 2
  Y.applyUpdate(live, seedUpdate(smallBudget(), 1))
  live.transact(() => change(live))
  const accepted: Uint8Array[] = []
  return { live, accepted, shadow: new Shadow(() => ({ live, accepted })) }
}

/** Offers and expects a refusal that leaves the shadow as it was. */
function refusal(shadow: Shadow, update: Uint8Array, clientId = ANN) {
  const before = shadow.budget
  const verdict = shadow.offer(update, clientId, true)
  expect(shadow.budget).toEqual(before)
  return verdict.refused && { code: verdict.refused.code, reason: verdict.refused.reason, deep: verdict.deep }
}

describe('the merged result', () => {
  const own = (...structs: ForgedItem[]) => forge([{ client: ANN, clock: 0, structs }])
  const idOf = (doc: Y.Doc, root: string, ...path: string[]) => {
    let map: Y.Map<unknown> = doc.getMap(root)
    for (const key of path.slice(0, -1)) map = map.get(key) as Y.Map<unknown>
    const item = map._map.get(path.at(-1) ?? '')
    if (!item) throw new Error('no item')
    return item.lastId
  }
  const erase = (id: Y.ID) => forge([], { [id.client]: [[id.clock, 1]] })
  const gone: [string, (doc: Y.Doc) => Uint8Array][] = [
    ['a field of a line', (doc) => erase(idOf(doc, 'lines', 'trace', 'loss'))],
    ['a field of the head', (doc) => erase(idOf(doc, 'head', 'name'))],
    ['a line', (doc) => erase(idOf(doc, 'lines', 'trace'))],
    ['a note', (doc) => erase(idOf(doc, 'lines', 'trace', 'note'))],
    ['a lane value', (doc) => erase(idOf(doc, 'laneValues', 'trace/1/length'))],
    [
      'a field, by content that comes deleted',
      (doc) => own({ origin: idOf(doc, 'lines', 'trace', 'loss'), ...deleted(1) }),
    ],
    ['a lane value that comes deleted', () => own({ parent: 'laneValues', key: 'trace/2/length', ...deleted(1) })],
    [
      'a field that is overwritten and erased',
      (doc) => {
        const id = idOf(doc, 'lines', 'trace', 'loss')
        return forge([{ client: ANN, clock: 0, structs: [{ origin: id, ...any('9 dB') }] }], {
          [ANN]: [[0, 1]],
          [id.client]: [[id.clock, 1]],
        })
      },
    ],
  ]
  it.each(gone)('[W1.21] %s may not vanish', (_, make) => {
    const { live, shadow } = shadowOver()
    expect(refusal(shadow, make(live))).toMatchObject({ code: 'invalid-result', deep: true })
  })

  it('[W1.22] a record is made whole', () => {
    const { live, shadow } = shadowOver()
    expect(refusal(shadow, own({ parent: 'lines', key: 'bare', ...type(1) }))?.code).toBe('invalid-result')
    const almost = editOf(copyOf(live, ANN), (doc) => {
      putRecord(doc, 'lines', 'almost', { order: 'a9' })
      recordOf(doc, 'lines', 'almost').delete('loss')
    })
    expect(refusal(shadow, almost)?.code).toBe('invalid-result')
    const whole = editOf(copyOf(live, BEN), (doc) => putRecord(doc, 'lines', 'whole', { order: 'a9' }))
    expect(shadow.offer(whole, BEN, true).refused).toBeNull()
    expect(shadow.budget.lines.whole?.order).toBe('a9')
  })

  it('[W1.22] a record without an order key', () => {
    const { live, shadow } = shadowOver()
    const update = editOf(copyOf(live, ANN), (doc) => putRecord(doc, 'lines', 'lost', {}))
    expect(refusal(shadow, update)?.code).toBe('bad-value')
  })

  it('[W1.23] line 501, record 501 of a section, a lane value of no line', () => {
    const { live, shadow } = shadowOver((doc) => {
      for (let count = 3; count <= LIMITS.lines; count++) putRecord(doc, 'lines', `line-${count}`, { order: 'a9' })
      for (let count = 1; count <= LIMITS.recordsPerSection; count++)
        putRecord(doc, 'corners', `c-${count}`, { order: 'a9' })
    })
    const line = editOf(copyOf(live, ANN), (doc) => putRecord(doc, 'lines', 'more', { order: 'a9' }))
    expect(refusal(shadow, line)).toMatchObject({ code: 'invalid-result', reason: expect.stringContaining('500') })
    const corner = editOf(copyOf(live, ANN), (doc) => putRecord(doc, 'corners', 'more', { order: 'a9' }))
    expect(refusal(shadow, corner)).toMatchObject({ code: 'invalid-result', reason: expect.stringContaining('500') })
    const lane = editOf(copyOf(live, ANN), (doc) => doc.getMap('laneValues').set('none/1/length', null))
    expect(refusal(shadow, lane)).toMatchObject({ code: 'invalid-result', reason: expect.stringContaining('none') })
  })

  it('[W1.23] a note that two people fill past its length: each alone would fit', () => {
    const { live, accepted, shadow } = shadowOver()
    const half = 'x'.repeat(2_500)
    const fill = (id: number) => editOf(copyOf(live, id), (doc) => noteOf(doc, 'lines', 'trace').insert(0, half))
    const [one, two] = [fill(ANN), fill(BEN)]
    expect(shadow.offer(one, ANN, true).refused).toBeNull()
    accepted.push(one)
    expect(refusal(shadow, two, BEN)?.code).toBe('invalid-result')
    expect(shadow.budget.lines.trace?.note).toBe(half)
  })

  it('[W4.4] two blocks of one client id that follow each other: Yjs would keep the second and wait for the first', () => {
    const { live, shadow } = shadowOver()
    const origin = idOf(live, 'lines', 'trace', 'loss')
    const blocks = forge([
      { client: ANN, clock: 0, structs: [{ origin, ...any('1 dB') }] },
      { client: ANN, clock: 1, structs: [{ origin: { client: ANN, clock: 0 }, ...any('2 dB') }] },
    ])
    expect(refusal(shadow, blocks)).toMatchObject({ code: 'malformed', deep: true })
    const honest = editOf(copyOf(live, BEN), (doc) => recordOf(doc, 'lines', 'trace').set('loss', '3 dB'))
    expect(shadow.offer(honest, BEN, true)).toMatchObject({ refused: null, changes: [{ after: '3 dB' }] })
  })

  it('[W4.5] what is accepted stays after a refusal, and is what live becomes', () => {
    const { live, accepted, shadow } = shadowOver()
    const page = copyOf(live, ANN)
    for (const value of ['1 dB', '2 dB', '3 dB']) {
      const update = editOf(page, (doc) => recordOf(doc, 'lines', 'trace').set('loss', value))
      const verdict = shadow.offer(update, ANN, true)
      expect(verdict).toMatchObject({ refused: null, changes: [{ after: value }] })
      accepted.push(update)
      const bare = forge([{ client: BEN, clock: 0, structs: [{ parent: 'lines', key: 'bare', ...type(1) }] }])
      expect(refusal(shadow, bare, BEN)?.deep).toBe(true)
    }
    for (const update of accepted) Y.applyUpdate(live, update)
    expect(shadow.budget).toEqual(readBudget(live))
    expect(shadow.budget.lines.trace?.loss).toBe('3 dB')
  })
})
