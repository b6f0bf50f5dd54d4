import { readJson } from '../../lib/budget/jsonText'
import { Problem } from './problem'

export const JSON_LIMIT = 64 * 1024

/** Media type without its parameters, in small letters. */
function mediaTypeOf(headers: Headers): string {
  return (headers.get('content-type') ?? '').split(';')[0]?.trim().toLowerCase() ?? ''
}

export function requireMediaType(headers: Headers, types: readonly string[]): string {
  const type = mediaTypeOf(headers)
  if (!types.includes(type)) throw new Problem('content-type', { detail: `Send one of: ${types.join(', ')}.` })
  return type
}

/** @throws Problem 'too-large' where more than `limit` bytes are announced, before any of them is read */
export function requireSize(headers: Headers, limit: number): void {
  if (Number(headers.get('content-length') ?? 0) > limit) throw tooLarge(limit)
}

/** The body's bytes as they arrive. @throws Problem 'too-large' as soon as more than `limit` bytes have come */
export async function* bytesOf(request: Request, limit: number): AsyncGenerator<Uint8Array> {
  if (!request.body) return
  const reader = request.body.getReader()
  let size = 0
  try {
    for (;;) {
      const { done, value } = await reader.read()
      if (done) return
      size += value.byteLength
      if (size > limit) throw tooLarge(limit)
      yield value
    }
  } finally {
    await reader.cancel()
  }
}

/** @throws Problem 'too-large' or 'bad-json' */
export async function jsonOf(request: Request, limit: number): Promise<unknown> {
  const chunks: Uint8Array[] = []
  for await (const chunk of bytesOf(request, limit)) chunks.push(chunk)
  let text: string
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(Buffer.concat(chunks))
  } catch {
    throw new Problem('bad-json', { detail: 'The body is not UTF-8.' })
  }
  const read = readJson(text)
  if ('value' in read) return read.value
  const { line, column, message } = read.problem
  throw new Problem('bad-json', { detail: `Line ${line}, column ${column}: ${message}` })
}

function tooLarge(limit: number): Problem {
  const size = limit >= 1024 * 1024 ? `${limit / 1024 / 1024} MB` : `${limit / 1024} kB`
  return new Problem('too-large', { detail: `At most ${size}.` })
}
