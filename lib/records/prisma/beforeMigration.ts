import { copyFile, open, rename, rm } from 'node:fs/promises'
import { dirname } from 'node:path'
import { syncDirectory } from '../privateFile'

/** The copy that a migration starts from; it exists only while one is under way. */
const copyOf = (file: string) => `${file}.before-migration`

/** Copies the closed database file beside itself; whole and synced when it resolves. */
export async function keepCopy(file: string): Promise<void> {
  const unfinished = `${copyOf(file)}.unfinished`
  await copyFile(file, unfinished)
  const handle = await open(unfinished, 'r+')
  try {
    await handle.chmod(0o600)
    await handle.sync()
  } finally {
    await handle.close()
  }
  await rename(unfinished, copyOf(file))
  await syncDirectory(dirname(file))
}

/**
 * Puts the copy back if there is one: after a failed migration, or at the start after a process that died in one. Nobody
 * may have the file open. @returns whether there was a copy
 */
export async function putCopyBack(file: string): Promise<boolean> {
  const handle = await open(copyOf(file), 'r').catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return null
    throw error
  })
  if (!handle) return false
  await handle.close()
  for (const suffix of ['-wal', '-shm', '-journal']) await rm(file + suffix, { force: true })
  await rename(copyOf(file), file)
  await syncDirectory(dirname(file))
  return true
}

/** The migration held; its start is not needed any more. */
export async function dropCopy(file: string): Promise<void> {
  await rm(copyOf(file))
  await syncDirectory(dirname(file))
}
