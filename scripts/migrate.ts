import { openDb } from '@/db/client'
import { migrateDb } from '@/db/migrate'
import { getSettings } from '@/lib/settings'

const db = openDb(getSettings().database)
migrateDb(db)
db.$client.close()
