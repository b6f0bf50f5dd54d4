import { afterAll, beforeAll, expect, test } from 'vitest'
import { createThrottle } from '../../lib/access/throttle'
import { from, OWNER, ownedWorld, signedIn } from './world'

let world: Awaited<ReturnType<typeof ownedWorld>>
beforeAll(async () => {
  world = await ownedWorld()
})
afterAll(() => world.close())

function clocked() {
  let now = 1_700_000_000_000
  const throttle = createThrottle(() => now)
  return {
    /** @returns the wait in seconds, or 0 where the try was looked at (and failed). */
    fail(account: string, address: string): number {
      const attempt = throttle.begin(account, address)
      return 'slow' in attempt ? attempt.slow : 0
    },
    succeed(account: string, address: string): number {
      const attempt = throttle.begin(account, address)
      if ('slow' in attempt) return attempt.slow
      attempt.succeeded()
      return 0
    },
    cancel(account: string, address: string): void {
      const attempt = throttle.begin(account, address)
      if (!('slow' in attempt)) attempt.cancelled()
    },
    advance(seconds: number) {
      now += seconds * 1000
    },
  }
}

test('[W3.47] five tries are free, then the wait doubles up to five minutes', () => {
  const { fail, advance } = clocked()
  for (let i = 0; i < 5; i++) expect(fail('a', '192.0.2.1')).toBe(0)
  const waits: number[] = []
  for (let i = 0; i < 12; i++) {
    const wait = fail('a', '192.0.2.1')
    waits.push(wait)
    advance(wait)
    expect(fail('a', '192.0.2.1')).toBe(0)
  }
  expect(waits).toEqual([1, 2, 4, 8, 16, 32, 64, 128, 256, 300, 300, 300])
})

test('[W3.48] a thousand failures of one account stop nobody else, at the same address or another', () => {
  const { fail, succeed, advance } = clocked()
  let looked = 0
  for (let i = 0; i < 1000; i++) {
    if (fail('victim', '192.0.2.1') === 0) looked++
    else advance(5)
  }
  expect(looked).toBeGreaterThan(15)
  expect(succeed('other', '192.0.2.1')).toBe(0)
  expect(succeed('other', '192.0.2.2')).toBe(0)
})

test('tries sent at once count before any of them is answered', () => {
  const { fail } = clocked()
  const answers = Array.from({ length: 50 }, () => fail('a', '192.0.2.1'))
  expect(answers.filter((wait) => wait === 0)).toHaveLength(5)
})

test('guessing one account from many addresses is slowed, but not for a person who has signed in from there before', () => {
  const { fail, succeed, advance } = clocked()
  expect(succeed('victim', '198.51.100.1')).toBe(0)
  let looked = 0
  for (let i = 0; i < 200; i++) if (fail('victim', `203.0.113.${i}`) === 0) looked++
  expect(looked).toBe(20)
  expect(succeed('victim', '198.51.100.1')).toBe(0)
  advance(61)
  expect(succeed('victim', '198.51.100.2')).toBe(0)
})

test('trying many accounts from one address is slowed, but not for people known there', () => {
  const { fail, succeed } = clocked()
  expect(succeed('colleague', '192.0.2.1')).toBe(0)
  let looked = 0
  for (let i = 0; i < 200; i++) if (fail(`guess-${i}`, '192.0.2.1') === 0) looked++
  expect(looked).toBe(20)
  expect(succeed('colleague', '192.0.2.1')).toBe(0)
  expect(succeed('newcomer', '192.0.2.2')).toBe(0)
})

test('a right password clears the count; a try that was not looked at leaves none', () => {
  const { fail, succeed, cancel } = clocked()
  for (let i = 0; i < 4; i++) fail('a', '192.0.2.1')
  expect(succeed('a', '192.0.2.1')).toBe(0)
  for (let i = 0; i < 4; i++) expect(fail('a', '192.0.2.1')).toBe(0)
  for (let i = 0; i < 20; i++) cancel('a', '192.0.2.1')
  expect(fail('a', '192.0.2.1')).toBe(0)
  expect(fail('a', '192.0.2.1')).toBe(1)
})

test('an hour after the last failure the count is forgotten', () => {
  const { fail, advance } = clocked()
  for (let i = 0; i < 5; i++) fail('a', '192.0.2.1')
  expect(fail('a', '192.0.2.1')).toBe(1)
  advance(3600)
  for (let i = 0; i < 5; i++) expect(fail('a', '192.0.2.1')).toBe(0)
})

test('[W3.49] a thousand wrong sign-ins do not keep another person out, and a forged x-forwarded-for changes nothing', async () => {
  const added = await world.access.addPerson({ name: 'Ada', email: 'ada@example.com' })
  const answers = await Promise.all(
    Array.from({ length: 1000 }, (_, i) =>
      world.access.signIn(
        'ada@example.com',
        `guess ${i}`,
        from('192.0.2.9', { 'x-forwarded-for': `203.0.113.${i % 250}` }),
      ),
    ),
  )
  expect(answers.filter((answer) => answer === null)).toHaveLength(5)
  expect(answers.filter((answer) => answer !== null && 'slow' in answer)).toHaveLength(995)
  await signedIn(world.access, OWNER.email, OWNER.password, '192.0.2.9')
  await signedIn(world.access, 'ada@example.com', added?.password ?? '', '198.51.100.4')
  expect(world.logged).toEqual([])
})

test('guessing the current password in a stolen session is throttled too', async () => {
  const { identity, headers } = await signedIn(world.access, OWNER.email, OWNER.password)
  const guess = () => world.access.changePassword(identity, 'a wrong current one', 'quite another long one', headers)
  for (let i = 0; i < 5; i++) expect(await guess()).toBeNull()
  expect(await guess()).toEqual({ slow: 1 })
})
