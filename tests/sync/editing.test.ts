import { describe, expect, it } from 'vitest'
import { verifyEntries } from '../../lib/records/journal/verify'
import { readBudget } from '../../lib/sheet/seed'
import { lossOf, setLoss } from './support/changes'
import { holdableDisk } from './support/disk'
import { Page, syncFrame } from './support/page'
import { editOf, noteOf, putRecord, recordOf } from './support/sheet'
import { openWorld, PUBLIC_URL } from './support/world'

describe('an edit, from one page to the others', () => {
  it('[W5.21] is acknowledged with its seq and head, shown to the others, and stands in the trail', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const ben = await Page.open(world, budget, 'ben')
    const editId = ann.edit(setLoss('6 dB'))
    const answer = await ann.answer(editId)
    const head = await world.journal.head(budget)
    expect(answer).toEqual({ editId, seq: head?.seq, head: head?.hash })
    await ben.sees((doc) => lossOf(doc) === '6 dB')
    const told = await ben.until((one) => one.type === 'trail')
    expect(told).toMatchObject({
      header: [
        {
          kind: 'edit',
          person: 'ann',
          personName: 'Ann Testa',
          door: 'screen',
          changes: [{ kind: 'set', section: 'lines', id: 'trace', field: 'loss', before: '5 dB', after: '6 dB' }],
          effects: [
            {
              allowance: 'whole',
              name: 'Ball to ball',
              before: { verdict: 'inside', marginDb: 3, knownDb: 7 },
              after: { verdict: 'inside', marginDb: 2, knownDb: 8 },
            },
          ],
        },
      ],
    })
    const trail = await world.sync.budgets.trail(budget, { limit: 10 })
    expect(trail?.map(({ kind }) => kind)).toEqual(['edit', 'seed'])
    expect(trail?.[0]).toEqual(told.type === 'trail' ? told.header[0] : null)
  })

  it('[W5.21] while the disk stalls nothing is acknowledged and no other screen changes', async () => {
    const disk = holdableDisk()
    const world = await openWorld({ disk })
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const ben = await Page.open(world, budget, 'ben')
    await ben.answer(ben.edit(setLoss('1 dB', 'cable')))
    disk.hold()
    const editId = ann.edit(setLoss('6 dB'))
    await disk.untilWaiting(1)
    // A question that is answered after the edit was taken in: the edit has had its chance to leak.
    ben.askForDocument()
    const asked = ben.all('sync').filter(({ step }) => step === 1).length
    await ben.until(() => ben.all('sync').filter(({ step }) => step === 1).length > asked)
    expect(ann.all('acknowledged')).toEqual([])
    expect(ann.all('refused')).toEqual([])
    expect(lossOf(ben.doc)).toBe('5 dB')
    expect((await world.sync.budgets.read(budget))?.budget.lines.trace?.loss).toBe('5 dB')
    await disk.letGo()
    expect(await ann.answer(editId)).toHaveProperty('seq')
    await ben.sees((doc) => lossOf(doc) === '6 dB')
  })

  it('[W5.21] new lines, notes and lane values arrive, and the budget read is the document', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const ben = await Page.open(world, budget, 'ben')
    const edits = [
      ann.edit((doc) => putRecord(doc, 'lines', 'via', { order: 'a4', name: 'Via', kind: 'via', removed: true })),
      ann.edit((doc) => recordOf(doc, 'lines', 'via').set('removed', false)),
      ann.edit((doc) => noteOf(doc, 'lines', 'via').insert(0, 'below the ball')),
      ann.edit((doc) => doc.getMap('laneValues').set('trace/2/length', null)),
      ann.edit((doc) => doc.getMap('laneValues').set('trace/2/length', '3 in')),
    ]
    for (const edit of edits) expect(await ann.answer(edit)).toHaveProperty('seq')
    await ben.sees((doc) => doc.getMap('laneValues').get('trace/2/length') === '3 in')
    expect(readBudget(ben.doc)).toEqual(readBudget(ann.doc))
    expect((await world.sync.budgets.read(budget))?.budget).toEqual(readBudget(ann.doc))
    const rows = await world.journal.rows(budget, 0)
    expect(verifyEntries(rows)).toBeNull()
    expect(rows.filter(({ entry }) => entry.kind === 'edit').map(({ entry }) => entry.changes[0]?.kind)).toEqual([
      'add',
      'set',
      'text',
      // Made empty: nothing to see yet.
      undefined,
      'set',
    ])
  })

  it('[W5.24] a write that another one won over is in the trail, and its author is told', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const low = await Page.open(world, budget, 'ann', {}, 1_000)
    const high = await Page.open(world, budget, 'ben', {}, 2_000)
    // Both write on the same state; of two such writes the larger client id's shows.
    const lost = editOf(low.doc, setLoss('6 dB'))
    const won = editOf(high.doc, setLoss('7 dB'))
    await high.answer(high.sendEdit(won))
    const editId = low.sendEdit(lost)
    expect(await low.answer(editId)).toHaveProperty('seq')
    await low.sees((doc) => lossOf(doc) === '7 dB')
    const told = await low.until((one) => one.type === 'trail' && one.header.some((entry) => entry.editId === editId))
    expect(told).toMatchObject({
      header: [
        { changes: [{ kind: 'overtaken', id: 'trace', field: 'loss', written: '6 dB', after: '7 dB' }], effects: [] },
      ],
    })
  })

  it('[W5.24] a write that shows although its author had not seen what it replaced says so', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const low = await Page.open(world, budget, 'ann', {}, 1_000)
    const high = await Page.open(world, budget, 'ben', {}, 2_000)
    const first = editOf(low.doc, setLoss('6 dB'))
    const second = editOf(high.doc, setLoss('7 dB'))
    await low.answer(low.sendEdit(first))
    await high.answer(high.sendEdit(second))
    const [entry] = (await world.sync.budgets.trail(budget, { limit: 1 })) ?? []
    expect(entry?.changes).toEqual([
      { kind: 'set', section: 'lines', id: 'trace', field: 'loss', before: '6 dB', after: '7 dB', unseen: true },
    ])
  })

  it('[W5.26] time in the trail never goes back, although the clock does', async () => {
    const times = [5_000, 4_000, 3_000, 2_000].map((ahead) => 1_800_000_000_000 + ahead)
    let calls = 0
    const world = await openWorld({ now: () => times[Math.min(Math.floor(calls++ / 4), 3)] ?? 0 })
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    for (const value of ['6 dB', '7 dB', '8 dB']) await ann.answer(ann.edit(setLoss(value)))
    const entries = await world.journal.entries(budget, { after: 0, limit: 10 })
    expect(new Set(entries.map(({ time }) => time))).toEqual(new Set([1_800_000_005_000]))
    expect(calls).toBeGreaterThan(12)
  })
})

describe('sent twice', () => {
  it('[W2.23] is stored once and answered with the same seq: while it waits, after its commit, after a restart', async () => {
    const disk = holdableDisk()
    const world = await openWorld({ disk })
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    await ann.answer(ann.edit(setLoss('1 dB', 'cable')))
    const update = editOf(ann.doc, setLoss('6 dB'))
    disk.hold()
    ann.sendEdit(update, 'twice')
    await disk.untilWaiting(1)
    ann.sendEdit(update, 'twice')
    await disk.letGo()
    await ann.until(() => ann.all('acknowledged').length === 3)
    ann.sendEdit(update, 'twice')
    await ann.until(() => ann.all('acknowledged').length === 4)
    const answers = ann.all('acknowledged').filter(({ header }) => header.editId === 'twice')
    expect(new Set(answers.map(({ header }) => header.seq)).size).toBe(1)
    await world.stop()
    const again = await world.start()
    const later = await Page.open(again, budget, 'ann')
    later.sendEdit(update, 'twice')
    expect(await later.answer('twice')).toEqual(answers[0]?.header)
    const entries = await again.journal.entries(budget, { after: 0, limit: 100 })
    expect(entries.filter(({ editId }) => editId === 'twice')).toHaveLength(1)
  })

  it('[W2.23] from two tabs at the same moment: both are answered with one seq', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    await world.stop()
    const searches: (() => void)[] = []
    const again = await world.start((journal) => ({
      ...journal,
      findEdit: async (...asked) => {
        const found = await journal.findEdit(...asked)
        await new Promise<void>((resolve) => searches.push(resolve))
        return found
      },
    }))
    const [one, two] = [await Page.open(again, budget, 'ann'), await Page.open(again, budget, 'ann')]
    const update = editOf(one.doc, setLoss('6 dB'))
    for (const page of [one, two]) page.sendEdit(update, 'both', { clientId: one.clientId })
    // Both searches of the journal have found nothing before either edit goes on.
    await expect.poll(() => searches.length).toBe(2)
    for (const search of searches) search()
    const answers = [await one.answer('both'), await two.answer('both')]
    expect(answers[0]).toHaveProperty('seq')
    expect(answers[1]).toEqual(answers[0])
  })

  it('[W2.24] an edit id with other bytes is refused: while it waits, after its commit, after a restart', async () => {
    const disk = holdableDisk()
    const world = await openWorld({ disk })
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const ben = await Page.open(world, budget, 'ben')
    await ben.answer(ben.edit(setLoss('1 dB', 'cable')))
    disk.hold()
    ann.edit(setLoss('6 dB'))
    const [editId] = [ann.sendEdit(editOf(ann.doc, setLoss('7 dB')), 'used')]
    await disk.untilWaiting(1)
    ben.sendEdit(editOf(ben.doc, setLoss('9 dB', 'cable')), editId)
    expect(await ben.answer(editId)).toMatchObject({ code: 'edit-id-reused' })
    await disk.letGo()
    await ann.answer(editId)
    const other = await Page.open(world, budget, 'ben')
    other.sendEdit(editOf(other.doc, setLoss('9 dB', 'cable')), editId)
    expect(await other.answer(editId)).toMatchObject({ code: 'edit-id-reused' })
    await world.stop()
    const again = await world.start()
    const later = await Page.open(again, budget, 'ben')
    later.sendEdit(editOf(later.doc, setLoss('9 dB', 'cable')), editId)
    expect(await later.answer(editId)).toMatchObject({ code: 'edit-id-reused' })
    expect((await again.sync.budgets.read(budget))?.budget.lines.cable?.loss).toBe('1 dB')
  })
})

describe('down', () => {
  it('[W2.22] the server answers SyncStep1, never sends it, and reads over all other frames of the protocol', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const ben = await Page.open(world, budget, 'ben')
    const update = editOf(ann.doc, setLoss('6 dB'))
    ann.send(syncFrame(1, update))
    ann.send(syncFrame(2, update))
    ann.send(new Uint8Array([1, 3, 1, 2, 3]))
    ann.send(new Uint8Array([3]))
    await ann.answer(ann.edit(setLoss('1 dB', 'cable'))).then((answer) => {
      // The update that was read over is missing, so what hangs on it is a gap.
      expect(answer).toMatchObject({ code: 'gap' })
    })
    expect(await ben.answer(ben.edit(setLoss('4 dB', 'cable')))).toHaveProperty('seq')
    expect(lossOf(ben.doc)).toBe('5 dB')
    expect([...ann.all('sync'), ...ben.all('sync')].filter(({ step }) => step === 0)).toEqual([])
    expect(ann.all('other')).toEqual([])
  })

  it('[W4.3] a gap is not kept; the page is told the first missing clock and sends again', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const first = editOf(ann.doc, setLoss('6 dB'))
    const second = editOf(ann.doc, setLoss('7 dB'))
    ann.sendEdit(second, 'second')
    expect(await ann.answer('second')).toMatchObject({ code: 'gap', missing: { clientId: ann.clientId, clock: 0 } })
    ann.sendEdit(first, 'first')
    expect(await ann.answer('first')).toHaveProperty('seq')
    ann.received.length = 0
    ann.sendEdit(second, 'second')
    expect(await ann.answer('second')).toHaveProperty('seq')
  })
})

describe('fan-out', () => {
  it('[W5.21] one frame to each other connection; none to the one that has it, none to who has not asked for the document', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const ben = await Page.open(world, budget, 'ben')
    const silent = await Page.dial(`${world.url}${budget}`, { headers: { cookie: 'session=vera' }, origin: PUBLIC_URL })
    silent.hello('vera')
    await silent.until((one) => one.type === 'welcome')
    await ann.answer(ann.edit(setLoss('6 dB')))
    for (const page of [ann, ben, silent]) await page.until((one) => one.type === 'trail')
    const updates = (page: Page) => page.all('sync').filter(({ step }) => step === 2).length
    expect([ann, ben, silent].map(updates)).toEqual([0, 1, 0])
  })

  it('[W5.22] edits of several people in one commit are one frame', async () => {
    const disk = holdableDisk()
    const world = await openWorld({ disk })
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const ben = await Page.open(world, budget, 'ben')
    const vera = await Page.open(world, budget, 'vera')
    await ann.answer(ann.edit(setLoss('5.5 dB')))
    await vera.sees((doc) => lossOf(doc) === '5.5 dB')
    disk.hold()
    ann.edit(setLoss('6 dB'))
    await disk.untilWaiting(1)
    ann.edit(setLoss('7 dB'))
    ben.edit(setLoss('3 dB', 'cable'))
    for (const page of [ann, ben]) await page.asked()
    vera.received.length = 0
    await disk.letGo()
    await vera.sees((doc) => lossOf(doc) === '7 dB' && lossOf(doc, 'cable') === '3 dB')
    expect(vera.all('sync')).toHaveLength(2)
    const rows = await world.journal.entries(budget, { after: 0, limit: 100 })
    expect(rows.filter(({ kind }) => kind === 'edit')).toHaveLength(4)
  })
})

describe('the next start', () => {
  it('[W8.21] finds everything that was acknowledged, in the document, in the trail and in the bindings', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    for (let count = 1; count <= 20; count++) await ann.answer(ann.edit(setLoss(`${count} dB`)))
    const before = await world.sync.budgets.read(budget)
    const evaluated = await world.sync.budgets.evaluation(budget)
    await world.stop()
    const again = await world.start()
    expect(await again.sync.budgets.read(budget)).toEqual(before)
    expect(await again.sync.budgets.evaluation(budget)).toEqual(evaluated)
    expect(await again.journal.loadSnapshot(budget)).toMatchObject({ seq: before?.seq, hash: before?.head })
    const trail = await again.sync.budgets.trail(budget, { limit: 100 })
    expect(trail).toHaveLength(21)
    expect(trail?.[0]?.effects).toHaveLength(1)
    const ben = await Page.open(again, budget, 'ben', {}, ann.clientId).catch((error) => String(error))
    expect(ben).toContain('4409')
    const later = await Page.open(again, budget, 'ann', { seq: before?.seq ?? 0, head: before?.head ?? null })
    expect(lossOf(later.doc)).toBe('20 dB')
    expect(await later.answer(later.edit(setLoss('21 dB')))).toHaveProperty('seq')
  })
})
