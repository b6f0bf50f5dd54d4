import { WebSocket } from 'ws'
import type { Operation } from '../../lib/sheet/change'
import { type BrowserStorage, createMemory } from '../../lib/sheet/outbox'
import { type Locks, openSheet, type SheetSession, type SheetSnapshot } from '../../lib/sheet/session'
import type { FakeServer } from './fakeServer'

export const setLoss = (value: string | null, id = 'via'): Operation => ({
  op: 'set',
  section: 'lines',
  id,
  field: 'loss',
  value,
})

/** One browser of one person: what it keeps, its locks, and its tabs. */
export class Browser {
  private readonly tabs: SheetSession[] = []
  private readonly memory = createMemory()
  private readonly waiting = new Map<string, { granted: () => void }[]>()

  constructor(
    private readonly server: FakeServer,
    private readonly storage: () => BrowserStorage | Promise<BrowserStorage> = () => this.memory.open(),
  ) {}

  async open(): Promise<SheetSession> {
    const tab = openSheet({
      budget: 'budget-1',
      person: 'ann',
      url: this.server.url,
      storage: await this.storage(),
      locks: this.locks,
      WebSocketPolyfill: WebSocket as unknown as typeof globalThis.WebSocket,
      maxBackoff: 5,
    })
    this.tabs.push(tab)
    return tab
  }

  async openLive(): Promise<SheetSession> {
    const tab = await this.open()
    await until(tab, (now) => now.connection.state === 'live' && now.budget !== null)
    return tab
  }

  async close(): Promise<void> {
    await Promise.all(this.tabs.map((tab) => tab.destroy()))
  }

  /** A queue for each name, as Web Locks keep it. */
  private readonly locks: Locks = {
    hold: (name, granted) => {
      const queue = this.waiting.get(name) ?? []
      this.waiting.set(name, queue)
      const me = { granted }
      queue.push(me)
      if (queue[0] === me) granted()
      return () => {
        const held = queue[0] === me
        queue.splice(queue.indexOf(me), 1)
        if (held) queue[0]?.granted()
      }
    },
  }
}

/** Resolves with the first snapshot that fits. */
export function until(tab: SheetSession, fits: (now: SheetSnapshot) => boolean): Promise<SheetSnapshot> {
  return new Promise((resolve) => {
    const look = () => {
      const now = tab.getSnapshot()
      if (!fits(now)) return
      stop()
      resolve(now)
    }
    const stop = tab.subscribe(look)
    look()
  })
}

export const allSaved = (tab: SheetSession) => until(tab, (now) => now.unsaved === 0 && now.connection.state === 'live')
