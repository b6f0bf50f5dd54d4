import { expect, test } from 'vitest'
import { AgingMap } from '../../lib/access/agingMap'
import { openAccess } from '../../lib/access/open'
import { readableSecret, refusePassword } from '../../lib/access/passwords'
import { peerOf } from '../../lib/access/peer'
import { createRevocations } from '../../lib/access/revocations'
import { createSessionMemory } from '../../lib/access/sessionMemory'
import { createTurns } from '../../lib/access/turns'
import type { Records } from '../../lib/records/types'

const person = { email: 'ada.lines@example.com' }

test('passwords of 12 to 128 characters are taken, characters being counted and not code units', () => {
  expect(refusePassword('abcdefghijk', person)).toContain('at least 12')
  expect(refusePassword('abcdefghijkl', person)).toBeNull()
  expect(refusePassword('𝄞abcde'.repeat(22).slice(0, -5), person)).toBeNull()
  expect(refusePassword('abcdefgh'.repeat(16), person)).toBeNull()
  expect(refusePassword(`${'abcdefgh'.repeat(16)}!`, person)).toContain('at most 128')
  expect(refusePassword('aaaaaaaaaaaaaaa', person)).toContain('five different')
  expect(refusePassword('ADA.lines@example.com', person)).toContain('e-mail')
})

test('readable secrets have no letters that look alike, and do not repeat', () => {
  const secrets = new Set(Array.from({ length: 200 }, () => readableSecret(4)))
  expect(secrets.size).toBe(200)
  for (const secret of secrets) expect(secret).toMatch(/^([abcdefghjkmnpqrstuvwxyz23456789]{5}-){3}[a-z2-9]{5}$/)
})

test.each([
  ['192.0.2.1', '192.0.2.1'],
  ['::ffff:192.0.2.1', '192.0.2.1'],
  ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2/64'],
  ['2001:DB8:1:2::9', '2001:db8:1:2/64'],
  ['2001:db8::1', '2001:db8:0:0/64'],
  ['fe80::1%eth0', 'fe80:0:0:0/64'],
  ['::1', '0:0:0:0/64'],
  ['nonsense', 'unknown'],
])('the peer %s counts as %s', (address, counted) => {
  expect(peerOf(new Headers({ 'x-halfbaud-peer': address, 'x-forwarded-for': '203.0.113.9' }))).toBe(counted)
})

test('without the header of the server itself the peer is unknown, whatever else is claimed', () => {
  expect(peerOf(new Headers({ 'x-forwarded-for': '203.0.113.9', forwarded: 'for=203.0.113.9' }))).toBe('unknown')
})

test('an aging map forgets what is old and what was longest untouched', () => {
  let now = 0
  const map = new AgingMap<number>({ maxAge: 10, maxSize: 2 }, () => now)
  map.set('a', 1)
  map.set('b', 2)
  map.set('a', 3)
  map.set('c', 4)
  expect([map.get('a'), map.get('b'), map.get('c')]).toEqual([3, undefined, 4])
  now = 10
  expect(map.get('a')).toBeUndefined()
})

test('turns let so many run at once, in order, and go on after a failure', async () => {
  const inTurn = createTurns(2)
  const started: number[] = []
  let running = 0
  let most = 0
  const work = (n: number) => async () => {
    started.push(n)
    most = Math.max(most, ++running)
    await Promise.resolve()
    await Promise.resolve()
    running--
    if (n === 1) throw new Error('one')
    return n
  }
  const results = await Promise.allSettled([0, 1, 2, 3, 4].map((n) => inTurn(work(n))))
  expect(results.map(({ status }) => status)).toEqual(['fulfilled', 'rejected', 'fulfilled', 'fulfilled', 'fulfilled'])
  expect(started).toEqual([0, 1, 2, 3, 4])
  expect(most).toBe(2)
})

test('[W3.52] a session read before a revocation is not held after it', () => {
  const revocations = createRevocations(() => {})
  const memory = createSessionMemory(() => 1000, revocations)
  const identity = {
    person: 'p',
    name: 'P',
    email: 'p@example.com',
    administrator: false,
    session: 's',
    via: 'cookie',
    expiresAt: 2000,
  } as const
  const mark = memory.mark()
  memory.drop('s')
  expect(memory.hold({ identity, key: 'k' }, mark)).toBe(false)
  expect(memory.valid(identity)).toBe(false)
  expect(memory.hold({ identity, key: 'k' }, memory.mark())).toBe(true)
  expect(memory.valid(identity)).toBe(true)
  expect(memory.valid({ ...identity, person: 'q' })).toBe(false)
})

test('a short secret is refused', async () => {
  const options = { records: {} as Records, publicUrl: 'http://127.0.0.1:3000', clock: Date.now, log: () => {} }
  await expect(openAccess({ ...options, secret: 'short' })).rejects.toThrow('at least 32 characters')
})
