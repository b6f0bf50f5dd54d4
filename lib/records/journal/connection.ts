import sqlite3 from 'sqlite3'
import { JournalUnusable } from './errors'

export type SqlValue = string | number | Uint8Array | null

/** One connection of the asynchronous driver, as promises. Plain values in and out. */
export type Connection = {
  run(sql: string, values?: readonly SqlValue[]): Promise<void>
  all<T>(sql: string, values?: readonly SqlValue[]): Promise<T[]>
  exec(script: string): Promise<void>
  close(): Promise<void>
}

/**
 * Opens a connection and makes it sync every commit: WAL first, synchronous=FULL after it, both read back.
 * fullfsync matters on macOS only, where fsync alone does not reach the disk.
 * @throws JournalUnusable where a setting does not hold
 */
export async function connect(file: string, mode: 'read' | 'write'): Promise<Connection> {
  const connection = await openFile(file, mode === 'write' ? sqlite3.OPEN_READWRITE : sqlite3.OPEN_READONLY)
  try {
    await connection.exec('PRAGMA busy_timeout = 5000')
    await connection.exec('PRAGMA journal_mode = WAL')
    await connection.exec('PRAGMA synchronous = FULL; PRAGMA fullfsync = 1; PRAGMA checkpoint_fullfsync = 1')
    await requireSynced(connection)
    return connection
  } catch (cause) {
    await connection.close()
    throw cause
  }
}

async function requireSynced(connection: Connection): Promise<void> {
  const [mode] = await connection.all<{ journal_mode: string }>('PRAGMA journal_mode')
  const [level] = await connection.all<{ synchronous: number }>('PRAGMA synchronous')
  if (mode?.journal_mode !== 'wal' || level?.synchronous !== 2)
    throw new JournalUnusable(
      `The journal's file does not keep WAL with synchronous=FULL (it answers ${mode?.journal_mode}, ${level?.synchronous}); put the data directory on a local disk.`,
    )
}

/** A bare connection, with the driver's own settings. */
export function openFile(file: string, flags: number): Promise<Connection> {
  return new Promise((resolve, reject) => {
    const database: sqlite3.Database = new sqlite3.Database(file, flags, (error) => {
      if (error) reject(error)
      else resolve(asPromises(database))
    })
  })
}

function asPromises(database: sqlite3.Database): Connection {
  return {
    run: (sql, values = []) =>
      new Promise((resolve, reject) => {
        database.run(sql, values, (error: Error | null) => (error ? reject(error) : resolve()))
      }),
    all: <T>(sql: string, values: readonly SqlValue[] = []) =>
      new Promise<T[]>((resolve, reject) => {
        database.all<T>(sql, values, (error, rows) => (error ? reject(error) : resolve(rows)))
      }),
    exec: (script) =>
      new Promise((resolve, reject) => {
        database.exec(script, (error) => (error ? reject(error) : resolve()))
      }),
    close: () =>
      new Promise((resolve, reject) => {
        database.close((error) => (error ? reject(error) : resolve()))
      }),
  }
}
