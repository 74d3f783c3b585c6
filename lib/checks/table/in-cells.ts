import { printedInterval } from '../numbers/printed-interval'
import { fold } from '../extract/grammar/fold'
import { findPValues } from '../extract/grammar/p-value'
import { findStatistics } from '../extract/grammar/statistic'
import { boundP } from '../extract/reports'
import { splitPair } from '../extract/grammar/comparison'
import type { Grid, Part } from './grid'

/** p-values and statistics written out within cells, 't(28) = 2.05, p = .03', '0.82 (P = 0.01)', where no column was read. */
export function readInCells(grid: Grid, read: Part): Part {
  const part: Part = { reports: [], statistics: [] }
  const taken = new Set(read.reports.map(({ cell }) => `${cell?.row}:${cell?.column}`))
  for (const row of grid.rows)
    row.cells.forEach((cell, c) => {
      if (taken.has(`${row.index}:${c}`) || !/[pPtFzχr]/.test(cell)) return
      const text = fold(cell)
      const place = {
        source: grid.source,
        page: grid.page,
        row: row.number,
        sheet: grid.sheet,
        quote: cell.replace(/\s+/g, ' ').trim(),
        boxes: row.boxes[c] ?? [],
      }
      const sentence = row.cells.join(' | ')
      const ps = findPValues(text).filter(({ markOnly }) => !markOnly)
      const statistics = findStatistics(text).filter(({ certain }) => certain || ps.length > 0)
      const first = row.cells.find((other) => /[A-Za-z]{2,}/.test(other)) ?? null
      const pair = first && first !== cell ? splitPair(fold(first)) : null
      const idOf = (kind: string, i: number) => `${grid.key}-${row.index}-${c}-in-${kind}${i}`
      ps.forEach((p, i) => {
        part.reports.push({
          id: idOf('p', i),
          place,
          relation: p.relation,
          value: p.value,
          decimals: p.decimals,
          ...printedInterval(p.value, p.decimals, p.relation),
          scale: p.scale,
          statistic: statistics[i] ? idOf('s', i) : null,
          comparison: pair && /\s(?:vs?\.?|versus|-|–)\s/i.test(first ?? '') ? pair : null,
          called: null,
          family: null,
          offset: grid.offset,
          section: grid.section,
          heading: grid.caption,
          table: grid.table,
          cell: { row: row.index, column: c },
          sentence,
          outcome: first === cell ? null : first,
          role: /baseline|demographic|characteristics/i.test(grid.caption) ? 'baseline' : 'comparison',
          oneSided: p.oneSided,
          markOnly: false,
        })
      })
      statistics.forEach((statistic, i) => {
        const bounds = boundP(statistic)
        const { test, df, value, decimals } = statistic
        part.statistics.push({
          id: idOf('s', i),
          place,
          test,
          df,
          value,
          decimals,
          pLow: bounds?.[0] ?? null,
          pHigh: bounds?.[1] ?? null,
          report: ps[i] ? idOf('p', i) : null,
          offset: grid.offset,
          table: grid.table,
          sentence,
        })
      })
    })
  return part
}
