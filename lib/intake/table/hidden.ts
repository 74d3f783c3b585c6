import { utils, type WorkSheet } from '@e965/xlsx'
import type { ReadRemark, ReadSheet } from '@/lib/checks/types'

/** Says which rows and columns of a sheet that hold anything are hidden, or that the sheet itself is. */
export function remarkOnHidden(
  { name, rows }: ReadSheet,
  sheet: WorkSheet | undefined,
  sheetHidden: boolean,
): ReadRemark[] {
  const hiddenRows = rows.flatMap((row, r) =>
    sheet?.['!rows']?.[r]?.hidden && row.some(({ text }) => text !== '') ? [r] : [],
  )
  const hiddenColumns = (sheet?.['!cols'] ?? []).flatMap((column, c) =>
    column?.hidden && rows.some((row) => (row[c]?.text ?? '') !== '') ? [c] : [],
  )
  const parts = [
    hiddenRows.length > 0
      ? `${hiddenRows.length === 1 ? 'row' : 'rows'} ${listRuns(hiddenRows, (r) => String(r + 1))}`
      : '',
    hiddenColumns.length > 0
      ? `${hiddenColumns.length === 1 ? 'column' : 'columns'} ${listRuns(hiddenColumns, utils.encode_col)}`
      : '',
  ].filter((part) => part !== '')
  const filled = rows.some((row) => row.some(({ text }) => text !== ''))
  if (sheetHidden && filled) return [sayHidden(`the sheet "${name ?? ''}"`)]
  return parts.length === 0 ? [] : [sayHidden(`${parts.join(' and ')} of the sheet "${name ?? ''}"`)]
}

function sayHidden(what: string): ReadRemark {
  return {
    says: `Hidden in the results table: ${what}. It was read with the rest; check whether it belongs to the results.`,
    asks: `Please say whether what is hidden in the results table belongs to the results: ${what}.`,
  }
}

/** '3–5, 9' of 0-based places. */
function listRuns(places: readonly number[], name: (place: number) => string): string {
  const runs: [number, number][] = []
  for (const place of places) {
    const last = runs[runs.length - 1]
    if (last && last[1] === place - 1) last[1] = place
    else runs.push([place, place])
  }
  return runs.map(([from, to]) => (from === to ? name(from) : `${name(from)}–${name(to)}`)).join(', ')
}
