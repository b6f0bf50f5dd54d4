import { createServer, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { afterEach, expect, test } from 'vitest'
import { guard } from '../../lib/server/guard'

let server: Server | undefined
afterEach(() => new Promise<void>((done) => (server ? server.close(() => done()) : done())))

/** A server behind the guard that answers with the request headers it saw. */
async function listen(): Promise<string> {
  let url = ''
  server = createServer((request, response) => {
    if (guard(request, response, { publicUrl: url, policy: true })) response.end(JSON.stringify(request.headers))
  })
  const listening = server
  await new Promise<void>((done) => listening.listen(0, '127.0.0.1', done))
  url = `http://127.0.0.1:${(listening.address() as AddressInfo).port}`
  return url
}

test('forged peer and nonce headers are replaced by our own', async () => {
  const url = await listen()
  const forged = { 'x-halfbaud-peer': '10.0.0.9', 'x-nonce': 'mine', 'x-forwarded-for': '10.0.0.9' }
  const response = await fetch(url, { headers: forged })
  const seen = (await response.json()) as Record<string, string>
  expect(seen['x-halfbaud-peer']).toBe('127.0.0.1')
  expect(seen['x-forwarded-for']).toBeUndefined()
  expect(seen['x-nonce']).not.toBe('mine')
  expect(response.headers.get('content-security-policy')).toContain(`'nonce-${seen['x-nonce']}'`)
})

test('a worker of a page is a file of this server', async () => {
  const { headers } = await fetch(await listen())
  expect(headers.get('content-security-policy')?.split('; ')).toContain("worker-src 'self'")
})

test('each request has a nonce of its own', async () => {
  const url = await listen()
  const policies = await Promise.all(
    [fetch(url), fetch(url)].map(async (response) => (await response).headers.get('content-security-policy')),
  )
  expect(policies[0]).not.toBe(policies[1])
})

test('another name of this machine is led to the public address, and nowhere else', async () => {
  const url = await listen()
  const port = new URL(url).port
  const response = await raw(
    port,
    `GET //elsewhere.example/x HTTP/1.1\r\nHost: localhost:${port}\r\nConnection: close\r\n\r\n`,
  )
  expect(response).toMatch(/^HTTP\/1.1 307/)
  expect(response.toLowerCase()).toContain(`location: ${url}//elsewhere.example/x\r\n`)
})

test('a foreign host is refused', async () => {
  const port = new URL(await listen()).port
  expect(await raw(port, 'GET / HTTP/1.1\r\nHost: elsewhere.example\r\nConnection: close\r\n\r\n')).toMatch(
    /^HTTP\/1.1 421/,
  )
})

async function raw(port: string, text: string): Promise<string> {
  const { connect } = await import('node:net')
  return new Promise((resolve, reject) => {
    let answer = ''
    const socket = connect(Number(port), '127.0.0.1', () => socket.write(text))
    socket.on('data', (bytes) => {
      answer += bytes
    })
    socket.on('end', () => resolve(answer))
    socket.on('error', reject)
  })
}

test('what the API answers may run nothing in a browser', async () => {
  const response = await fetch(`${await listen()}/api/v1/health`)
  expect(response.headers.get('content-security-policy')).toBe("default-src 'none'; frame-ancestors 'none'; sandbox")
})
