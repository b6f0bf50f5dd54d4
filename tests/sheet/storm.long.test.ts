import { expect, test } from 'vitest'
import { readBudget, seedUpdate } from '../../lib/sheet/seed'
import type { SheetSession } from '../../lib/sheet/session'
import { FakeServer } from './fakeServer'
import { canonical, canonicalDoc, sampleSeed } from './sample'
import { seeded } from './seeded'
import { Browser, setLoss, until } from './tabs'

const STEPS = 150
const LINES = ['package', 'trace', 'via']

/**
 * Three people with two tabs each do anything in any order while connections are cut, edits refused and the epoch renewed.
 * At the end everybody has the server's document, and every line that was added is in it or in its author's refused list.
 */
test.each(Array.from({ length: Number(process.env.HALFBAUD_SEEDS ?? 20) }, (_, index) => index + 1))(
  '[W2.71] a storm, seed %i: everybody ends with the same budget, no edit is lost, none comes twice',
  async (seed) => {
    const random = seeded(seed)
    const pick = <T>(from: readonly T[]): T => from[Math.floor(random() * from.length)] as T
    const server = await FakeServer.start(sampleSeed)
    const browsers = [new Browser(server), new Browser(server), new Browser(server)]
    const people: { browser: Browser; tabs: SheetSession[]; added: string[] }[] = []
    for (const browser of browsers) {
      people.push({ browser, tabs: [await browser.openLive(), await browser.openLive()], added: [] })
    }
    server.script = () => {
      const draw = random()
      if (draw < 0.1) return 'cut after'
      if (draw < 0.15) return 'cut before'
      return draw < 0.2 ? { code: 'invalid-result', reason: 'By the script.' } : null
    }
    let made = 0
    let turned = 0
    for (let step = 0; step < STEPS; step++) {
      const person = pick(people)
      const at = random() < 0.5 ? 0 : 1
      const tab = person.tabs[at] as SheetSession
      const draw = random()
      let result: { ok: boolean } | null = null
      if (draw < 0.25) {
        const id = `new-${step}`
        result = tab.edit([{ op: 'add', section: 'lines', id, values: { order: 'a3', name: `Line ${step}` } }])
        if (result.ok) person.added.push(id)
      } else if (draw < 0.5) result = tab.edit([setLoss(`${step / 10} dB`, pick(LINES))])
      else if (draw < 0.6) {
        const text = `${tab.getSnapshot().budget?.lines.via?.note ?? ''} ${step}`.slice(-200)
        result = tab.edit([{ op: 'note', section: 'lines', id: 'via', field: 'note', text }])
      } else if (draw < 0.7) tab.undo()
      else if (draw < 0.75) tab.redo()
      else if (draw < 0.8) {
        await tab.settled()
        await tab.destroy()
        person.tabs[at] = await person.browser.open()
      } else if (draw < 0.83) server.cutAll()
      else if (draw < 0.84) server.renewEpoch(seedUpdate(readBudget(server.doc)))
      else await new Promise((resolve) => setImmediate(resolve))
      if (result?.ok) made++
      else if (result) turned++
    }
    server.script = () => null
    for (const { tabs } of people) {
      for (const tab of tabs) await until(tab, (now) => now.unsaved === 0 && now.connection.state === 'live')
    }
    const text = () => canonicalDoc(server.doc)
    for (const { tabs } of people) {
      for (const tab of tabs) await until(tab, (now) => canonical(now.budget) === text() && now.unsaved === 0)
    }
    const { lines } = readBudget(server.doc)
    for (const { tabs, added } of people) {
      const refused = tabs[0]?.getSnapshot().refused.flatMap((edit) => edit.parts.map((part) => part.place.id)) ?? []
      for (const id of added) expect([id, Object.hasOwn(lines, id), refused.includes(id)]).toContain(true)
      for (const tab of tabs) expect(tab.getSnapshot().fault).toBeNull()
    }
    expect(new Set(server.accepted.map((each) => each.editId)).size).toBe(server.accepted.length)
    expect(made).toBeGreaterThan(5)
    console.log(
      `storm ${seed}: ${made} edits, ${turned} turned away here, ${server.accepted.length} accepted, ` +
        `${server.refusals.length} refused, ${server.connections} connections, epoch ${server.epoch}`,
    )
    await Promise.all(browsers.map((browser) => browser.close()))
    await server.stop()
  },
)
