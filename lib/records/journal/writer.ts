import type { Connection, SqlValue } from './connection'
import { JournalRefused, JournalWriteFailed } from './errors'

/**
 * The one connection that writes. Each write is one statement and so one transaction; they run one after the other, so
 * that nothing can come to stand inside somebody else's commit.
 */
export class Writer {
  private last: Promise<unknown> = Promise.resolve()

  constructor(private readonly connection: Connection) {}

  /**
   * Synced to disk when it resolves; nothing stored when it rejects.
   * @throws JournalRefused where a trigger or a key refuses, JournalWriteFailed where the disk or the driver fails
   */
  write(statement: string, values: readonly SqlValue[]): Promise<void> {
    const written = this.last.then(() => this.connection.run(statement, values)).catch(rethrow)
    this.last = written.catch(() => undefined)
    return written
  }

  async close(): Promise<void> {
    await this.last
    await this.connection.close()
  }
}

function rethrow(cause: Error & { code?: string }): never {
  throw cause.code === 'SQLITE_CONSTRAINT' ? new JournalRefused(cause) : new JournalWriteFailed(cause)
}
