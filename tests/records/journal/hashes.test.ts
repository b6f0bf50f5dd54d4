import { createHash } from 'node:crypto'
import canonicalize from 'canonicalize'
import { describe, expect, test } from 'vitest'
import { entryHash, GENESIS, sealEntry } from '../../../lib/records/journal/entry'
import { sha256Hex } from '../../../lib/records/sha256'

const parts = {
  budget: 'b1',
  epoch: 1,
  seq: 1,
  kind: 'seed',
  editId: 'e1',
  person: 'p1',
  door: 'screen',
  time: 1_700_000_000_000,
  clientId: null,
  changes: [{ section: 'lines', id: 'l1', field: 'name', kind: 'set', before: null, after: 'Ω' }],
  engine: '0.1.0',
} as const

describe('an entry’s hash', () => {
  test('[W5.5] is the SHA-256 of this text, written by hand and hashed by coreutils sha256sum 9.1', () => {
    const entry = sealEntry(parts, new TextEncoder().encode('abc'), GENESIS)
    const text =
      '{"budget":"b1","changes":[{"after":"Ω","before":null,"field":"name","id":"l1","kind":"set","section":"lines"}],' +
      '"clientId":null,"door":"screen","editId":"e1","engine":"0.1.0","epoch":1,"kind":"seed","person":"p1",' +
      `"prev":"${'0'.repeat(64)}","seq":1,"time":1700000000000,` +
      '"updateSha256":"ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad","v":1}'
    expect(entry.hash).toBe(createHash('sha256').update(text).digest('hex'))
    expect(entry.hash).toBe('8318369feb0593d140abc924c8d98f8c47648c428917a31e8594aceb8bd17dd7')
  })

  test('[W5.6] depends on every field and on nothing else', () => {
    const entry = sealEntry(parts, new Uint8Array([1]), GENESIS)
    const { hash, ...unsealed } = entry
    expect(entryHash({ ...unsealed })).toBe(hash)
    expect(entryHash(Object.fromEntries(Object.entries(unsealed).reverse()) as typeof unsealed)).toBe(hash)
    const others = {
      ...{ v: 2, budget: 'b2', epoch: 2, seq: 2, kind: 'edit', editId: 'e2', person: 'p2', door: 'token', time: 1 },
      ...{ clientId: 1, updateSha256: GENESIS, changes: [], engine: '0.1.1', prev: 'f'.repeat(64) },
    }
    expect(Object.keys(others).sort()).toEqual(Object.keys(unsealed).sort())
    for (const [field, value] of Object.entries(others))
      expect(entryHash({ ...unsealed, [field]: value } as typeof unsealed), field).not.toBe(hash)
  })

  test('what has no canonical form is refused, not dropped', () => {
    for (const after of [Number.NaN, Number.POSITIVE_INFINITY, '\ud800'])
      expect(() =>
        sealEntry({ ...parts, changes: [{ ...parts.changes[0], after }] }, new Uint8Array(), GENESIS),
      ).toThrow()
  })
})

test('SHA-256 of "abc" and of the two-block message (FIPS 180-4, example values of NIST)', () => {
  expect(sha256Hex('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad')
  expect(sha256Hex('abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq')).toBe(
    '248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1',
  )
})

describe('RFC 8785 as published', () => {
  test('the sample of section 3.2.2 gives the bytes of section 3.2.4', () => {
    const sample = JSON.parse(String.raw`{
      "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
      "string": "\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/",
      "literals": [null, true, false]
    }`)
    const published = `
      7b 22 6c 69 74 65 72 61 6c 73 22 3a 5b 6e 75 6c 6c 2c 74 72 75 65 2c 66 61 6c 73 65 5d 2c 22 6e 75 6d 62 65 72
      73 22 3a 5b 33 33 33 33 33 33 33 33 33 2e 33 33 33 33 33 33 33 2c 31 65 2b 33 30 2c 34 2e 35 2c 30 2e 30 30 32
      2c 31 65 2d 32 37 5d 2c 22 73 74 72 69 6e 67 22 3a 22 e2 82 ac 24 5c 75 30 30 30 66 5c 6e 41 27 42 5c 22 5c 5c
      5c 5c 5c 22 2f 22 7d`
    expect(Buffer.from(canonicalize(sample) ?? '').toString('hex')).toBe(published.replace(/\s/g, ''))
  })

  test('names are sorted by UTF-16 code units (section 3.2.3)', () => {
    const names = ['\u20ac', '\r', '\ufb33', '1', '\ud83d\ude00', '\u0080', '\u00f6']
    const sorted = canonicalize(Object.fromEntries(names.map((name, index) => [name, index])))
    expect(sorted).toBe('{"\\r":1,"1":3,"\u0080":5,"\u00f6":6,"\u20ac":0,"\ud83d\ude00":4,"\ufb33":2}')
  })

  test.each([
    ['0000000000000000', '0'],
    ['8000000000000000', '0'],
    ['0000000000000001', '5e-324'],
    ['8000000000000001', '-5e-324'],
    ['7fefffffffffffff', '1.7976931348623157e+308'],
    ['4340000000000000', '9007199254740992'],
    ['4430000000000000', '295147905179352830000'],
    ['44b52d02c7e14af5', '9.999999999999997e+22'],
    ['44b52d02c7e14af6', '1e+23'],
    ['44b52d02c7e14af7', '1.0000000000000001e+23'],
    ['444b1ae4d6e2ef50', '1e+21'],
    ['3eb0c6f7a0b5ed8c', '9.999999999999997e-7'],
    ['3eb0c6f7a0b5ed8d', '0.000001'],
    ['41b3de4355555555', '333333333.3333333'],
    ['becbf647612f3696', '-0.0000033333333333333333'],
    ['43143ff3c1cb0959', '1424953923781206.2'],
  ])('the double %s is written %s (appendix B)', (bits, text) => {
    expect(canonicalize(Buffer.from(bits, 'hex').readDoubleBE())).toBe(text)
  })
})
