import { createHash } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { basename } from 'node:path'
import { parse } from 'csv-parse/sync'
import type { ReadCell, ReadTable } from '@/lib/checks/types'
import { isRefusal, refuse } from '@/lib/rules/refusal'
import { checkWorkbook } from '../check/check-workbook'
import { decodeText, getDeclaredDelimiter, guessDelimiter, placeHeads } from './delimited'
import { maxCells, maxColumns, maxRows, tooManyRows } from './limits'
import { readWorkbook } from './workbook'

/**
 * Reads CSV, TSV or XLSX by its content. Rejects with a refusal `unreadable` or `too-large`. `firstRows`: as many of
 * each sheet and no more, for a look at it.
 */
export async function readTableFile(
  path: string,
  name = basename(path),
  firstRows?: number,
): Promise<ReadTable> {
  const bytes = await readFile(path)
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  if (bytes[0] !== 0x50 || bytes[1] !== 0x4b) {
    return { file: name, sha256, sheets: [{ name: null, rows: readDelimited(bytes, firstRows) }] }
  }
  await checkWorkbook(path)
  return { file: name, sha256, ...readWorkbook(bytes, firstRows) }
}

function readDelimited(bytes: Buffer, firstRows?: number): ReadCell[][] {
  const decoded = decodeText(bytes)
  if (decoded === null) throw refuse('unreadable', notDelimited)
  const declared = getDeclaredDelimiter(decoded)
  const text = declared === null ? decoded : decoded.slice(declared.length)
  try {
    const rows: string[][] = parse(text, {
      delimiter: declared?.delimiter ?? guessDelimiter(text) ?? ',',
      relax_column_count: true,
      relax_quotes: true,
      skip_empty_lines: false,
      trim: true,
      bom: true,
      to: firstRows ?? maxRows + 1,
    })
    const cells = rows.reduce((sum, row) => sum + Math.min(row.length, maxColumns), 0)
    if (rows.length > maxRows || cells > maxCells) throw refuse('too-large', tooManyRows)
    return placeHeads(rows).map((row) =>
      row.slice(0, maxColumns).map((cell) => ({ text: cell, value: null })),
    )
  } catch (cause) {
    if (isRefusal(cause)) throw cause
    throw Object.assign(refuse('unreadable', notDelimited), { cause })
  }
}

const notDelimited =
  'The results table is not CSV, TSV or XLSX; please export it as one of these and hand that in.'
