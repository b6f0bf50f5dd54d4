import * as encoding from 'lib0/encoding'
import { describe, expect, it } from 'vitest'
import * as Y from 'yjs'
import { judgeContent } from '../../../lib/sync/gate/contents'
import { judgeFrame } from '../../../lib/sync/gate/frame'
import { any, binary, deleted, type ForgedItem, forge, string, subdocument, type } from '../support/forge'
import { copyOf, editOf, handMadeSheet, noteOf, putRecord, recordOf } from '../support/sheet'

const SEED = 1
const ANN = 50
const BEN = 60

function sheet() {
  return copyOf(handMadeSheet(SEED), 999)
}

function judge(update: Uint8Array, shadow = sheet(), clientId = ANN, owned = true) {
  const before = Y.encodeStateAsUpdate(shadow)
  const verdict = judgeFrame(shadow, update, clientId, owned)
  expect(Y.encodeStateAsUpdate(shadow), 'the frame stage touches nothing').toEqual(before)
  return verdict.refused?.code ?? verdict
}

/** The id of the item that holds a field now. */
function idOf(doc: Y.Doc, section: 'lines', id: string, field: string): Y.ID {
  const item = recordOf(doc, section, id)._map.get(field)
  if (!item) throw new Error('no item')
  return item.lastId
}
function recordId(doc: Y.Doc, id: string): Y.ID {
  const item = doc.getMap('lines')._map.get(id)
  if (!item) throw new Error('no item')
  return item.id
}

describe('what honest pages send passes', () => {
  const cases: [string, (doc: Y.Doc) => void][] = [
    ['a field of a line', (doc) => recordOf(doc, 'lines', 'trace').set('loss', '6 dB')],
    [
      'a field set three times in one edit',
      (doc) => ['1 dB', '2 dB', '3 dB'].map((v) => recordOf(doc, 'lines', 'trace').set('loss', v)),
    ],
    ['a field of the head', (doc) => doc.getMap('head').set('laneCount', 16)],
    ['a new line', (doc) => putRecord(doc, 'lines', 'via', { order: 'a2', name: 'Via', note: 'by the ball' })],
    ['a new lane value', (doc) => doc.getMap('laneValues').set('cable/2/length', null)],
    ['typing in a note', (doc) => noteOf(doc, 'lines', 'trace').insert(0, 'länger 🙂')],
    [
      'typing and erasing in a note',
      (doc) => {
        noteOf(doc, 'lines', 'trace').insert(0, 'abc')
        noteOf(doc, 'lines', 'trace').delete(1, 1)
      },
    ],
  ]
  it.each(cases)('[W4.1] %s', (_, change) => {
    const page = copyOf(sheet(), ANN)
    expect(judge(editOf(page, change))).toMatchObject({ refused: null, brings: 'something' })
  })

  it('[W4.1] undo and redo of a field, by Yjs’ own undo manager', () => {
    const page = copyOf(sheet(), ANN)
    const shadow = sheet()
    const record = recordOf(page, 'lines', 'trace')
    const undo = new Y.UndoManager(record, { captureTimeout: 0 })
    const steps = [() => record.set('loss', '6 dB'), () => undo.undo(), () => undo.redo()]
    page.on('update', (update: Uint8Array) => {
      expect(judge(update, shadow)).toMatchObject({ refused: null, brings: 'something' })
      Y.applyUpdate(shadow, update)
    })
    for (const step of steps) step()
    expect(recordOf(shadow, 'lines', 'trace').get('loss')).toBe('6 dB')
  })

  it('[W4.2] structs that are known are ignored; nothing new under a new edit id is refused', () => {
    const page = copyOf(sheet(), ANN)
    const first = editOf(page, (doc) => recordOf(doc, 'lines', 'trace').set('loss', '6 dB'))
    const second = editOf(page, (doc) => recordOf(doc, 'lines', 'trace').set('loss', '7 dB'))
    const shadow = sheet()
    Y.applyUpdate(shadow, first)
    expect(judge(Y.mergeUpdates([first, second]), shadow)).toMatchObject({ brings: 'something' })
    expect(judge(first, shadow)).toBe('malformed')
  })

  it('[W4.2] erasing characters that somebody else has erased meanwhile is told apart', () => {
    const seed = handMadeSheet(SEED)
    noteOf(seed, 'lines', 'trace').insert(0, 'abc')
    const ann = copyOf(seed, ANN)
    const ben = copyOf(seed, BEN)
    const shadow = copyOf(seed, 999)
    const one = editOf(ann, (doc) => noteOf(doc, 'lines', 'trace').delete(0, 2))
    const two = editOf(ben, (doc) => noteOf(doc, 'lines', 'trace').delete(0, 2))
    expect(judge(one, shadow)).toMatchObject({ brings: 'something' })
    Y.applyUpdate(shadow, one)
    expect(judge(two, shadow, BEN)).toMatchObject({ refused: null, brings: 'erased' })
  })
})

describe('gaps', () => {
  it('[W4.3] a missing edit of the same page: the first missing clock is told', () => {
    const page = copyOf(sheet(), ANN)
    editOf(page, (doc) => recordOf(doc, 'lines', 'trace').set('loss', '6 dB'))
    const later = editOf(page, (doc) => recordOf(doc, 'lines', 'cable').set('loss', '7 dB'))
    const verdict = judgeFrame(sheet(), later, ANN, true)
    expect(verdict.refused).toMatchObject({ code: 'gap', missing: { clientId: ANN, clock: 0 } })
  })

  it('[W4.3] an origin, a right origin or a parent of another page that is not known', () => {
    const ann = copyOf(sheet(), ANN)
    const ben = copyOf(sheet(), BEN)
    Y.applyUpdate(
      ann,
      editOf(ben, (doc) => putRecord(doc, 'lines', 'pad', { order: 'a3' })),
    )
    const missing = { code: 'gap', missing: { clientId: BEN, clock: 0 } }
    const parent = editOf(ann, (doc) => recordOf(doc, 'lines', 'pad').set('loss', '1 dB'))
    expect(judgeFrame(sheet(), parent, ANN, true).refused).toMatchObject(missing)
    const left = forge([{ client: ANN, clock: 0, structs: [{ origin: { client: BEN, clock: 3 }, ...string('a') }] }])
    expect(judgeFrame(sheet(), left, ANN, true).refused).toMatchObject(missing)
    const right = forge([
      { client: ANN, clock: 0, structs: [{ rightOrigin: { client: BEN, clock: 3 }, ...string('a') }] },
    ])
    expect(judgeFrame(sheet(), right, ANN, true).refused).toMatchObject(missing)
  })

  it('[W4.3] a deletion of own characters that have not arrived', () => {
    const page = copyOf(sheet(), ANN)
    editOf(page, (doc) => noteOf(doc, 'lines', 'trace').insert(0, 'abc'))
    const later = editOf(page, (doc) => noteOf(doc, 'lines', 'trace').delete(0, 1))
    expect(judgeFrame(sheet(), later, ANN, true).refused).toMatchObject({
      code: 'gap',
      missing: { clientId: ANN, clock: 0 },
    })
  })
})

describe('whose client id', () => {
  it('[W3.24] new structs of an id that is not this person’s, or not the one in the header', () => {
    const update = editOf(copyOf(sheet(), ANN), (doc) => recordOf(doc, 'lines', 'trace').set('loss', '6 dB'))
    expect(judge(update, sheet(), ANN, false)).toBe('foreign-client-id')
    expect(judge(update, sheet(), BEN, true)).toBe('foreign-client-id')
  })
})

describe('refused before the shadow is touched', () => {
  const one = (item: ForgedItem, client = ANN) => forge([{ client, clock: 0, structs: [item] }])
  const doc = sheet()
  const trace = recordId(doc, 'trace')
  const loss = idOf(doc, 'lines', 'trace', 'loss')
  const note = idOf(doc, 'lines', 'trace', 'note')
  const inField = (content: Pick<ForgedItem, 'ref' | 'write'>) => one({ origin: loss, ...content })
  const nested = Array.from({ length: 20_000 }, (_, index) =>
    index === 0
      ? { parent: 'lines', key: 'deep', ...type(1) }
      : { parent: { client: ANN, clock: index - 1 }, key: 'm', ...type(1) },
  )
  const deepAny = () => {
    const open = Array.from({ length: 20_000 }, () => '\x76\x01\x01m').join('')
    const bytes = new TextEncoder().encode(`${open}\x7e`)
    const content = {
      ref: 8,
      write: (encoder: encoding.Encoder) => {
        encoding.writeVarUint(encoder, 1)
        encoding.writeUint8Array(encoder, bytes)
      },
    }
    return inField(content)
  }
  const cases: [string, string, () => Uint8Array][] = [
    ['bytes that are no update', 'malformed', () => new Uint8Array([1, 2, 3])],
    ['an empty frame', 'malformed', () => new Uint8Array()],
    ['an update of nothing', 'malformed', () => forge([])],
    ['over 4 MB', 'too-large', () => new Uint8Array(4 * 1024 * 1024 + 1)],
    ['a Skip', 'malformed', () => forge([{ client: ANN, clock: 0, structs: [{ skip: 3 }] }])],
    ['a client id over 2^32 − 1', 'malformed', () => one({ parent: 'head', key: 'name', ...any('x') }, 2 ** 33)],
    [
      'a run of collected content of 2^52',
      'malformed',
      () => forge([{ client: ANN, clock: 0, structs: [{ gc: 2 ** 52 }] }]),
    ],
    [
      'a run of collected content over 10,000',
      'malformed',
      () => forge([{ client: ANN, clock: 0, structs: [{ gc: 10_001 }] }]),
    ],
    ['a run of deleted content over 10,000', 'malformed', () => inField(deleted(10_001))],
    ['an empty struct', 'malformed', () => forge([{ client: ANN, clock: 0, structs: [{ gc: 0 }] }])],
    [
      'two blocks of one client id',
      'malformed',
      () =>
        forge([
          { client: ANN, clock: 0, structs: [{ origin: loss, ...any('1 dB') }] },
          { client: ANN, clock: 0, structs: [{ origin: loss, ...any('2 dB') }] },
        ]),
    ],
    ['a delete set for another page’s future clocks', 'malformed', () => forge([], { [BEN]: [[0, 1]] })],
    ['a delete set past the end of what is known', 'malformed', () => forge([], { [SEED]: [[0, 1_000_000]] })],
    [
      'overlapping delete ranges',
      'malformed',
      () =>
        forge([], {
          [SEED]: [
            [5, 3],
            [6, 3],
          ],
        }),
    ],
    ['an unknown root', 'outside-layout', () => one({ parent: 'rows', key: 'a', ...any(1) })],
    ['the root __proto__', 'outside-layout', () => one({ parent: '__proto__', key: 'a', ...any(1) })],
    ['a field __proto__ of a line', 'outside-layout', () => one({ parent: trace, key: '__proto__', ...any(1) })],
    ['a line __proto__', 'outside-layout', () => one({ parent: 'lines', key: '__proto__', ...type(1) })],
    ['a line of a bad id', 'outside-layout', () => one({ parent: 'lines', key: 'No Spaces', ...type(1) })],
    ['a field that does not exist', 'outside-layout', () => one({ parent: trace, key: 'colour', ...any('red') })],
    ['a field that every object has', 'outside-layout', () => one({ parent: trace, key: 'constructor', ...any('x') })],
    ['a list item in a root', 'outside-layout', () => one({ parent: 'lines', ...any(1) })],
    ['a list item in a line', 'outside-layout', () => one({ parent: trace, ...any(1) })],
    ['a list as a record', 'outside-layout', () => one({ parent: 'lines', key: 'new', ...type(0) })],
    [
      'XML text as a note',
      'outside-layout',
      () =>
        forge([
          {
            client: ANN,
            clock: 0,
            structs: [
              { parent: 'lines', key: 'new', ...type(1) },
              { parent: { client: ANN, clock: 0 }, key: 'note', ...type(6) },
            ],
          },
        ]),
    ],
    ['a value as a record', 'outside-layout', () => one({ parent: 'lines', key: 'new', ...any('x') })],
    ['a map over a record', 'outside-layout', () => one({ parent: 'lines', key: 'trace', ...type(1) })],
    ['a map after a record', 'outside-layout', () => one({ origin: trace, ...type(1) })],
    [
      'the same new record twice',
      'outside-layout',
      () =>
        forge([
          {
            client: ANN,
            clock: 0,
            structs: [
              { parent: 'lines', key: 'new', ...type(1) },
              { parent: 'lines', key: 'new', ...type(1) },
            ],
          },
        ]),
    ],
    ['a deleted record', 'outside-layout', () => one({ parent: 'lines', key: 'new', ...deleted(1) })],
    ['a new text over a note', 'outside-layout', () => one({ parent: trace, key: 'note', ...type(2) })],
    ['a value over a note', 'outside-layout', () => one({ origin: note, ...any('x') })],
    ['a map in a field', 'outside-layout', () => inField(type(1))],
    ['something below a value', 'outside-layout', () => one({ parent: loss, key: 'x', ...any(1) })],
    ['20,000 nested maps', 'outside-layout', () => forge([{ client: ANN, clock: 0, structs: nested }])],
    ['a value nested 20,000 deep', 'malformed', deepAny],
    ['an item on a later one', 'malformed', () => one({ origin: { client: ANN, clock: 4 }, ...any('1 dB') })],
    [
      'an item on collected content',
      'outside-layout',
      () =>
        forge([{ client: ANN, clock: 0, structs: [{ gc: 1 }, { origin: { client: ANN, clock: 0 }, ...any('1 dB') }] }]),
    ],
    [
      'neighbours in different places',
      'outside-layout',
      () => one({ origin: loss, rightOrigin: note, ...any('1 dB') }),
    ],
    ['a right neighbour of a field', 'outside-layout', () => one({ rightOrigin: loss, ...any('1 dB') })],
    ['two values in one field', 'outside-layout', () => inField(any('1 dB', '2 dB'))],
    ['text in a field', 'outside-layout', () => inField(string('1 dB'))],
    ['bytes in a field', 'outside-layout', () => inField(binary(new Uint8Array(3)))],
    ['a subdocument', 'outside-layout', () => inField(subdocument('guid'))],
    ['an object in a field', 'bad-value', () => inField(any({ a: 1 }))],
    ['a list in a field', 'bad-value', () => inField(any([1]))],
    ['undefined', 'bad-value', () => inField(any(undefined))],
    ['a BigInt', 'bad-value', () => inField(any(5n))],
    ['NaN', 'bad-value', () => one({ parent: 'head', key: 'laneCount', ...any(Number.NaN) })],
    ['an infinity', 'bad-value', () => one({ parent: 'head', key: 'laneCount', ...any(Number.POSITIVE_INFINITY) })],
    ['minus zero', 'bad-value', () => one({ parent: 'head', key: 'laneCount', ...any(-0) })],
    ['a number where text belongs', 'bad-value', () => inField(any(5))],
    ['a number over its bounds', 'bad-value', () => one({ parent: 'head', key: 'laneCount', ...any(257) })],
    [
      'a line of an unknown kind',
      'bad-value',
      () => one({ origin: idOf(doc, 'lines', 'trace', 'kind'), ...any('wormhole') }),
    ],
    ['a negative loss', 'bad-value', () => inField(any('-3 dB'))],
    ['another schema version', 'bad-value', () => one({ parent: 'head', key: 'schemaVersion', ...any(2) })],
    [
      'a lane value of a bad key',
      'bad-value',
      () => one({ parent: 'laneValues', key: 'trace/0/length', ...any('1 in') }),
    ],
    [
      'a lane value past the last lane',
      'bad-value',
      () => one({ parent: 'laneValues', key: 'trace/257/length', ...any('1 in') }),
    ],
    ['an attribute of a note', 'outside-layout', () => one({ parent: note, key: 'bold', ...any(true) })],
    ['a list value in a note', 'outside-layout', () => one({ parent: note, ...any('x') })],
  ]
  it.each(cases)('[W4.4] %s: %s', (_, code, make) => {
    expect(judge(make())).toBe(code)
  })

  it('[W4.4] format marks and objects in a note', () => {
    const page = copyOf(sheet(), ANN)
    noteOf(page, 'lines', 'trace').insert(0, 'abc')
    const shadow = copyOf(page, 999)
    expect(
      judge(
        editOf(page, (d) => noteOf(d, 'lines', 'trace').format(0, 2, { bold: true })),
        shadow,
      ),
    ).toBe('outside-layout')
    const other = copyOf(shadow, BEN)
    expect(
      judge(
        editOf(other, (d) => noteOf(d, 'lines', 'trace').insertEmbed(0, { image: 'x' })),
        shadow,
        BEN,
      ),
    ).toBe('outside-layout')
  })

  it('[W4.4] half of a character pair, wherever it may come from', () => {
    // The update format is UTF-8, which cannot carry one; the rule does not lean on that.
    const half = '\ud83d'
    expect(() => judgeContent({ at: 'text' }, new Y.ContentString(`a${half}`))).toThrow('character pair')
    const field = { at: 'field', section: 'lines', id: 'trace', field: 'loss' } as const
    expect(() => judgeContent(field, new Y.ContentAny([`5 dB${half}`]))).toThrow('character pair')
    expect(() => judgeContent({ at: 'text' }, new Y.ContentString('\ud83d\ude42'))).not.toThrow()
  })

  it('[W4.4] a run of which a part is known', () => {
    const shadow = sheet()
    const parent = note
    Y.applyUpdate(shadow, one({ parent, ...string('ab') }))
    expect(judge(one({ parent, ...string('abcd') }), shadow)).toBe('malformed')
  })

  it('[W4.4] content under a clock that is known is ignored, so it cannot be acknowledged as new', () => {
    const shadow = sheet()
    Y.applyUpdate(shadow, inField(any('6 dB')))
    expect(judge(inField(any('9 dB')), shadow)).toBe('malformed')
  })
})
