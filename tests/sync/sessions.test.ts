import { describe, expect, it } from 'vitest'
import { encodeMessage, MESSAGE } from '../../lib/sheet/wire'
import { lossOf, setLoss } from './support/changes'
import { holdableDisk } from './support/disk'
import { Page } from './support/page'
import { editOf } from './support/sheet'
import { heldTimers } from './support/timers'
import { openWorld, PUBLIC_URL } from './support/world'

const cookie = (name: string) => ({ cookie: `session=${name}` })

describe('who may open a worksheet', () => {
  it('[W3.21] a cookie counts only from a page of this server; a token in the header needs no Origin and takes no cookie', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const url = `${world.url}${budget}`
    const elsewhere = await Page.dial(url, { headers: cookie('ann'), origin: 'http://elsewhere.test' })
    expect((await elsewhere.closed).code).toBe(4403)
    expect((await (await Page.dial(url, { headers: cookie('ann') })).closed).code).toBe(4403)
    expect(world.logged).toHaveLength(2)
    const program = await Page.dial(url, { headers: { authorization: 'Bearer ben' } })
    program.hello('ben')
    await program.until((one) => one.type === 'welcome')
    program.askForDocument()
    await program.until((one) => one.type === 'sync')
    await program.answer(program.edit(setLoss('6 dB')))
    const [entry] = (await world.sync.budgets.trail(budget, { limit: 1 })) ?? []
    expect(entry).toMatchObject({ person: 'ben', door: 'token' })
    const wrong = await Page.dial(url, {
      headers: { authorization: 'Bearer nobody', ...cookie('ann') },
      origin: PUBLIC_URL,
    })
    expect((await wrong.closed).code).toBe(4401)
  })

  it('[W3.22] no session, no membership, no budget: each has its own close code', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const unknown = await Page.dial(`${world.url}${budget}`, { origin: PUBLIC_URL })
    expect((await unknown.closed).code).toBe(4401)
    const stranger = await Page.dial(`${world.url}${budget}`, { headers: cookie('zoe'), origin: PUBLIC_URL })
    stranger.hello('zoe')
    expect((await stranger.closed).code).toBe(4403)
    const nowhere = await Page.dial(`${world.url}none`, { headers: cookie('ann'), origin: PUBLIC_URL })
    nowhere.hello('ann')
    expect((await nowhere.closed).code).toBe(4404)
    for (const page of [unknown, stranger, nowhere]) expect(page.received).toEqual([])
  })

  it('[W3.22] a page that was signed in as somebody else, has another epoch or schema, or knows more than the journal', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const answer = await ann.answer(ann.edit(setLoss('6 dB')))
    if (!('seq' in answer)) throw new Error('refused')
    const { seq, head } = answer
    const cases = [
      [{ person: 'ben' }, 4406],
      [{ epoch: 2 }, 4409],
      [{ schemaVersion: 2 }, 4409],
      [{ seq: seq + 1, head }, 4423],
      [{ seq, head: 'f'.repeat(64) }, 4423],
      [{ seq: seq - 1, head }, 4423],
      [{ seq, head: null }, 4423],
    ] as const
    for (const [hello, code] of cases) {
      const page = await Page.dial(`${world.url}${budget}`, { headers: cookie('ann'), origin: PUBLIC_URL })
      page.hello('ann', hello)
      expect({ hello, code: (await page.closed).code }).toEqual({ hello, code })
      expect(page.received).toEqual([])
    }
    const known = await Page.open(world, budget, 'ann', { epoch: 1, seq, head })
    expect(known.all('welcome')).toMatchObject([{ header: { role: 'owner', person: 'ann', epoch: 1 } }])
  })

  it('[W2.21] nothing is answered before the hello, and it has ten seconds, whatever else is sent', async () => {
    const timers = heldTimers(100)
    const world = await openWorld({ timers })
    const budget = await world.createBudget()
    const page = await Page.dial(`${world.url}${budget}`, { headers: cookie('ann'), origin: PUBLIC_URL })
    page.askForDocument()
    page.send(encodeMessage({ type: MESSAGE.cell, header: null }))
    await page.heard()
    timers.advance(9_000)
    page.askForDocument()
    await page.heard()
    expect(page.received).toEqual([])
    timers.advance(1_000)
    expect((await page.closed).code).toBe(4408)
    expect(page.received).toEqual([])
    const early = await Page.dial(`${world.url}${budget}`, { headers: cookie('ann'), origin: PUBLIC_URL })
    early.askForDocument()
    early.hello('ann')
    await early.until((one) => one.type === 'sync')
    expect(early.received.map(({ type }) => type).slice(0, 2)).toEqual(['welcome', 'presence'])
    timers.advance(60_000)
    expect(early.socket.readyState).toBe(early.socket.OPEN)
  })

  it('other upgrades are left to the other listeners of the server', async () => {
    const world = await openWorld()
    const other = new Promise<string | undefined>((resolve) => {
      world.server.on('upgrade', (request, socket) => {
        resolve(request.url)
        socket.destroy()
      })
    })
    await Page.dial(world.url.replace('/collab/', '/_next/hmr'), {}).catch(() => undefined)
    expect(await other).toBe('/_next/hmr')
  })
})

describe('whose client id', () => {
  it('[W3.23] an id is bound at the hello of who may write, by a row of the chain; another person cannot take it', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    await Page.open(world, budget, 'vera', {}, 5_000)
    const ann = await Page.open(world, budget, 'ann', {}, 6_000)
    await ann.answer(ann.edit(setLoss('6 dB')))
    const rows = await world.journal.entries(budget, { after: 0, limit: 10 })
    expect(rows.map(({ kind, person, clientId }) => [kind, person, clientId])).toEqual([
      ['seed', 'ann', null],
      ['bind', 'ann', 6_000],
      ['edit', 'ann', null],
    ])
    const thief = Page.open(world, budget, 'ben', {}, 6_000)
    await expect(thief).rejects.toThrow('4409')
    // A reader's id is nobody's: it may still become a writer's.
    const ben = await Page.open(world, budget, 'ben', {}, 5_000)
    await ben.answer(ben.edit(setLoss('7 dB')))
    expect(await world.journal.bindings(budget)).toEqual(
      new Map([
        [6_000, 'ann'],
        [5_000, 'ben'],
      ]),
    )
    expect((await world.sync.budgets.trail(budget, { limit: 9 }))?.map(({ kind }) => kind)).toEqual([
      'edit',
      'edit',
      'seed',
    ])
    expect((await world.sync.budgets.trail(budget, { after: 0, limit: 9 }))?.map(({ kind }) => kind)).toEqual(
      rows.map(({ kind }) => kind).concat('bind', 'edit'),
    )
  })

  it('[W3.23] the id that the seed was written under is nobody’s', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const vera = await Page.open(world, budget, 'vera')
    const [seedId] = vera.doc.store.clients.keys()
    await expect(Page.open(world, budget, 'ann', {}, seedId)).rejects.toThrow('4409')
    expect((await world.journal.head(budget))?.seq).toBe(1)
  })

  it('[W3.23] an older id is bound at its first write if it is free, in the same commit', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const offline = await Page.open(world, budget, 'vera', {}, 7_000)
    const update = editOf(offline.doc, setLoss('6 dB'))
    const ann = await Page.open(world, budget, 'ann', {}, 8_000)
    ann.sendEdit(update, 'older', { clientId: 7_000 })
    expect(await ann.answer('older')).toHaveProperty('seq')
    expect(await world.journal.bindings(budget)).toEqual(
      new Map([
        [8_000, 'ann'],
        [7_000, 'ann'],
      ]),
    )
    const ben = await Page.open(world, budget, 'ben')
    ben.sendEdit(editOf(offline.doc, setLoss('7 dB')), 'stolen', { clientId: 7_000 })
    expect(await ben.answer('stolen')).toMatchObject({ code: 'foreign-client-id' })
  })
})

describe('who may write', () => {
  it('[W3.25] a viewer’s edit is refused, and binds nothing', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const vera = await Page.open(world, budget, 'vera')
    expect(await vera.answer(vera.edit(setLoss('6 dB')))).toMatchObject({ code: 'read-only' })
    expect((await world.journal.bindings(budget)).size).toBe(0)
    expect((await world.journal.head(budget))?.seq).toBe(1)
  })

  it('[W3.25] a role taken away between acceptance and commit: refused, and what was built on it is gated again', async () => {
    const disk = holdableDisk()
    const world = await openWorld({ disk })
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const ben = await Page.open(world, budget, 'ben')
    await ann.answer(ann.edit(setLoss('1 dB', 'cable')))
    await ben.sees((doc) => lossOf(doc, 'cable') === '1 dB')
    disk.hold()
    const flying = ann.edit(setLoss('2 dB', 'cable'))
    await disk.untilWaiting(1)
    const bens = ben.edit(setLoss('6 dB'))
    const anns = ann.edit(setLoss('3 dB', 'cable'))
    // An answer to a later question: both are in the queue.
    for (const page of [ben, ann]) await page.asked()
    await world.sessions.setRole('ben', budget, 'viewer')
    await disk.letGo()
    expect(await ben.answer(bens)).toMatchObject({ code: 'read-only' })
    for (const editId of [flying, anns]) expect(await ann.answer(editId)).toHaveProperty('seq')
    const { budget: now } = (await world.sync.budgets.read(budget)) ?? {}
    expect([now?.lines.trace?.loss, now?.lines.cable?.loss]).toEqual(['5 dB', '3 dB'])
    expect(lossOf(ann.doc)).toBe('5 dB')
    expect(ben.all('welcome').at(-1)?.header.role).toBe('viewer')
  })

  it('[W3.26] sign-out with the socket open: closed at once, what is queued is refused, the others’ edits stand', async () => {
    const disk = holdableDisk()
    const world = await openWorld({ disk })
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const ben = await Page.open(world, budget, 'ben')
    await ann.answer(ann.edit(setLoss('1 dB', 'cable')))
    disk.hold()
    const flying = ann.edit(setLoss('2 dB', 'cable'))
    await disk.untilWaiting(1)
    ben.edit(setLoss('6 dB'))
    const last = ann.edit(setLoss('3 dB', 'cable'))
    for (const page of [ben, ann]) await page.asked()
    const before = performance.now()
    world.sessions.end('session-ben')
    expect((await ben.closed).code).toBe(4401)
    expect(performance.now() - before).toBeLessThan(1_000)
    await disk.letGo()
    for (const editId of [flying, last]) expect(await ann.answer(editId)).toHaveProperty('seq')
    const trail = await world.sync.budgets.trail(budget, { limit: 9 })
    expect(trail?.map(({ person, kind }) => `${kind} ${person}`)).toEqual([
      'edit ann',
      'edit ann',
      'edit ann',
      'seed ann',
    ])
    expect(lossOf(ann.doc)).toBe('5 dB')
    const again = await Page.dial(`${world.url}${budget}`, { headers: cookie('ben'), origin: PUBLIC_URL })
    expect((await again.closed).code).toBe(4401)
  })

  it('[W3.26] signed out while the budget is loaded: not let in', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    await world.stop()
    const loading: (() => void)[] = []
    const again = await world.start((journal) => ({
      ...journal,
      rows: async (...asked) => {
        // Only the first: the stop reads the rows again for its snapshot.
        if (loading.length === 0) await new Promise<void>((resolve) => loading.push(resolve))
        return journal.rows(...asked)
      },
    }))
    const page = await Page.dial(`${again.url}${budget}`, { headers: cookie('ann'), origin: PUBLIC_URL })
    page.hello('ann')
    await expect.poll(() => loading.length).toBe(1)
    again.sessions.end('session-ann')
    loading[0]?.()
    expect((await page.closed).code).toBe(4401)
    expect(page.received).toEqual([])
  })

  it('[W3.28] a role that is given or taken counts at once; without any the socket is closed', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const vera = await Page.open(world, budget, 'vera')
    await world.sessions.setRole('vera', budget, 'editor')
    await vera.until((one) => one.type === 'welcome' && one.header.role === 'editor')
    expect(await vera.answer(vera.edit(setLoss('6 dB')))).toHaveProperty('seq')
    await world.sessions.setRole('vera', budget, null)
    expect((await vera.closed).code).toBe(4403)
  })
})

describe('presence', () => {
  it('[W3.27] is made by the server: names from the session, only the cell from the page', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const ben = await Page.open(world, budget, 'ben')
    const cell = { section: 'lines', id: 'trace', field: 'loss' }
    ben.send(encodeMessage({ type: MESSAGE.cell, header: cell }))
    const seen = await ann.until(
      (one) => one.type === 'presence' && one.header.some((present) => present.cell !== null),
    )
    expect(seen).toMatchObject({
      header: [
        { person: 'ann', name: 'Ann Testa', initials: 'AT', colour: 0, cell: null, me: true },
        { person: 'ben', name: 'Ben Proba', initials: 'BP', colour: 1, cell, me: false },
      ],
    })
    const claim = { section: 'lines', id: 'trace', field: 'x'.repeat(2_000) }
    ben.send(encodeMessage({ type: MESSAGE.cell, header: claim }))
    ben.send(encodeMessage({ type: MESSAGE.cell, header: { ...cell, person: 'ann' } as never }))
    await ben.asked()
    expect(JSON.stringify(ann.all('presence'))).not.toContain('xxx')
    ann.received.length = 0
    ben.socket.close()
    await ann.until((one) => one.type === 'presence' && one.header.length === 1 && one.header[0]?.person === 'ann')
  })

  it('[W3.27] 70 s without anything happening: still a message every 15 s, so no page thinks it is cut off', async () => {
    const timers = heldTimers(100)
    const world = await openWorld({ timers })
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    await ann.answer(ann.edit(setLoss('6 dB')))
    await ann.until((one) => one.type === 'trail')
    const before = ann.received.length
    for (let step = 1; step <= 4; step++) {
      timers.advance(15_000)
      // The answer to a ping has come before this one.
      await ann.asked()
      expect(ann.received.slice(before).filter(({ type }) => type === 'presence')).toHaveLength(step)
    }
    timers.advance(10_000)
    await ann.asked()
    expect(ann.received.slice(before).filter(({ type }) => type === 'presence')).toHaveLength(4)
    expect(ann.socket.readyState).toBe(ann.socket.OPEN)
  })

  it('[W3.26] a session that expires without anybody saying so is noticed within 15 s', async () => {
    const timers = heldTimers(100)
    const world = await openWorld({ timers })
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    world.sessions.expire('session-ann')
    timers.advance(15_000)
    expect((await ann.closed).code).toBe(4401)
  })
})
