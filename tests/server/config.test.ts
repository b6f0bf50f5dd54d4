import { join } from 'node:path'
import { expect, test } from 'vitest'
import { readConfig } from '../../lib/server/boot/config.mjs'

const root = join('/', 'somewhere')

test('the demo has its own data directory and serves on loopback', () => {
  expect(readConfig('demo', {}, root)).toEqual({
    mode: 'demo',
    directory: join(root, '.data', 'demo'),
    host: '127.0.0.1',
    port: 3000,
    publicUrl: 'http://127.0.0.1:3000',
    pages: true,
  })
})

test('the demo refuses any other address', () => {
  expect(() => readConfig('demo', { HALFBAUD_HOST: '0.0.0.0' }, root)).toThrow(/loopback only/)
})

test('serving needs a named data directory', () => {
  expect(() => readConfig('serve', {}, root)).toThrow(/Set HALFBAUD_DATA/)
})

test.each([
  ['3000a', /HALFBAUD_PORT is '3000a'/],
  ['70000', /0 to 65535/],
])('port %s is refused with what to set', (port, message) => {
  expect(() => readConfig('demo', { HALFBAUD_PORT: port }, root)).toThrow(message)
})

test.each(['budgets.example.com', 'ftp://example.com', 'https://example.com/path', 'https://user@example.com'])(
  'public address %s is refused',
  (url) => {
    expect(() => readConfig('serve', { HALFBAUD_DATA: root, HALFBAUD_PUBLIC_URL: url }, root)).toThrow(
      /HALFBAUD_PUBLIC_URL/,
    )
  },
)

test('an IPv6 host is bracketed in the address', () => {
  expect(readConfig('demo', { HALFBAUD_HOST: '::1', HALFBAUD_PORT: '81' }, root).publicUrl).toBe('http://[::1]:81')
})
