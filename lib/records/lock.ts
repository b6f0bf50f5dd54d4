import { chmod, readFile, rm, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import sqlite3 from 'sqlite3'
import { openFile } from './journal/connection'

/** Another process, or another store of this one, has the data directory open. */
export class DirectoryInUse extends Error {
  constructor(directory: string, process: string) {
    super(
      `The data directory ${directory} is in use by process ${process}; stop it first, or choose another directory with HALFBAUD_DATA.`,
    )
    this.name = 'DirectoryInUse'
  }
}

/**
 * Takes the directory for this process. The lock is an exclusive transaction on an empty SQLite file: the operating system
 * drops it when the process ends, however it ends, so that a kill leaves nothing to clean and no process id to misread.
 * Nobody may open and close the file 'lock' by other means in this process: that too would drop it.
 * @throws DirectoryInUse
 */
export async function lockDirectory(directory: string): Promise<{ release(): Promise<void> }> {
  const holder = join(directory, 'lock.pid')
  const file = join(directory, 'lock')
  const lock = await openFile(file, sqlite3.OPEN_READWRITE | sqlite3.OPEN_CREATE)
  try {
    await lock.exec('PRAGMA journal_mode = MEMORY; BEGIN EXCLUSIVE')
  } catch (error) {
    await lock.close()
    if ((error as { code?: string }).code !== 'SQLITE_BUSY') throw error
    throw new DirectoryInUse(directory, await readFile(holder, 'utf8').catch(() => 'unknown'))
  }
  await chmod(file, 0o600)
  await writeFile(holder, String(process.pid), { mode: 0o600 })
  return {
    async release() {
      await rm(holder, { force: true })
      await lock.close()
    },
  }
}
