import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { onTestFinished } from 'vitest'

/** A directory of its own for the running test, removed after it. */
export async function temporaryDirectory(): Promise<string> {
  const directory = await mkdtemp(join(tmpdir(), 'halfbaud-records-'))
  onTestFinished(() => rm(directory, { recursive: true, force: true }))
  return directory
}
