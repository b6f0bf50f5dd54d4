import { describe, expect, it } from 'vitest'
import { lossOf, setLoss } from './support/changes'
import { Page } from './support/page'
import { PEOPLE } from './support/sessions'
import { heldTimers } from './support/timers'
import { openWorld } from './support/world'

describe('rooms', () => {
  it('[W8.23] an empty room closes after a minute with a snapshot, and opens again from it', async () => {
    const timers = heldTimers(100)
    const world = await openWorld({ timers, now: timers.now })
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    await ann.answer(ann.edit(setLoss('6 dB')))
    await ann.until((one) => one.type === 'trail')
    timers.advance(29_000)
    ann.socket.close()
    await ann.closed
    // What ends on the server's side of the socket is not seen from here: time goes on until it has.
    const head = await world.journal.head(budget)
    await expect
      .poll(() => {
        timers.advance(15_000)
        return world.journal.loadSnapshot(budget)
      })
      .toMatchObject({ seq: head?.seq, hash: head?.hash })
    const again = await Page.open(world, budget, 'ann')
    expect(lossOf(again.doc)).toBe('6 dB')
  })

  it('[W8.21] a long chain gets a snapshot while the room is open, off the write path', async () => {
    const timers = heldTimers(100)
    const world = await openWorld({ timers, now: timers.now })
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const edits = Array.from({ length: 500 }, (_, count) => ann.edit(setLoss(`${count % 50} dB`)))
    await ann.answer(edits.at(-1) ?? '')
    timers.advance(14_999)
    expect(await world.journal.loadSnapshot(budget)).toBeNull()
    timers.advance(1)
    await expect.poll(async () => (await world.journal.loadSnapshot(budget))?.seq).toBe(502)
    expect(ann.socket.readyState).toBe(ann.socket.OPEN)
  })

  it('[W8.23] those who come at once find one room; at a stop all are told to come back', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const pages = await Promise.all((['ann', 'ben', 'vera'] as const).map((name) => Page.open(world, budget, name)))
    const [ann] = pages
    if (!ann) throw new Error('no page')
    await ann.answer(ann.edit(setLoss('6 dB')))
    for (const page of pages) await page.sees((doc) => lossOf(doc) === '6 dB')
    const stopping = world.stop()
    for (const page of pages) expect((await page.closed).code).toBe(1012)
    await stopping
    const late = {
      editId: 'late',
      operations: [{ op: 'set', section: 'head', id: null, field: 'laneCount', value: 4 }] as const,
    }
    expect(await world.sync.submit(budget, PEOPLE.ann, 'screen', late)).toMatchObject({ code: 'not-stored' })
  })

  it('[W5.21] a stop waits for what is being written, and answers it', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const edits = Array.from({ length: 50 }, (_, count) => ann.edit(setLoss(`${count} dB`)))
    await ann.answer(edits[0] ?? '')
    await world.stop()
    await ann.closed
    // Every edit that was taken in has its answer; the others are still in the page's outbox.
    const answered = new Set(ann.all('acknowledged').map(({ header }) => header.editId))
    const again = await world.start()
    const kept = await again.journal.entries(budget, { after: 0, limit: 100 })
    expect(kept.filter(({ kind }) => kind === 'edit').map(({ editId }) => editId)).toEqual([...answered])
    expect(ann.all('refused')).toEqual([])
  })
})
