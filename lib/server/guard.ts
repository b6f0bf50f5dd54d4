import { randomBytes } from 'node:crypto'
import type { IncomingMessage, ServerResponse } from 'node:http'

/** Headers that only this server may set; a client's own copies are dropped before anything reads them. */
const OURS = [
  'x-halfbaud-peer',
  'x-nonce',
  'x-forwarded-for',
  'x-forwarded-host',
  'x-forwarded-proto',
  'forwarded',
  'content-security-policy',
]

export type GuardOptions = { readonly publicUrl: string; readonly policy: boolean }

/**
 * What every HTTP request passes before a page or handler sees it: the right host, the peer's address as the socket knows it,
 * and a content security policy with a fresh nonce. @returns false where the request has been answered here.
 */
export function guard(request: IncomingMessage, response: ServerResponse, options: GuardOptions): boolean {
  for (const name of OURS) delete request.headers[name]
  request.headers['x-halfbaud-peer'] = request.socket.remoteAddress ?? 'unknown'
  const wanted = new URL(options.publicUrl)
  if (request.headers.host !== wanted.host) {
    sendElsewhere(request, response, wanted)
    return false
  }
  response.setHeader('x-content-type-options', 'nosniff')
  response.setHeader('referrer-policy', 'same-origin')
  response.setHeader('x-frame-options', 'DENY')
  if (request.url?.startsWith('/api/')) {
    // Data, never a page: whatever a browser is talked into showing of it may run nothing.
    response.setHeader('content-security-policy', "default-src 'none'; frame-ancestors 'none'; sandbox")
  } else if (options.policy) {
    const nonce = randomBytes(16).toString('base64')
    const policy = policyWith(nonce, wanted)
    request.headers['x-nonce'] = nonce
    // Next puts the nonce of this request header on the scripts that it writes.
    request.headers['content-security-policy'] = policy
    response.setHeader('content-security-policy', policy)
  }
  return true
}

/** A person who typed another name of this machine is led to the one that the Origin check knows. */
function sendElsewhere(request: IncomingMessage, response: ServerResponse, wanted: URL): void {
  const loopback = /^(localhost|127\.0\.0\.1|\[::1\])(:\d+)?$/.test(request.headers.host ?? '')
  if (request.method === 'GET' && loopback) {
    const path = request.url?.startsWith('/') ? request.url : '/'
    response.writeHead(307, { location: `${wanted.origin}${path}` }).end()
    return
  }
  response
    .writeHead(421, { 'content-type': 'text/plain; charset=utf-8' })
    .end(`This server answers at ${wanted.origin} only.\n`)
}

function policyWith(nonce: string, url: URL): string {
  const socket = `${url.protocol === 'https:' ? 'wss' : 'ws'}://${url.host}`
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'`,
    // Positions in the drawings are style attributes.
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    `connect-src 'self' ${socket}`,
    "worker-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ')
}
