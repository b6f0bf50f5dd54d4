import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { type Access, openAccess } from '../../lib/access/open'
import { openStore } from '../../lib/records/open'
import type { Records, Store } from '../../lib/records/types'

export const OWNER = { name: 'Ines Owner', email: 'owner@example.com', password: 'nine tall green lamps' }

export type World = {
  directory: string
  store: Store
  access: Access
  records: Records
  /** What was logged: nothing, unless a test says otherwise. */
  logged: string[]
  now(): number
  /** Moves the clock of lib/access on, which stands still otherwise; the account library keeps the machine's. */
  advance(milliseconds: number): void
  close(): Promise<void>
}

export async function openWorld(options: { publicUrl?: string } = {}): Promise<World> {
  const directory = await mkdtemp(join(tmpdir(), 'halfbaud-access-'))
  const store = await openStore(directory)
  const { records } = store
  const logged: string[] = []
  let ahead = 0
  const start = Date.now()
  const now = () => start + ahead
  const access = await openAccess({
    records,
    publicUrl: options.publicUrl ?? 'http://127.0.0.1:3000',
    secret: 'Zr8vQ2m1Lw0pXk7TtYb4Nc6Hs9Fd3Ga5',
    clock: now,
    log: (message, error) => logged.push(`${message}: ${error}`),
  })
  return {
    directory,
    store,
    access,
    records,
    logged,
    now,
    advance: (milliseconds) => {
      ahead += milliseconds
    },
    close: async () => {
      access.close()
      await store.close()
      await rm(directory, { recursive: true })
    },
  }
}

/** A world whose owner exists. @returns it with the owner's id */
export async function ownedWorld(options: { publicUrl?: string } = {}) {
  const world = await openWorld(options)
  const code = await world.access.ownerCode()
  const owner = await world.access.createOwner(code ?? '', OWNER)
  if (!owner || 'refused' in owner) throw new Error('The first owner could not be made')
  return { ...world, owner }
}

export function from(peer: string, more: Record<string, string> = {}): Headers {
  return new Headers({ 'x-halfbaud-peer': peer, ...more })
}

/** The Cookie header that a browser would send back. */
export function cookieOf(setCookie: readonly string[]): string {
  return setCookie.map((line) => line.split(';')[0]).join('; ')
}

export async function signedIn(access: Access, email: string, password: string, peer = '192.0.2.1') {
  const result = await access.signIn(email, password, from(peer))
  if (!result || 'slow' in result) throw new Error(`Sign-in of ${email} failed`)
  const headers = from(peer, { cookie: cookieOf(result.cookies) })
  return { ...result, headers }
}
