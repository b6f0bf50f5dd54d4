import { chmod, open } from 'node:fs/promises'
import { dirname } from 'node:path'

/**
 * Makes an empty file that only its owner may read, or sets an existing one to that mode. SQLite gives its -wal and -shm
 * files the same mode. An existing file is not opened: closing it would drop the locks that this process holds on it.
 */
export async function makePrivateFile(file: string): Promise<void> {
  try {
    const handle = await open(file, 'wx', 0o600)
    try {
      await handle.sync()
    } finally {
      await handle.close()
    }
    await syncDirectory(dirname(file))
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error
    await chmod(file, 0o600)
  }
}

/** Makes renames and new names in the directory last through a power cut. */
export async function syncDirectory(directory: string): Promise<void> {
  // Windows cannot open a directory for syncing, and keeps names by itself.
  if (process.platform === 'win32') return
  const handle = await open(directory, 'r')
  try {
    await handle.sync()
  } finally {
    await handle.close()
  }
}
