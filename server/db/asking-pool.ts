import { AsyncLocalStorage } from 'node:async_hooks'
import type { NodePgDatabase } from 'drizzle-orm/node-postgres'
import pg from 'pg'

const transactions = new AsyncLocalStorage<{ isOpen: boolean }>()

type Taken = (error: Error | undefined, client: pg.PoolClient | undefined, done: (release?: unknown) => void) => void

/**
 * A pool that refuses a second connection to code that runs inside a transaction. On the embedded database, which has one connection, it would
 * wait for itself for ever; on a server the query would quietly run outside the transaction.
 */
export class AskingPool extends pg.Pool {
  override connect(): Promise<pg.PoolClient>
  override connect(callback: Taken): void
  override connect(callback?: Taken): Promise<pg.PoolClient> | void {
    if (transactions.getStore()?.isOpen) {
      const error = new Error(
        'The database was asked from inside a transaction without its tx. Pass tx on to everything that the transaction calls.',
      )
      if (!callback) return Promise.reject(error)
      callback(error, undefined, () => undefined)
      return
    }
    return callback ? super.connect(callback) : super.connect()
  }
}

/** Marks what runs inside the transactions of a database, for the pool to know. */
export function markTransactions<Schema extends Record<string, unknown>>(db: NodePgDatabase<Schema>): NodePgDatabase<Schema> {
  const begin = db.transaction.bind(db)
  db.transaction = (work, config) => {
    const mark = { isOpen: true }
    return begin((tx) => transactions.run(mark, () => work(tx)), config).finally(() => (mark.isOpen = false))
  }
  return db
}
