import { join } from 'node:path'
import { migrate } from 'drizzle-orm/better-sqlite3/migrator'
import type { Db } from './client'

/** Brings the schema up to date; does nothing when it is. */
export function migrateDb(db: Db): void {
  migrate(db, { migrationsFolder: join(import.meta.dirname, 'migrations') })
}
