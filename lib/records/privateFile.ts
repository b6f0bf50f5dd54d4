import { open } from 'node:fs/promises'
import { dirname } from 'node:path'

/**
 * Makes an empty file that only its owner may read, if it is not there, and syncs its directory. SQLite gives its -wal and
 * -shm files the same mode. An existing file is set to the same mode.
 */
export async function makePrivateFile(file: string): Promise<void> {
  const handle = await open(file, 'a', 0o600)
  try {
    await handle.chmod(0o600)
    await handle.sync()
  } finally {
    await handle.close()
  }
  await syncDirectory(dirname(file))
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
