import { z } from 'zod'
import { NAMED_ROLES } from '@/lib/checks/vocabulary'

const place = z.number().int().min(0)

/** Columns of a results table that a person named, each once. */
export const namedColumnsSchema = z
  .array(z.object({ sheet: place, row: place, column: place, role: z.enum(NAMED_ROLES) }))
  .max(1000)
  .refine(
    (columns) => new Set(columns.map((c) => `${c.sheet}:${c.row}:${c.column}`)).size === columns.length,
    'A column can have one role only.',
  )
export type NamedColumns = z.infer<typeof namedColumnsSchema>

const stored = z.object({ version: z.literal(1), columns: namedColumnsSchema })

export const storeNamedColumns = (columns: NamedColumns): z.infer<typeof stored> => ({ version: 1, columns })

/** What is stored beside a file; null there means that nobody named a column. */
export function parseNamedColumns(value: unknown): NamedColumns {
  return value === null ? [] : stored.parse(value).columns
}
