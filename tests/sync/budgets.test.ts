import { describe, expect, it } from 'vitest'
import { budgetSchema } from '../../lib/budget/schema'
import { GENESIS, sealEntry } from '../../lib/records/journal/entry'
import { seedUpdate } from '../../lib/sheet/seed'
import { lossOf, setLoss } from './support/changes'
import { Page } from './support/page'
import { PEOPLE } from './support/sessions'
import { recordOf } from './support/sheet'
import { openWorld, smallBudget } from './support/world'

describe('making a budget', () => {
  it('[W7.21] entry 1 first, then the record that names it; the maker owns it', async () => {
    const world = await openWorld()
    const order: string[] = []
    const create = world.records.budgets.create
    Object.assign(world.records.budgets, {
      create: async (...args: Parameters<typeof create>) => {
        order.push((await world.journal.head(args[0].id)) ? 'journal first' : 'record first')
        return create(...args)
      },
    })
    const { id } = await world.sync.budgets.create(PEOPLE.ann, 'import', smallBudget())
    expect(order).toEqual(['journal first'])
    const [seed] = await world.journal.entries(id, { after: 0, limit: 9 })
    expect(seed).toMatchObject({ kind: 'seed', seq: 1, person: 'ann', door: 'import', prev: GENESIS })
    expect(await world.records.budgets.byId(id)).toMatchObject({ state: 'made', headSeq: 1, headHash: seed?.hash })
    expect(await world.records.members.role('ann', id)).toBe('owner')
    expect((await world.sync.budgets.read(id))?.budget).toEqual(smallBudget())
    expect(await world.sync.budgets.trail(id, { limit: 9 })).toMatchObject([
      { kind: 'seed', effects: [{ allowance: 'whole', before: null, after: { verdict: 'inside', marginDb: 3 } }] },
    ])
  })

  it('[W7.21] what is no budget is not made', async () => {
    const world = await openWorld()
    const bad = { ...smallBudget(), laneValues: { 'none/1/length': '1 in' } }
    await expect(world.sync.budgets.create(PEOPLE.ann, 'import', bad)).rejects.toThrow('none/1/length')
    expect(await world.journal.budgets()).toEqual([])
  })

  it('[W7.21] an entry without its record is finished at the next start; one that cannot be read is abandoned', async () => {
    const world = await openWorld()
    const update = seedUpdate(smallBudget())
    const row = (budget: string, bytes: Uint8Array) => ({
      entry: sealEntry(
        {
          budget,
          epoch: 1,
          seq: 1,
          kind: 'seed',
          editId: 'seed',
          person: 'ann',
          door: 'screen',
          time: 7,
          clientId: null,
          changes: [],
          engine: '1',
        },
        bytes,
        GENESIS,
      ),
      update: bytes,
    })
    await world.journal.append([row('whole', update), row('torn', update.slice(0, 40))])
    await world.stop()
    const again = await world.start()
    expect(await world.records.budgets.byId('whole')).toMatchObject({
      state: 'made',
      name: 'Backplane, 32 lanes',
      createdAt: 7,
      createdBy: 'ann',
    })
    expect(await world.records.budgets.byId('torn')).toMatchObject({ state: 'abandoned' })
    const ann = await Page.open(again, 'whole', 'ann')
    expect(lossOf(ann.doc)).toBe('5 dB')
    await expect(Page.open(again, 'torn', 'ann')).rejects.toThrow('4503 This budget was never finished')
    expect((await again.sync.budgets.list(PEOPLE.ann)).map(({ id }) => id)).toEqual(['whole'])
  })

  it('[W7.22] a record that names a head the journal lacks locks the budget, with what to do', async () => {
    const problems = [{ budget: 'lost', what: 'The journal ends before entry 9; restore a backup.' }]
    const world = await openWorld({ problems })
    await world.records.budgets.create(
      { id: 'lost', name: 'Lost', createdAt: 1, createdBy: 'ann', state: 'made', headSeq: 9, headHash: 'a'.repeat(64) },
      'ann',
    )
    await expect(Page.open(world, 'lost', 'ann')).rejects.toThrow('4503 The journal ends before entry 9')
    expect(await world.sync.budgets.list(PEOPLE.ann)).toMatchObject([
      { id: 'lost', name: 'Lost', verdict: 'undecided', locked: 'The journal ends before entry 9; restore a backup.' },
    ])
  })
})

describe('reading', () => {
  it('lists the budgets of a person with verdict, role and last change, as committed', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    await world.sync.budgets.create(
      PEOPLE.zoe,
      'screen',
      budgetSchema.parse({ head: { schemaVersion: 1, name: 'Not Ann’s' } }),
    )
    const ben = await Page.open(world, budget, 'ben')
    await ben.answer(ben.edit(setLoss('9 dB')))
    const list = await world.sync.budgets.list(PEOPLE.vera)
    expect(list).toMatchObject([
      {
        id: budget,
        name: 'Backplane, 32 lanes',
        role: 'viewer',
        verdict: 'over',
        lastChange: { personName: 'Ben Proba' },
        locked: null,
      },
    ])
    const whole = (await world.sync.budgets.evaluation(budget))?.evaluation
    const { verdict, lines, flags } = list[0]?.evaluation ?? {}
    expect(whole).toMatchObject({ verdict, lines, flags })
    expect(await world.sync.budgets.read('none')).toBeNull()
    expect(await world.sync.budgets.evaluation('none')).toBeNull()
    expect(await world.sync.budgets.trail('none', { limit: 1 })).toBeNull()
  })

  it('the record follows the name in the head', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    await ann.answer(ann.edit((doc) => doc.getMap('head').set('name', 'Renamed')))
    expect(await world.records.budgets.byId(budget)).toMatchObject({ name: 'Renamed' })
  })

  it('[W5.24] an erased person’s edits stay in the trail without the name', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ben = await Page.open(world, budget, 'ben')
    await ben.answer(ben.edit(setLoss('6 dB')))
    world.records.erase('ben')
    expect(await world.sync.budgets.trail(budget, { limit: 1 })).toMatchObject([
      { person: 'ben', personName: 'Erased person' },
    ])
  })

  it('pages through the trail both ways', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    for (let count = 1; count <= 7; count++) await ann.answer(ann.edit(setLoss(`${count} dB`)))
    const people = async (before?: number) =>
      (await world.sync.budgets.trail(budget, before === undefined ? { limit: 3 } : { before, limit: 3 }))?.map(
        ({ seq }) => seq,
      )
    expect(await people()).toEqual([9, 8, 7])
    expect(await people(7)).toEqual([6, 5, 4])
    // Entry 2 binds Ann's page.
    expect(await people(4)).toEqual([3, 1])
    const programs = await world.sync.budgets.trail(budget, { after: 0, limit: 3 })
    expect(programs?.map(({ seq, kind }) => `${seq} ${kind}`)).toEqual(['1 seed', '2 bind', '3 edit'])
  })
})

describe('effects', () => {
  it('[W5.25] are found again for edits that a stop left without', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const deeds = [
      setLoss('6 dB'),
      setLoss('6.5 dB'),
      (doc: import('yjs').Doc) => recordOf(doc, 'allowances', 'whole').set('limit', '12 dB'),
      (doc: import('yjs').Doc) => recordOf(doc, 'lines', 'cable').set('removed', true),
    ]
    for (const deed of deeds) await ann.answer(ann.edit(deed))
    await ann.until(() => ann.all('trail').flatMap(({ header }) => header).length === 4)
    const known = await world.sync.budgets.trail(budget, { limit: 9 })
    await world.stop()
    let kept = new Map<number, unknown>()
    const forgetful = await world.start((journal) => ({
      ...journal,
      effects: async (id, seqs) => {
        const found = await journal.effects(id, seqs)
        return kept.size > 0 ? found : new Map([...found].filter(([seq]) => seq < 4))
      },
      saveEffects: async (_, rows) => {
        kept = new Map(rows.map(({ seq, effects }) => [seq, effects]))
      },
    }))
    await Page.open(forgetful, budget, 'vera')
    await expect.poll(() => kept.size).toBe(3)
    for (const entry of known ?? []) if (entry.seq >= 4) expect(kept.get(entry.seq)).toEqual(entry.effects)
  })

  it('[W5.25] are there for whoever reads the trail after an acknowledgement', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    await world.stop()
    const saving: (() => void)[] = []
    const again = await world.start((journal) => ({
      ...journal,
      saveEffects: async (...asked) => {
        await new Promise<void>((resolve) => saving.push(resolve))
        await journal.saveEffects(...asked)
      },
    }))
    const ann = await Page.open(again, budget, 'ann')
    await ann.answer(ann.edit(setLoss('6 dB')))
    const reading = again.sync.budgets.trail(budget, { limit: 1 })
    let isRead = false
    void reading.then(() => {
      isRead = true
    })
    await expect.poll(() => saving.length).toBe(1)
    // As many questions to the journal as reading takes, which are answered in turn.
    for (let asked = 0; asked < 10; asked++) await again.journal.head(budget)
    expect(isRead).toBe(false)
    saving[0]?.()
    expect(await reading).toMatchObject([{ effects: [{ allowance: 'whole' }] }])
  })

  it('[W5.25] an effect that cannot be kept fails nothing else', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    await world.stop()
    const again = await world.start((journal) => ({
      ...journal,
      saveEffects: () => Promise.reject(new Error('disk full')),
    }))
    const ann = await Page.open(again, budget, 'ann')
    expect(await ann.answer(ann.edit(setLoss('6 dB')))).toHaveProperty('seq')
    const told = await ann.until((one) => one.type === 'trail')
    expect(told).toMatchObject({ header: [{ effects: [{ after: { marginDb: 2 } }] }] })
    expect(world.logged.join()).toContain('disk full')
  })
})
