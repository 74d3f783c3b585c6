import { procedureTable } from '@/lib/checks/procedures/table'
import type { CatalogueProcedure } from '@/lib/checks/vocabulary'

/** For narrow heads, where the table's label is a clause. */
const SHORT: Partial<Record<CatalogueProcedure, string>> = {
  bky: 'Two-stage BKY',
  'bky-unscaled': 'BKY, α / (1 + α)',
  tsbh: 'Two-stage BH',
}

/** A procedure's name with a capital, for the head of a column. */
export function shortNameOf(procedure: CatalogueProcedure): string {
  return SHORT[procedure] ?? capitalise(procedureTable[procedure].label)
}

export const capitalise = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)
