import { refuse } from '@/lib/rules/refusal'
import { decodeText, guessDelimiter } from '../table/delimited'
import { checkWorkbook } from './check-workbook'
import { nameText, plainText, readHead, sayInstead, sayWhatItIs } from './what-it-is'

const sampleBytes = 1024 * 1024

/** Refuses what is neither an XLSX workbook nor text in columns; returns the media type by content. */
export async function checkTable(path: string): Promise<string> {
  const head = await readHead(path, sampleBytes)
  if (head.subarray(0, 2).toString('latin1') === 'PK') return checkWorkbook(path)
  const text = decodeText(head)
  // Only what is no text is asked for its kind by its first bytes: "BMI" begins like a bitmap.
  if (text === null) throw refuse('unreadable', await sayWhatItIs(path, 'table'))
  const what = nameText(text)
  if (what !== plainText) throw refuse('unreadable', sayInstead(what, 'table'))
  const delimiter = guessDelimiter(text)
  // Rows that hold anything.
  const rows = text.split(/\r\n?|\n/).filter((line) => line.trim() !== '')
  if (delimiter === null) throw refuse('unreadable', noColumns)
  if (rows.length < 2) throw refuse('unreadable', noRows)
  return delimiter === '\t' ? 'text/tab-separated-values' : 'text/csv'
}

const noColumns =
  'The results table has no columns: no comma, semicolon or tab separates its values. Please export it as CSV, TSV or XLSX and hand that in.'
const noRows =
  'The results table has no row beneath its header; please export the rows of reported tests and hand that in.'
