import { sql, type SQL } from 'drizzle-orm'
import type { AnySQLiteColumn } from 'drizzle-orm/sqlite-core'

/** True where the text occurs in the column, in either case (for ASCII letters); % and _ mean themselves. */
export function contains(column: AnySQLiteColumn, text: string): SQL {
  const pattern = `%${text.trim().replace(/[\\%_]/g, '\\$&')}%`
  return sql`${column} like ${pattern} escape '\\'`
}
