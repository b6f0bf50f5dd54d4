import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type * as Y from 'yjs'
import { readConfig } from '../../lib/server/boot/config.mjs'
import { readScenarios } from '../../lib/server/scenarios'
import { startServer } from '../../lib/server/start'
import { freePort } from '../support/freePort'
import { connectPeer, type Peer } from '../support/peer'
import { startRelay } from './relay'

const EDITS = 400
const WARM_UP = 50

/** From one person's edit to another person's document: the whole write path, synced, against a bare relay in the same run. */
export async function benchWritePath() {
  const relay = await startRelay()
  const baseline = await measure(
    await connectPeer({ url: relay.url, person: null }),
    await connectPeer({ url: relay.url, person: null }),
  )
  await relay.close()
  const ours = await measureOurs()
  return [
    { what: 'edit to other person, median', ours: ours.median, baseline: baseline.median, unit: 'ms' },
    { what: 'edit to other person, 95 %', ours: ours.p95, baseline: baseline.p95, unit: 'ms' },
  ]
}

async function measureOurs() {
  const directory = await mkdtemp(join(tmpdir(), 'halfbaud-bench-'))
  const port = await freePort()
  const environment = { HALFBAUD_DATA: directory, HALFBAUD_PORT: String(port), HALFBAUD_PAGES: 'off' }
  const server = await startServer(readConfig('serve', environment, process.cwd()), process.cwd())
  try {
    const person = await server.access.createOwner(server.ownerCode ?? '', {
      name: 'Bench',
      email: 'bench@example.com',
      password: 'as fast as it is',
    })
    if (!person || 'refused' in person) throw new Error('No owner.')
    const identity = {
      person: person.id,
      name: person.name,
      email: person.email,
      administrator: true,
      session: 'bench',
      via: 'token' as const,
      expiresAt: null,
    }
    const { links } = await readScenarios(join(process.cwd(), 'seed-scenarios'))
    const tamarack = links.find(({ id }) => id === 'tamarack')
    if (!tamarack) throw new Error('No scenario.')
    const { id } = await server.budgets.create(identity, 'import', tamarack.budget)
    const { token } = await server.access.createToken(identity, 'bench', null)
    const connect = () =>
      connectPeer({
        url: `ws://127.0.0.1:${port}/collab/${id}`,
        headers: { authorization: `Bearer ${token}` },
        person: person.id,
      })
    return await measure(await connect(), await connect())
  } finally {
    await server.close()
    await rm(directory, { recursive: true, force: true })
  }
}

/** One edit after the other, each timed until the other document holds it. */
async function measure(from: Peer, to: Peer) {
  const times: number[] = []
  for (let count = 0; count < EDITS + WARM_UP; count += 1) {
    const value = `Edit ${count}`
    const arrived = new Promise<void>((resolve) => {
      const look = () => {
        if (head(to).get('description') !== value) return
        to.doc.off('update', look)
        resolve()
      }
      to.doc.on('update', look)
    })
    const begun = performance.now()
    head(from).set('description', value)
    await arrived
    if (count >= WARM_UP) times.push(performance.now() - begun)
  }
  from.close()
  to.close()
  times.sort((a, b) => a - b)
  const at = (share: number) => times[Math.floor(times.length * share)] ?? Number.NaN
  return { median: at(0.5), p95: at(0.95) }
}

const head = (peer: Peer): Y.Map<string> => peer.doc.getMap('head')
