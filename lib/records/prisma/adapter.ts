import { PrismaBetterSqlite3 } from '@prisma/adapter-better-sqlite3'
import type { SqlDriverAdapter, SqlMigrationAwareDriverAdapterFactory } from '@prisma/driver-adapter-utils'
import { oneAtATime, takeTurns } from './turns'

/** The records file cannot be served; the message says what to do. */
export class RecordsUnusable extends Error {
  constructor(reason: string, cause?: unknown) {
    super(reason, { cause })
    this.name = 'RecordsUnusable'
  }
}

/**
 * Connections to the records file that sync every commit (write path, rule 6) and keep each transaction to itself. The
 * driver falls to synchronous=NORMAL when WAL is set, so FULL is set after it, on every connection, and read back.
 */
export function recordsAdapter(file: string): SqlMigrationAwareDriverAdapterFactory {
  const factory = new PrismaBetterSqlite3({ url: `file:${file}` })
  return {
    provider: factory.provider,
    adapterName: factory.adapterName,
    async connect() {
      const connection = await factory.connect()
      try {
        await connection.executeScript(
          `PRAGMA busy_timeout = 5000; PRAGMA journal_mode = WAL; PRAGMA synchronous = FULL; PRAGMA fullfsync = 1;
           PRAGMA checkpoint_fullfsync = 1; PRAGMA foreign_keys = ON`,
        )
        await requireSettings((name) => readPragma(connection, name))
        return takeTurns(connection, oneAtATime())
      } catch (cause) {
        await connection.dispose()
        throw cause
      }
    },
    connectToShadowDb: async () => runningScripts(await factory.connectToShadowDb()),
  }
}

/** The schema engine sends a shadow database whole scripts as one statement, which the driver would refuse. */
function runningScripts(shadow: SqlDriverAdapter): SqlDriverAdapter {
  return {
    ...takeTurns(shadow, oneAtATime()),
    async executeRaw(query) {
      if (query.args.length > 0) return shadow.executeRaw(query)
      await shadow.executeScript(query.sql)
      return 0
    },
  }
}

/**
 * @param read answers a pragma's value on the connection in question
 * @throws RecordsUnusable where the connection does not sync or does not check foreign keys
 */
export async function requireSettings(read: (name: string) => Promise<unknown>): Promise<void> {
  const wanted = { journal_mode: 'wal', synchronous: '2', foreign_keys: '1' }
  for (const [name, value] of Object.entries(wanted)) {
    const found = String(await read(name))
    if (found !== value)
      throw new RecordsUnusable(
        `The records file keeps ${name}=${found} where ${value} is needed; put the data directory on a local disk.`,
      )
  }
}

async function readPragma(connection: SqlDriverAdapter, name: string): Promise<unknown> {
  const { rows } = await connection.queryRaw({ sql: `PRAGMA ${name}`, args: [], argTypes: [] })
  return rows[0]?.[0]
}
