import { mkdtemp, rm } from 'node:fs/promises'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { expect, it, onTestFinished } from 'vitest'
import { WebSocket } from 'ws'
import { WebsocketProvider } from 'y-websocket'
import * as Y from 'yjs'
import { openAccess } from '../../lib/access/open'
import { ENGINE } from '../../lib/budget/engine'
import { openStore } from '../../lib/records/open'
import { encodeMessage, MESSAGE } from '../../lib/sheet/wire'
import { evaluatorHere } from '../../lib/sync/evaluator'
import { openSync } from '../../lib/sync/open'
import { lossOf, setLoss } from './support/changes'
import { Page } from './support/page'
import { smallBudget } from './support/world'

const PUBLIC_URL = 'http://127.0.0.1:4000'

/** Everything below lib/server as it is, in a directory of its own. */
async function openWhole() {
  const directory = await mkdtemp(join(tmpdir(), 'halfbaud-whole-'))
  const logged: string[] = []
  const log = (message: string, error?: unknown) => logged.push(`${message}: ${error}`)
  const store = await openStore(directory)
  const secret = 'Zr8vQ2m1Lw0pXk7TtYb4Nc6Hs9Fd3Ga5'
  const access = await openAccess({ records: store.records, publicUrl: PUBLIC_URL, secret, clock: Date.now, log })
  const sync = await openSync({
    store,
    sessions: access,
    publicUrl: PUBLIC_URL,
    engine: ENGINE,
    evaluator: evaluatorHere(new Map()),
    clock: Date.now,
    log,
  })
  const server = createServer()
  sync.attach(server)
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  onTestFinished(async () => {
    await sync.close()
    server.closeAllConnections()
    await new Promise((resolve) => server.close(resolve))
    access.close()
    await store.close()
    await rm(directory, { recursive: true })
  })
  const owner = await access.createOwner((await access.ownerCode()) ?? '', {
    name: 'Ines Owner',
    email: 'owner@example.com',
    password: 'nine tall green lamps',
  })
  if (!owner || 'refused' in owner) throw new Error('No owner.')
  const { port } = server.address() as AddressInfo
  return { store, access, sync, owner, logged, url: `ws://127.0.0.1:${port}/collab` }
}

it('[W3.26] with the real records and accounts: a cookie, a token, and what their end does to open sockets', async () => {
  const { access, sync, owner, url, logged } = await openWhole()
  const signedIn = await access.signIn(
    'owner@example.com',
    'nine tall green lamps',
    new Headers({ 'x-halfbaud-peer': '192.0.2.1' }),
  )
  if (!signedIn || 'slow' in signedIn) throw new Error('Not signed in.')
  const cookie = signedIn.cookies.map((line) => line.split(';')[0]).join('; ')
  const { id } = await sync.budgets.create(signedIn.identity, 'screen', smallBudget())
  const hello = { person: owner.id, epoch: null, clientId: 11, seq: 0, head: null, schemaVersion: 1 }

  const page = await Page.dial(`${url}/${id}`, { headers: { cookie }, origin: PUBLIC_URL, clientId: 11 })
  page.send(encodeMessage({ type: MESSAGE.hello, header: hello }))
  page.askForDocument()
  await page.sees((doc) => doc.getMap('lines').has('trace'))
  const { token, summary } = await access.createToken(signedIn.identity, 'bench', null)
  const program = await Page.dial(`${url}/${id}`, { headers: { authorization: `Bearer ${token}` }, clientId: 12 })
  program.send(encodeMessage({ type: MESSAGE.hello, header: { ...hello, clientId: 12 } }))
  program.askForDocument()
  await program.sees((doc) => doc.getMap('lines').has('trace'))

  expect(await program.answer(program.edit(setLoss('6 dB')))).toHaveProperty('seq')
  await page.sees((doc) => lossOf(doc) === '6 dB')
  expect(await sync.budgets.trail(id, { limit: 1 })).toMatchObject([{ personName: 'Ines Owner', door: 'token' }])
  expect(await sync.budgets.list(signedIn.identity)).toMatchObject([{ id, role: 'owner', verdict: 'inside' }])

  await access.revokeToken(owner.id, summary.id)
  expect((await program.closed).code).toBe(4401)
  expect(await page.answer(page.edit(setLoss('7 dB')))).toHaveProperty('seq')
  await access.signOut(signedIn.identity, new Headers({ cookie }))
  expect((await page.closed).code).toBe(4401)
  expect(logged).toEqual([])
})

it('[W2.22] y-websocket 3.1.0 as it is, down only: synced after the hello, follows, and takes no harm from our messages', async () => {
  const { access, sync, owner, url } = await openWhole()
  const identity = {
    person: owner.id,
    name: owner.name,
    email: owner.email,
    administrator: true,
    session: 's',
    via: 'token',
    expiresAt: null,
  } as const
  const { id } = await sync.budgets.create(identity, 'screen', smallBudget())
  const { token } = await access.createToken(identity, 'bench', null)
  class TokenSocket extends WebSocket {
    constructor(address: string, protocols: string[]) {
      super(address, protocols, { headers: { authorization: `Bearer ${token}` } })
    }
  }
  const doc = new Y.Doc()
  const provider = new WebsocketProvider(url, id, doc, {
    connect: false,
    disableBc: true,
    WebSocketPolyfill: TokenSocket as never,
  })
  onTestFinished(() => provider.destroy())
  for (const type of Object.values(MESSAGE)) provider.messageHandlers[type] = () => undefined
  const header = { person: owner.id, epoch: null, clientId: doc.clientID, seq: 0, head: null, schemaVersion: 1 }
  provider.on('status', ({ status }) => {
    if (status === 'connected') provider.ws?.send(encodeMessage({ type: MESSAGE.hello, header }))
  })
  const synced = new Promise((resolve) => provider.once('sync', resolve))
  provider.connect()
  await synced
  expect(lossOf(doc)).toBe('5 dB')
  const caller = await access.identify(new Headers({ authorization: `Bearer ${token}` }))
  if (!caller) throw new Error('Nobody.')
  const changed = new Promise((resolve) => doc.once('update', resolve))
  const operations = [{ op: 'set', section: 'lines', id: 'trace', field: 'loss', value: '6 dB' }] as const
  expect(await sync.submit(id, caller, 'token', { editId: 'one', operations })).toHaveProperty('seq')
  await changed
  expect(lossOf(doc)).toBe('6 dB')
})
