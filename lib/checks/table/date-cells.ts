import type { ReadCell, TableRemark } from '../types'
import type { ColumnRole } from './roles'

/** 'Feb-38', '2-Mar', '02. Mrz', 'Mar 02', '2-Mar-24', 'Mrz 38'. */
const MONTH =
  /^(?:\d{1,2}[-.\s]\s?)?(?:jan|feb|m[aä]r|mrz|apr|ma[iy]|jun|jul|aug|sep|sept|o[ck]t|nov|de[cz])\.?(?:[-\s]\d{1,4})?$/i
/** '2024-03-02', '2024-03-02 00:00:00', '02.03.2024', '3/2/2024'. */
const DAY = /^(?:\d{4}-\d{2}-\d{2}(?:[T\s]00:00(?::00)?)?|\d{1,2}[./]\d{1,2}[./]\d{4})$/

/** Whether a spreadsheet took what was typed into this cell for a date. */
export const isDateCell = ({ text, date }: ReadCell): boolean => {
  const trimmed = text.trim()
  return date === true || (MONTH.test(trimmed) && /\d/.test(trimmed)) || DAY.test(trimmed)
}

const NUMERIC = new Set<ColumnRole['kind']>(['p', 'statistic', 'df', 'n', 'mean', 'sd', 'se', 'estimate'])
const NAMES = new Set<ColumnRole['kind']>(['comparison', 'group', 'group2', 'outcome', 'label', 'other'])

type DatedColumn = {
  header: string
  role: ColumnRole
  cells: readonly { cell: ReadCell; number: number | null }[]
}

/**
 * A remark on the cells of a column that are dates where a number or a name is due: a spreadsheet makes a date of '2/38'
 * and of '1-2'. Which one it was is not guessed. A column of nothing but dates without a role is taken for one of dates.
 */
export function remarkOnDates(
  { header, role, cells }: DatedColumn,
  sheet: string | null,
): TableRemark | null {
  const filled = cells.filter(({ cell }) => cell.text.trim() !== '')
  const dated = filled.filter(({ cell }) => isDateCell(cell))
  const [first, ...more] = dated
  if (!first) return null
  const suspect =
    NUMERIC.has(role.kind) ||
    role.kind === 'comparison' ||
    (NAMES.has(role.kind) &&
      dated.length < filled.length &&
      !/date|day|week|month|year|time|when|visit|sampl/i.test(header))
  if (!suspect) return null
  const text = first.cell.text.trim()
  const column = header === '' ? '' : ` in the column "${header}"`
  const others = more.length === 0 ? '' : ` So are ${more.length} more in this column.`
  return {
    place: {
      source: 'results-table',
      page: null,
      row: first.number,
      sheet,
      quote: text,
      boxes: [],
    },
    says: `The cell "${text}"${column} of the results table is a date. A spreadsheet makes dates of fractions, pairs and short names such as 2/38 or 1-2; what it was is not guessed, and it was not read.${others}`,
    asks: `Please give the values of the cells${column} that a spreadsheet turned into dates as text.`,
  }
}
