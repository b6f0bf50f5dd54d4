import type { SqlDriverAdapter, Transaction } from '@prisma/driver-adapter-utils'

/** Waits for its turn; the answer gives the turn back. */
export type Turn = () => Promise<() => void>

export function oneAtATime(): Turn {
  let last: Promise<void> = Promise.resolve()
  return () => {
    let release = () => {}
    const before = last
    last = new Promise((resolve) => {
      release = resolve
    })
    return before.then(() => release)
  }
}

/**
 * One connection serves everybody, and the driver lets a statement of somebody else run inside an open transaction: it is
 * answered, then rolled back with the transaction. So a transaction holds the turn until it has ended, and a single
 * statement takes one for itself. Inside a transaction use its own client only; the outer one would wait for its end.
 */
export function takeTurns(connection: SqlDriverAdapter, turn: Turn): SqlDriverAdapter {
  const alone = async <T>(work: () => Promise<T>): Promise<T> => {
    const release = await turn()
    try {
      return await work()
    } finally {
      release()
    }
  }
  return {
    provider: connection.provider,
    adapterName: connection.adapterName,
    queryRaw: (query) => alone(() => connection.queryRaw(query)),
    executeRaw: (query) => alone(() => connection.executeRaw(query)),
    executeScript: (script) => alone(() => connection.executeScript(script)),
    async startTransaction(isolation) {
      const release = await turn()
      try {
        return releasing(await connection.startTransaction(isolation), release)
      } catch (cause) {
        release()
        throw cause
      }
    },
    dispose: () => alone(() => connection.dispose()),
  }
}

function releasing(transaction: Transaction, release: () => void): Transaction {
  return {
    provider: transaction.provider,
    adapterName: transaction.adapterName,
    options: transaction.options,
    queryRaw: (query) => transaction.queryRaw(query),
    executeRaw: (query) => transaction.executeRaw(query),
    createSavepoint: async (name) => transaction.createSavepoint?.(name),
    rollbackToSavepoint: async (name) => transaction.rollbackToSavepoint?.(name),
    releaseSavepoint: async (name) => transaction.releaseSavepoint?.(name),
    commit: () => transaction.commit().finally(release),
    rollback: () => transaction.rollback().finally(release),
  }
}
