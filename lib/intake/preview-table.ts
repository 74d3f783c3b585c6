import type { ReadTable } from '@/lib/checks/types'
import { refuse } from '@/lib/rules/refusal'
import { readTableFile } from './table/read-table'

/** `cut`: a sheet has more rows than are here. */
export type TablePreview = { table: ReadTable; cut: boolean }

const mostBytes = 8 * 1024 * 1024
const mostRows = 1000
const mostCells = 60_000

/**
 * The first rows of each sheet of a results table, as much as a browser can show. Unlike an audit it is read in the
 * web process, so a file that would hold that up is refused as `too-large`.
 */
export async function previewTable(file: {
  path: string
  name: string
  bytes: number
}): Promise<TablePreview> {
  if (file.bytes > mostBytes) throw refuse('too-large', tooLarge)
  const table = await readTableFile(file.path, file.name, mostRows + 1)
  let cells = 0
  let cut = false
  const sheets = table.sheets.map((sheet) => {
    const rows = sheet.rows.slice(0, mostRows).filter((row) => (cells += row.length) <= mostCells)
    cut ||= rows.length < sheet.rows.length
    return { ...sheet, rows }
  })
  return { table: { ...table, sheets }, cut }
}

const tooLarge = 'This results table is too large to be shown here. The audit reads all of it.'
