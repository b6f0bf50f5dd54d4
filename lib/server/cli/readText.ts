import { readFile } from 'node:fs/promises'

/** A sentence that says why a file cannot be read, and what to do. */
export class UnreadableFile extends Error {}

const REASONS: Readonly<Record<string, string>> = {
  ENOENT: 'There is no such file; check the name.',
  EISDIR: 'This is a folder; name a file in it.',
  EACCES: 'You may not read this file; change its permissions.',
}

/**
 * Reads a whole text file, or all of the standard input where the path is '-'.
 * @throws UnreadableFile
 */
export async function readText(path: string, stdin: AsyncIterable<Uint8Array | string>): Promise<string> {
  const bytes = path === '-' ? await drain(stdin) : await bytesOf(path)
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes)
  } catch {
    throw new UnreadableFile('This is not UTF-8 text; save it as UTF-8.')
  }
}

async function bytesOf(path: string): Promise<Uint8Array> {
  try {
    return await readFile(path)
  } catch (error) {
    const code = error instanceof Error && 'code' in error ? String(error.code) : ''
    throw new UnreadableFile(
      REASONS[code] ?? `This cannot be read (${error instanceof Error ? error.message : error}).`,
    )
  }
}

async function drain(stream: AsyncIterable<Uint8Array | string>): Promise<Uint8Array> {
  const chunks: Uint8Array[] = []
  for await (const chunk of stream) chunks.push(Buffer.from(chunk))
  return Buffer.concat(chunks)
}
