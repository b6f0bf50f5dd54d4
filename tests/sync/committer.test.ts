import { describe, expect, it } from 'vitest'
import { GENESIS, sealEntry } from '../../lib/records/journal/entry'
import type { Row } from '../../lib/records/journal/types'
import { Committer, type Committing } from '../../lib/sync/committer'
import { setLoss } from './support/changes'
import { holdableDisk } from './support/disk'
import { Page } from './support/page'
import { heldTimers } from './support/timers'
import { openWorld } from './support/world'

/** A member with numbered rows of its own. */
function member(budget: string, count: number) {
  let made = 0
  const told: string[] = []
  const one: Committing & { told: string[]; more(count: number): void } = {
    told,
    more: (added) => {
      count += added
    },
    get hasMore() {
      return made < count
    },
    take(limit) {
      const rows: Row[] = []
      while (made < count && rows.length < limit) rows.push(rowOf(budget, ++made))
      return rows
    },
    stored: (rows) => void told.push(`stored ${rows.length}`),
    failed: (cause) => void told.push(`failed ${cause}`),
  }
  return one
}

function rowOf(budget: string, seq: number): Row {
  const update = new Uint8Array([0, 0])
  const parts = {
    budget,
    epoch: 1,
    seq,
    kind: 'edit' as const,
    editId: `${seq}`,
    person: 'ann',
    door: 'screen' as const,
  }
  return { entry: sealEntry({ ...parts, time: 1, clientId: null, changes: [], engine: '1' }, update, GENESIS), update }
}

/** A journal that answers when told to. */
function scripted() {
  const calls: { budgets: string[]; answer: (error?: Error) => void }[] = []
  return {
    calls,
    append: (rows: readonly Row[]) =>
      new Promise<void>((resolve, reject) => {
        calls.push({
          budgets: rows.map(({ entry }) => entry.budget),
          answer: (error) => (error ? reject(error) : resolve()),
        })
      }),
  }
}
const turn = () => new Promise((resolve) => setImmediate(resolve))

describe('commits', () => {
  it('[W5.22] the first goes at once, one in flight, with the rows of all rooms; what comes meanwhile gathers for the next', async () => {
    const journal = scripted()
    const timers = heldTimers(-1)
    const committer = new Committer(journal, timers, () => undefined)
    const [a, b] = [member('a', 2), member('b', 1)]
    committer.request(a)
    committer.request(b)
    committer.request(a)
    timers.advance(0)
    await turn()
    expect(journal.calls.map(({ budgets }) => budgets)).toEqual([['a', 'a', 'b']])
    b.more(2)
    committer.request(b)
    timers.advance(2)
    await turn()
    expect(journal.calls).toHaveLength(1)
    journal.calls[0]?.answer()
    await turn()
    timers.advance(2)
    await turn()
    expect(journal.calls).toHaveLength(1)
    timers.advance(1)
    await turn()
    expect(journal.calls[1]?.budgets).toEqual(['b', 'b'])
    expect([a.told, b.told]).toEqual([['stored 2'], ['stored 1']])
    journal.calls[1]?.answer()
    await committer.idle()
    expect(b.told).toEqual(['stored 1', 'stored 2'])
  })

  it('[W5.22] rows over the most of one INSERT wait for the next commit', async () => {
    const journal = scripted()
    const timers = heldTimers(-1)
    const committer = new Committer(journal, timers, () => undefined)
    const [a, b] = [member('a', 2_000), member('b', 1)]
    committer.request(a)
    committer.request(b)
    for (const lengths of [[1_500], [1_500, 501]]) {
      timers.advance(5)
      await turn()
      expect(journal.calls.map(({ budgets }) => budgets.length)).toEqual(lengths)
      journal.calls.at(-1)?.answer()
      await turn()
    }
    await committer.idle()
    expect(a.told).toEqual(['stored 1500', 'stored 500'])
    expect(b.told).toEqual(['stored 1'])
  })

  it('[W5.23] a failed commit is told to all of its rooms; a room that fails itself stops nobody else', async () => {
    const journal = scripted()
    const timers = heldTimers(-1)
    const logged: string[] = []
    const committer = new Committer(journal, timers, (message) => logged.push(message))
    const [a, b, bad] = [member('a', 1), member('b', 1), member('c', 0)]
    bad.take = () => {
      throw new Error('no rows')
    }
    a.failed = () => {
      throw new Error('cannot take it')
    }
    for (const one of [bad, a, b]) committer.request(one)
    timers.advance(5)
    await turn()
    journal.calls[0]?.answer(new Error('disk full'))
    await committer.idle()
    expect(bad.told).toEqual(['failed Error: no rows'])
    expect(b.told).toEqual(['failed Error: disk full'])
    expect(logged).toEqual(['A commit of 2 rows failed; nothing of it is stored', 'A room failed after a commit'])
  })
})

describe('a disk that fails', () => {
  it('[W5.23] everything in the queue is refused as not stored; the room goes on and the page can send anew', async () => {
    const disk = holdableDisk()
    const world = await openWorld({ disk })
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const ben = await Page.open(world, budget, 'ben')
    await ben.answer(ben.edit(setLoss('1 dB', 'cable')))
    disk.hold()
    const flying = ben.edit(setLoss('2 dB', 'cable'))
    await disk.untilWaiting(1)
    const queued = ann.edit(setLoss('6 dB'))
    const documents = () => ann.all('sync').filter(({ step }) => step === 1).length
    ann.askForDocument()
    await ann.until(() => documents() === 2)
    disk.fail(new Error('no space left on the device'))
    expect(await ben.answer(flying)).toMatchObject({ code: 'not-stored' })
    expect(await ann.answer(queued)).toMatchObject({ code: 'not-stored' })
    await disk.letGo()
    expect((await world.sync.budgets.read(budget))?.budget.lines).toMatchObject({
      trace: { loss: '5 dB' },
      cable: { loss: '1 dB' },
    })
    const again = await Page.open(world, budget, 'ann')
    expect(await again.answer(again.edit(setLoss('7 dB')))).toMatchObject({ seq: expect.any(Number) })
    expect(ben.socket.readyState).toBe(ben.socket.OPEN)
    expect(world.logged.join()).toContain('no space left')
  })

  it('[W5.23] after a failed commit nothing is written before the journal’s head has been read', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    await world.stop()
    const did: string[] = []
    const heads: (() => void)[] = []
    const again = await world.start((journal) => ({
      ...journal,
      append: async (rows) => {
        const edits = rows.filter(({ entry }) => entry.kind === 'edit')
        if (edits.length > 0) did.push('append')
        if (did.length === 1 && edits.length > 0) throw new Error('no space left on the device')
        await journal.append(rows)
      },
      head: async (id) => {
        did.push('head')
        if (did.length === 2) await new Promise<void>((resolve) => heads.push(resolve))
        return journal.head(id)
      },
    }))
    const ann = await Page.open(again, budget, 'ann')
    const ben = await Page.open(again, budget, 'ben')
    expect(await ann.answer(ann.edit(setLoss('6 dB')))).toMatchObject({ code: 'not-stored' })
    const waiting = ben.edit(setLoss('7 dB', 'cable'))
    await expect.poll(() => heads.length).toBe(1)
    await ben.asked()
    // A later commit of another budget: the waiting edit could have gone with it.
    await again.createBudget()
    expect(did).toEqual(['append', 'head'])
    heads[0]?.()
    expect(await ben.answer(waiting)).toHaveProperty('seq')
    expect(did).toEqual(['append', 'head', 'append'])
  })

  it('[W5.23] a journal that somebody else wrote to: the room is let go and loaded anew', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    await ann.answer(ann.edit(setLoss('6 dB')))
    const head = await world.journal.head(budget)
    const foreign = rowOf(budget, (head?.seq ?? 0) + 1)
    const { v: _v, updateSha256: _u, prev: _p, hash: _h, ...parts } = foreign.entry
    await world.journal.append([
      {
        entry: sealEntry(
          { ...parts, kind: 'bind', clientId: 12, editId: 'bind:12' },
          new Uint8Array(),
          head?.hash ?? '',
        ),
        update: new Uint8Array(),
      },
    ])
    expect(await ann.answer(ann.edit(setLoss('7 dB')))).toMatchObject({ code: 'not-stored' })
    expect((await ann.closed).code).toBe(4503)
    const again = await Page.open(world, budget, 'ann')
    expect(await again.answer(again.edit(setLoss('8 dB')))).toHaveProperty('seq')
  })
})
