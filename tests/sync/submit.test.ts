import { describe, expect, it } from 'vitest'
import type { Operation } from '../../lib/sheet/change'
import { readBudget } from '../../lib/sheet/seed'
import { lossOf, setLoss } from './support/changes'
import { holdableDisk } from './support/disk'
import { Page } from './support/page'
import { PEOPLE } from './support/sessions'
import { openWorld } from './support/world'

const loss = (value: string, line = 'trace'): Operation => ({
  op: 'set',
  section: 'lines',
  id: line,
  field: 'loss',
  value,
})
const token = { ...PEOPLE.ben, session: 'token-ben', via: 'token' as const }

describe('submit()', () => {
  it('[W9.21] goes the same way as a page’s edit: gate, journal, everybody’s screen, trail with the door', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const operations: Operation[] = [
      loss('6 dB'),
      { op: 'add', section: 'lines', id: 'via', values: { order: 'a4', name: 'Via', kind: 'via' } },
      { op: 'lane', line: 'trace', lane: 2, field: 'length', value: '3 in' },
      { op: 'note', section: 'lines', id: 'cable', field: 'note', text: 'from the drum' },
    ]
    const answer = await world.sync.submit(budget, token, 'token', { editId: 'first', operations })
    expect(answer).toMatchObject({ editId: 'first', seq: expect.any(Number) })
    await ann.sees((doc) => lossOf(doc) === '6 dB')
    const read = await world.sync.budgets.read(budget)
    expect(readBudget(ann.doc)).toEqual(read?.budget)
    expect(read?.budget).toMatchObject({
      lines: { trace: { loss: '6 dB' }, via: { name: 'Via', removed: false }, cable: { note: 'from the drum' } },
      laneValues: { 'trace/2/length': '3 in' },
    })
    const [entry] = (await world.sync.budgets.trail(budget, { limit: 1 })) ?? []
    expect(entry).toMatchObject({
      door: 'token',
      person: 'ben',
      personName: 'Ben Proba',
      effects: [{ allowance: 'whole' }],
    })
  })

  it('[W9.21] one client id per person and budget, whose clock goes on after a restart and beside pages', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const submit = (sync: typeof world.sync, editId: string, value: string) =>
      sync.submit(budget, token, 'token', { editId, operations: [loss(value)] })
    await submit(world.sync, 'one', '1 dB')
    const ann = await Page.open(world, budget, 'ann')
    await ann.answer(ann.edit(setLoss('2 dB')))
    expect(await submit(world.sync, 'two', '3 dB')).toHaveProperty('seq')
    await world.stop()
    const again = await world.start()
    expect(await submit(again.sync, 'three', '4 dB')).toHaveProperty('seq')
    expect((await again.sync.budgets.read(budget))?.budget.lines.trace?.loss).toBe('4 dB')
    const bens = [...(await again.journal.bindings(budget))].filter(([, person]) => person === 'ben')
    expect(bens).toHaveLength(1)
    expect(
      await again.sync.submit(budget, PEOPLE.ann, 'token', { editId: 'four', operations: [loss('5 dB')] }),
    ).toHaveProperty('seq')
    expect((await again.journal.bindings(budget)).size).toBe(3)
  })

  it('[W9.22] the same id and operations are answered with the same seq; other operations are refused: at once and after a restart', async () => {
    const disk = holdableDisk()
    const world = await openWorld({ disk })
    const budget = await world.createBudget()
    const edit = { editId: 'once', operations: [loss('6 dB')] }
    await world.sync.submit(budget, token, 'token', { editId: 'zero', operations: [loss('1 dB')] })
    disk.hold()
    const first = world.sync.submit(budget, token, 'token', edit)
    await disk.untilWaiting(1)
    const twice = world.sync.submit(budget, token, 'token', edit)
    const other = { editId: 'once', operations: [loss('7 dB')] }
    expect(await world.sync.submit(budget, token, 'token', other)).toMatchObject({ code: 'edit-id-reused' })
    await disk.letGo()
    expect(await twice).toEqual(await first)
    await world.sync.submit(budget, token, 'token', { editId: 'later', operations: [loss('8 dB')] })
    expect(await world.sync.submit(budget, token, 'token', edit)).toEqual(await first)
    await world.stop()
    const again = await world.start()
    expect(await again.sync.submit(budget, token, 'token', edit)).toEqual(await first)
    expect(await again.sync.submit(budget, token, 'token', other)).toMatchObject({ code: 'edit-id-reused' })
    expect((await again.sync.budgets.read(budget))?.budget.lines.trace?.loss).toBe('8 dB')
  })

  it('[W9.22] an edit that changes nothing has an entry too, so that it can be asked about', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const same = { editId: 'same', operations: [loss('5 dB')] }
    const answer = await world.sync.submit(budget, token, 'token', same)
    expect(answer).toHaveProperty('seq')
    await world.sync.submit(budget, token, 'token', { editId: 'next', operations: [loss('6 dB')] })
    expect(await world.sync.submit(budget, token, 'token', same)).toEqual(answer)
    expect((await world.sync.budgets.trail(budget, { limit: 9 }))?.map(({ changes }) => changes.length)).toEqual([
      1, 0, 0,
    ])
  })

  it('[W9.23] expectedSeq: a conflict once the budget was changed, also by an edit that waits; a binding is no change', async () => {
    const disk = holdableDisk()
    const world = await openWorld({ disk })
    const budget = await world.createBudget()
    const before = await world.sync.budgets.read(budget)
    const ann = await Page.open(world, budget, 'ann')
    await ann.until((one) => one.type === 'welcome')
    const at = (editId: string, expectedSeq: number) =>
      world.sync.submit(budget, token, 'token', { editId, operations: [loss('7 dB', 'cable')], expectedSeq })
    const ok = await at('a', before?.seq ?? 0)
    if (!('seq' in ok)) throw new Error(JSON.stringify(ok))
    expect(await at('b', before?.seq ?? 0)).toMatchObject({ code: 'conflict' })
    disk.hold()
    ann.edit(setLoss('6 dB'))
    await disk.untilWaiting(1)
    expect(await at('c', ok.seq)).toMatchObject({ code: 'conflict' })
    await disk.letGo()
  })

  it('[W9.21] is refused as a page’s edit is: role, session, values, a budget that does not exist', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const submit = (identity: typeof token, operations: Operation[], id = budget) =>
      world.sync.submit(id, identity, 'token', { editId: 'x', operations })
    const vera = { ...PEOPLE.vera, via: 'token' as const }
    expect(await submit(vera, [loss('6 dB')])).toMatchObject({ editId: 'x', code: 'read-only' })
    expect(await submit({ ...PEOPLE.zoe, via: 'token' }, [loss('6 dB')])).toMatchObject({ code: 'not-allowed' })
    expect(await submit(token, [loss('6 dB')], 'none')).toMatchObject({ code: 'not-allowed' })
    expect(await submit(token, [])).toMatchObject({ code: 'malformed' })
    expect(await submit(token, [loss('-6 dB')])).toMatchObject({
      code: 'bad-value',
      reason: expect.stringContaining('Operation 1'),
    })
    expect(await submit(token, [loss('6 dB', 'none')])).toMatchObject({ code: 'bad-value' })
    const nan = { op: 'set', section: 'head', id: null, field: 'laneCount', value: Number.NaN } as const
    expect(await submit(token, [nan])).toMatchObject({ code: 'malformed' })
    const wrong = await world.sync.submit(budget, token, 'token', { editId: 'a:b', operations: [loss('6 dB')] })
    expect(wrong).toMatchObject({ code: 'malformed' })
    world.sessions.end('token-ben')
    expect(await submit(token, [loss('6 dB')])).toMatchObject({ code: 'not-allowed' })
    expect((await world.journal.head(budget))?.seq).toBe(1)
  })
})
