import { pBounds } from '../numbers/p-bounds'
import { printedInterval, roundingInterval } from '../numbers/printed-interval'
import { isNotSignificantMark, readLegend, readNumber } from './cell'
import type { Grid, Part } from './grid'

/** A coefficient in a matrix: '.45**', '−0.12', '0.31*'; '1' and dashes on the diagonal. */
const COEFFICIENT = /^[-−–+]?\s?(?:0|1)?[.,]\d{1,3}\s?\^?\{?[*†‡]{0,4}\}?$/

/**
 * A matrix of correlations: coefficients between the variable of the row and that of the column. Each coefficient
 * is a statistic (df from 'N = …' in caption or notes); each starred one also a report with the star's bound.
 * Null where the table is no such matrix.
 */
export function readCorrelations(grid: Grid): Part | null {
  if (!/correlat/i.test(`${grid.caption} ${grid.notes}`)) return null
  const cells = grid.rows.flatMap((row) => row.cells.slice(1).filter((cell) => cell.trim() !== ''))
  const coefficients = cells.filter((cell) => COEFFICIENT.test(cell.trim()))
  const starred = coefficients.filter((cell) => /[*†‡]/.test(cell))
  if (coefficients.length < 3 || coefficients.length < 0.5 * cells.length) return null
  // columns of r and p side by side are an ordinary table
  if (grid.headers.some((header) => /^(?:p|P|q|sig\.?|p[\s-]?values?)$/i.test(header.trim()))) return null
  if (starred.length === 0 && grid.rows.length < 3) return null
  const around = `${grid.caption} ${grid.notes}`
  const legend = readLegend(around)
  const n = /\b[nN]\s?=\s?(\d+)/.exec(around)?.[1]
  const df = n ? [Number(n) - 2] : []
  const part: Part = { reports: [], statistics: [] }
  const spearman = /spearman|kendall/i.test(around)
  for (const row of grid.rows) {
    const variable = (row.cells[0] ?? '').replace(/^\d+\.?\s*/, '').trim()
    row.cells.forEach((cell, c) => {
      const number = c > 0 && COEFFICIENT.test(cell.trim()) ? readNumber(cell) : null
      if (!number || Math.abs(number.value) >= 1) return
      const other = nameOf(grid, c)
      const id = `${grid.key}-${row.index}-${c}`
      const { low, high } = roundingInterval(number.value, number.decimals)
      const bounds = !spearman && df[0] !== undefined && df[0] > 0 ? pBounds('r', low, high, df) : null
      const bound =
        isNotSignificantMark(number.mark) || number.mark === '' ? undefined : legend.get(number.mark)
      const place = {
        source: grid.source,
        page: grid.page,
        row: row.number,
        sheet: grid.sheet,
        quote: cell.trim(),
        boxes: row.boxes[c] ?? [],
      }
      const sentence = row.cells.join(' | ')
      part.statistics.push({
        id: `${id}-s`,
        place,
        test: spearman ? 'other' : 'r',
        df: spearman ? [] : df,
        value: number.value,
        decimals: number.decimals,
        pLow: bounds?.low ?? null,
        pHigh: bounds?.high ?? null,
        report: bound ? `${id}-p` : null,
        offset: grid.offset,
        table: grid.table,
        sentence,
      })
      if (!bound) return
      part.reports.push({
        id: `${id}-p`,
        place,
        ...bound,
        ...printedInterval(bound.value, bound.decimals, bound.relation),
        scale: 'unknown',
        statistic: `${id}-s`,
        comparison: null,
        called: 'significant',
        family: null,
        offset: grid.offset,
        section: grid.section,
        heading: grid.caption,
        table: grid.table,
        cell: { row: row.index, column: c },
        sentence,
        outcome: `${variable} × ${other}`,
        role: 'other',
        oneSided: false,
        markOnly: true,
      })
    })
  }
  return part
}

/** The variable of a column: its head, or the row whose number the head repeats ('1', '2', …). */
function nameOf(grid: Grid, column: number): string {
  const head = (grid.headers[column] ?? '').trim()
  const row = /^\d+\.?$/.test(head) ? grid.rows[Number(head.replace('.', '')) - 1] : undefined
  return row ? (row.cells[0] ?? head).replace(/^\d+\.?\s*/, '').trim() : head
}
