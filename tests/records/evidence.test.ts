import { createHash } from 'node:crypto'
import { chmod, mkdir, readdir, stat, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { EvidenceTooLarge, openEvidence } from '../../lib/records/evidence'
import { temporaryDirectory } from './temporary'

/** SHA-256 of 'abc' (FIPS 180-4, example values of NIST). */
const ABC = 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'

async function* chunks(...parts: (string | Uint8Array | Error)[]): AsyncGenerator<Uint8Array> {
  for (const part of parts) {
    if (part instanceof Error) throw part
    yield typeof part === 'string' ? new TextEncoder().encode(part) : part
  }
}

async function fresh() {
  const directory = join(await temporaryDirectory(), 'evidence')
  const files = async () => {
    const found = await readdir(directory, { recursive: true, withFileTypes: true })
    return found.filter((entry) => entry.isFile()).map((entry) => entry.name)
  }
  return { directory, files, evidence: await openEvidence(directory) }
}

const bytesOf = async (stream: ReadableStream<Uint8Array> | null) =>
  stream && Buffer.from(await new Response(stream).arrayBuffer())

describe('[W6.12] evidence is kept by its SHA-256', () => {
  test('the bytes come back, whatever pieces they came in', async () => {
    const { evidence, files } = await fresh()
    expect(await evidence.has(ABC)).toBe(false)
    expect(await evidence.store(chunks('a', '', 'bc'), 3)).toEqual({ sha256: ABC, size: 3 })
    expect(await evidence.has(ABC)).toBe(true)
    expect((await bytesOf(await evidence.open(ABC)))?.toString()).toBe('abc')
    expect(await files()).toEqual([ABC])
  })

  test('any bytes in any pieces, over many reads of the file too', async () => {
    const { evidence } = await fresh()
    const pieces = fc.array(fc.uint8Array({ maxLength: 100_000 }), { maxLength: 6 })
    await fc.assert(
      fc.asyncProperty(pieces, async (parts) => {
        const whole = Buffer.concat(parts)
        const stored = await evidence.store(chunks(...parts), whole.byteLength)
        expect(stored.sha256).toBe(createHash('sha256').update(whole).digest('hex'))
        expect((await bytesOf(await evidence.open(stored.sha256)))?.equals(whole)).toBe(true)
      }),
      { numRuns: 30 },
    )
  })

  test('the same bytes are one file; only the owner may read it', async () => {
    const { directory, evidence, files } = await fresh()
    await evidence.store(chunks('abc'), 9)
    await evidence.store(chunks('a', 'bc'), 9)
    expect(await files()).toEqual([ABC])
    expect((await stat(join(directory, 'ba', ABC))).mode & 0o777).toBe(0o600)
    expect((await stat(join(directory, 'ba'))).mode & 0o777).toBe(0o700)
  })

  test('the same file twice at once is stored once, and both are answered', async () => {
    const { evidence, files } = await fresh()
    const stored = await Promise.all(Array.from({ length: 8 }, () => evidence.store(chunks('ab', 'c'), 9)))
    expect(new Set(stored.map(({ sha256 }) => sha256))).toEqual(new Set([ABC]))
    expect(await files()).toEqual([ABC])
  })

  test('a reader who gives up leaves nothing open; the next one reads it all', async () => {
    const { evidence } = await fresh()
    const { sha256 } = await evidence.store(chunks(new Uint8Array(300_000)), 300_000)
    const reader = (await evidence.open(sha256))?.getReader()
    await reader?.read()
    await reader?.cancel()
    expect((await bytesOf(await evidence.open(sha256)))?.byteLength).toBe(300_000)
  })

  test('storing the same bytes again mends a file that the disk shortened', async () => {
    const { directory, evidence } = await fresh()
    await evidence.store(chunks('abc'), 9)
    await writeFile(join(directory, 'ba', ABC), 'a')
    await evidence.store(chunks('abc'), 9)
    expect((await bytesOf(await evidence.open(ABC)))?.toString()).toBe('abc')
  })
})

describe('what is not stored leaves nothing', () => {
  test('a file past the limit, found out while it comes', async () => {
    const { evidence, files } = await fresh()
    let asked = 0
    const endless = (async function* () {
      for (;;) {
        asked += 1
        yield new Uint8Array(10)
      }
    })()
    await expect(evidence.store(endless, 25)).rejects.toThrow(EvidenceTooLarge)
    expect(asked).toBe(3)
    expect(await files()).toEqual([])
  })

  test('an upload that breaks off', async () => {
    const { evidence, files } = await fresh()
    await expect(evidence.store(chunks('ab', new Error('connection lost')), 9)).rejects.toThrow('connection lost')
    expect(await files()).toEqual([])
    expect(await evidence.has(ABC)).toBe(false)
  })

  test('an upload that the process did not live to finish is gone after the next start', async () => {
    const { directory, evidence, files } = await fresh()
    await evidence.store(chunks('abc'), 9)
    await writeFile(join(directory, 'incoming', 'left-behind'), 'ab')
    const again = await openEvidence(directory)
    expect(await files()).toEqual([ABC])
    expect(await again.has(ABC)).toBe(true)
  })
})

test('a name that is no SHA-256 is never looked for', async () => {
  const { directory, evidence } = await fresh()
  await writeFile(join(directory, '..', 'secret'), 'x')
  await mkdir(join(directory, 'ab'))
  await chmod(join(directory, 'ab'), 0o700)
  for (const name of ['../secret', 'ab', '', 'incoming', ABC.toUpperCase(), `${ABC}/../../secret`, `${ABC}\n`]) {
    expect(await evidence.has(name), name).toBe(false)
    expect(await evidence.open(name), name).toBeNull()
  }
})
