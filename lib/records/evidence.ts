import { createHash, randomUUID } from 'node:crypto'
import { createReadStream } from 'node:fs'
import { type FileHandle, mkdir, open, readdir, rename, rm, stat } from 'node:fs/promises'
import { join } from 'node:path'
import { syncDirectory } from './privateFile'
import type { EvidenceFiles } from './types'

/** The file is longer than may be stored; nothing of it was kept. */
export class EvidenceTooLarge extends Error {
  constructor(readonly limit: number) {
    super(`The file is larger than ${limit} bytes; nothing of it was stored. Attach a smaller file.`)
    this.name = 'EvidenceTooLarge'
  }
}

const SHA256 = /^[0-9a-f]{64}$/

/** Where a file with this SHA-256 lies, if it is there; null for what is no SHA-256. Nothing that a person names is in a path. */
export function evidencePath(directory: string, sha256: string): string | null {
  return SHA256.test(sha256) ? join(directory, sha256.slice(0, 2), sha256) : null
}

/**
 * Opens the evidence files below a directory, one file per SHA-256, and removes what an upload that was cut off left
 * behind. Nothing that a person names ever becomes part of a path.
 */
export async function openEvidence(directory: string): Promise<EvidenceFiles> {
  const incoming = join(directory, 'incoming')
  await mkdir(incoming, { recursive: true, mode: 0o700 })
  for (const name of await readdir(incoming)) await rm(join(incoming, name))
  await syncDirectory(directory)

  const shelf = (sha256: string) => join(directory, sha256.slice(0, 2))
  const find = async (sha256: string) => {
    const path = evidencePath(directory, sha256)
    return path !== null && (await isFile(path)) ? path : null
  }

  return {
    async store(bytes, limit) {
      const aside = join(incoming, randomUUID())
      try {
        const stored = await writeAside(aside, bytes, limit)
        const folder = shelf(stored.sha256)
        await mkdir(folder, { mode: 0o700, recursive: true })
        await syncDirectory(directory)
        // Where the file is there already this puts the same bytes in its place, and mends it if the disk lost some.
        await rename(aside, join(folder, stored.sha256))
        await syncDirectory(folder)
        return stored
      } finally {
        await rm(aside, { force: true })
      }
    },

    async open(sha256) {
      const path = await find(sha256)
      return path === null ? null : streamOf(path)
    },

    has: async (sha256) => (await find(sha256)) !== null,
  }
}

/** Writes the bytes to a new file, hashed and counted on the way, synced when it resolves. */
async function writeAside(
  path: string,
  bytes: AsyncIterable<Uint8Array>,
  limit: number,
): Promise<{ sha256: string; size: number }> {
  const hash = createHash('sha256')
  let size = 0
  const handle: FileHandle = await open(path, 'wx', 0o600)
  try {
    for await (const chunk of bytes) {
      size += chunk.byteLength
      if (size > limit) throw new EvidenceTooLarge(limit)
      hash.update(chunk)
      await handle.appendFile(chunk)
    }
    await handle.sync()
  } finally {
    await handle.close()
  }
  return { sha256: hash.digest('hex'), size }
}

/** The file's bytes; it is opened when somebody first reads, and closed at the end or when the reader gives up. */
function streamOf(path: string): ReadableStream<Uint8Array> {
  let chunks: AsyncIterator<Uint8Array> | null = null
  return new ReadableStream<Uint8Array>(
    {
      async pull(controller) {
        chunks ??= createReadStream(path)[Symbol.asyncIterator]()
        const { done, value } = await chunks.next()
        if (done) controller.close()
        else controller.enqueue(value)
      },
      async cancel() {
        await chunks?.return?.()
      },
    },
    { highWaterMark: 0 },
  )
}

async function isFile(path: string): Promise<boolean> {
  try {
    return (await stat(path)).isFile()
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return false
    throw error
  }
}
