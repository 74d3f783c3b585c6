import { customType, integer, text } from 'drizzle-orm/sqlite-core'

/** Prefixed text id, made by `newId`. */
export const id = () => text('id').primaryKey()

/** Integer milliseconds since the epoch, UTC. */
export const at = (name: string) => integer(name)

/** JSON that is never searched. Parsed by a zod schema where it is read. */
export const json = customType<{ data: unknown; driverData: string }>({
  dataType: () => 'text',
  toDriver: (value) => JSON.stringify(value),
  fromDriver: (value): unknown => JSON.parse(value),
})
