import { mkdirSync } from 'node:fs'
import { dirname } from 'node:path'
import Database from 'better-sqlite3'
import { drizzle } from 'drizzle-orm/better-sqlite3'
import * as schema from './schema'

export type Db = ReturnType<typeof openDb>

/** Opens the database file (or ':memory:') with write-ahead log, foreign keys on and a busy timeout of 10 s. */
export function openDb(path: string) {
  if (path !== ':memory:') mkdirSync(dirname(path), { recursive: true })
  const sqlite = new Database(path)
  sqlite.pragma('journal_mode = WAL')
  sqlite.pragma('synchronous = NORMAL')
  sqlite.pragma('foreign_keys = ON')
  sqlite.pragma('busy_timeout = 10000')
  return drizzle(sqlite, { schema })
}

/**
 * Runs `work` in one immediate transaction. The type refuses a promise: an asynchronous callback would commit
 * before its work is done.
 */
export function transact<T>(db: Db, work: (tx: Tx) => T extends PromiseLike<unknown> ? never : T): T {
  return db.transaction((tx) => work(tx), { behavior: 'immediate' })
}

export type Tx = Parameters<Parameters<Db['transaction']>[0]>[0]

/** What a read accepts: the database or a transaction on it. */
export type Reader = Db | Tx
