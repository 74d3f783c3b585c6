import { openDb, type Db } from '@/db/client'
import { migrateDb } from '@/db/migrate'

/** An empty database in memory with the real migrations. */
export function makeDb(): Db {
  const db = openDb(':memory:')
  migrateDb(db)
  return db
}
