import { getSettings } from '@/lib/settings'
import { openDb, type Db } from './client'

const held = globalThis as typeof globalThis & { assizeDb?: Db }

/** The process's one connection, opened on first use (and kept over reloads in development). */
export function getDb(): Db {
  return (held.assizeDb ??= openDb(getSettings().database))
}
