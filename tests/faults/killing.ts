import { type ChildProcess, spawn } from 'node:child_process'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { build } from 'esbuild'
import { type Budget, budgetSchema } from '../../lib/budget/schema'
import { verifyEntries } from '../../lib/records/journal/verify'
import { openStore } from '../../lib/records/open'
import { readConfig } from '../../lib/server/boot/config.mjs'
import { startServer } from '../../lib/server/start'
import { freePort } from '../support/freePort'
import { connectPeer, type Peer } from '../support/peer'

const root = resolve(import.meta.dirname, '../..')
const bundled = join(root, 'dist/tests/crashingServer.mjs')
const LINES = 6

type Person = { id: string; token: string }

/** A data directory with one budget and two people who may write. */
export async function prepare() {
  await bundle()
  const directory = await mkdtemp(join(tmpdir(), 'halfbaud-kill-'))
  const port = await freePort()
  const environment = { HALFBAUD_DATA: directory, HALFBAUD_PORT: String(port), HALFBAUD_PAGES: 'off' }
  const server = await startServer(readConfig('serve', environment, root), root)
  const owner = await server.access.createOwner(server.ownerCode ?? '', {
    name: 'Orla Testa',
    email: 'orla@example.com',
    password: 'long enough 4 tests',
  })
  if (!owner || 'refused' in owner) throw new Error('No owner.')
  const added = await server.access.addPerson({ name: 'Tess Proba', email: 'tess@example.com' })
  if (!added) throw new Error('No second person.')
  const people: Person[] = []
  let budget = ''
  for (const { id, name, email } of [owner, added.person]) {
    const identity = {
      person: id,
      name,
      email,
      administrator: false,
      session: 'test',
      via: 'token' as const,
      expiresAt: null,
    }
    if (budget === '') budget = (await server.budgets.create(identity, 'import', emptyBudget())).id
    else await server.access.setMember(budget, id, 'editor')
    people.push({ id, token: (await server.access.createToken(identity, 'kills', null)).token })
  }
  await server.close()
  return {
    directory,
    environment,
    budget,
    people,
    url: `ws://127.0.0.1:${port}/collab/${budget}`,
    remove: () => rm(directory, { recursive: true, force: true }),
  }
}

/** As the real server is: one file, packages beside it. A process that compiles itself would take longer to start than to kill. */
async function bundle() {
  const entryPoints = [join(root, 'tests/faults/crashingServer.ts')]
  await build({
    entryPoints,
    outfile: bundled,
    bundle: true,
    platform: 'node',
    format: 'esm',
    packages: 'external',
    logLevel: 'warning',
  })
}

export type Prepared = Awaited<ReturnType<typeof prepare>>

function emptyBudget(): Budget {
  const lines = Object.fromEntries(
    Array.from({ length: LINES }, (_, i) => [`line-${i}`, { order: `a${i}`, name: `Line ${i}` }]),
  )
  return budgetSchema.parse({ head: { schemaVersion: 1, name: 'To be killed' }, lines })
}

/** Starts the server, lets both people write as fast as they can, and kills it. @returns what was in flight at that moment */
export async function killOnce(
  prepared: Prepared,
  acknowledged: Map<string, number>,
  how: { atAppend: number; afterMicroseconds: number } | { afterAcknowledgements: number },
) {
  const crash =
    'atAppend' in how ? { CRASH_AT_APPEND: String(how.atAppend), CRASH_AFTER_US: String(how.afterMicroseconds) } : {}
  const child = spawn(process.execPath, [bundled], {
    cwd: root,
    env: { ...process.env, ...prepared.environment, ...crash },
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  const said = await untilReady(child)
  let answers = 0
  const peers = await Promise.all(
    prepared.people.map((person) =>
      connectPeer({
        url: prepared.url,
        headers: { authorization: `Bearer ${person.token}` },
        person: person.id,
        onAcknowledged: ({ editId, seq }) => {
          acknowledged.set(editId, seq)
          answers += 1
          if ('afterAcknowledgements' in how && answers === how.afterAcknowledgements) child.kill('SIGKILL')
        },
      }),
    ),
  )
  const ended = new Promise<void>((done) => child.once('exit', () => done()))
  const writing = peers.map((peer, index) => keepWriting(peer, index))
  await ended
  const waiting = peers.reduce((sum, peer) => sum + peer.waiting.size, 0)
  await Promise.all(writing)
  return { duringAppend: said.join('').includes('crash during an append'), waiting }
}

async function untilReady(child: ChildProcess): Promise<string[]> {
  const said: string[] = []
  await new Promise<void>((resolve, reject) => {
    child.stdout?.on('data', (bytes) => {
      said.push(String(bytes))
      if (String(bytes).includes('ready')) resolve()
    })
    child.once('exit', () => reject(new Error(`The server ended before it was ready: ${said.join('')}`)))
  })
  return said
}

/** A few edits in flight at all times, until the socket is gone. */
async function keepWriting(peer: Peer, index: number): Promise<void> {
  let open = true
  peer.closed.then(() => {
    open = false
  })
  for (let count = 0; open; count += 1) {
    const line = peer.doc.getMap('lines').get(`line-${count % LINES}`)
    if (!(line && typeof line === 'object' && 'set' in line && typeof line.set === 'function'))
      throw new Error('The document came without its lines.')
    line.set(index === 0 ? 'supplier' : 'layer', `${index}-${count}`)
    while (open && peer.waiting.size > 3) await new Promise((next) => setImmediate(next))
    await new Promise((next) => setImmediate(next))
  }
}

/** What stands in the files after all kills: every acknowledged edit once at its seq, and a whole chain. */
export async function inspect(prepared: Prepared, acknowledged: ReadonlyMap<string, number>) {
  const store = await openStore(prepared.directory)
  try {
    const rows = await store.journal.rows(prepared.budget, 0)
    const seen = new Map<string, number[]>()
    for (const { entry } of rows)
      if (entry.kind !== 'bind') seen.set(entry.editId, [...(seen.get(entry.editId) ?? []), entry.seq])
    return {
      entries: rows.length,
      lost: [...acknowledged].filter(([editId, seq]) => !seen.get(editId)?.includes(seq)).map(([editId]) => editId),
      twice: [...seen].filter(([, seqs]) => seqs.length > 1).map(([editId]) => editId),
      chain: verifyEntries(rows),
      problems: store.problems,
    }
  } finally {
    await store.close()
  }
}
