import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { utils, write } from '@e965/xlsx'
import { describeTable } from '@/lib/checks'
import { readResultsTable } from '@/lib/checks/table/results-table'
import { readTableFile } from '@/lib/intake/table/read-table'

// Processor time that a results table of 20,000 rows takes, as CSV and as XLSX: npx tsx scripts/bench/results-table.ts [rows]

const count = Number(process.argv[2] ?? 20_000)
const rows = [
  ['Comparison', 'Outcome', 't', 'df', 'p', 'p adj'],
  ...Array.from({ length: count }, (_, i) => {
    const p = ((i * 7919) % 9973) / 9974
    return [
      `site ${i % 40} vs site ${(i % 40) + 1}`,
      `trait ${i}`,
      2 + (i % 100) / 50,
      22,
      p,
      Math.min(1, 6 * p),
    ]
  }),
]
/** Processor time of this process so far, in milliseconds: what else the machine does does not count. */
function spent(): number {
  return process.cpuUsage().user / 1000
}

const folder = mkdtempSync(join(tmpdir(), 'assize-bench-'))
try {
  const csv = join(folder, 'results.csv')
  writeFileSync(csv, rows.map((row) => row.join(',')).join('\n'))
  const book = utils.book_new()
  utils.book_append_sheet(book, utils.aoa_to_sheet(rows), 'results')
  const xlsx = join(folder, 'results.xlsx')
  writeFileSync(xlsx, write(book, { type: 'buffer', bookType: 'xlsx', compression: true }) as Buffer)
  for (const path of [csv, xlsx]) {
    const start = spent()
    const table = await readTableFile(path)
    const opened = spent()
    const { reports } = readResultsTable(table, 0.05)
    const read = spent()
    describeTable(table, { alpha: 0.05 })
    const described = spent()
    const ms = [opened - start, read - opened, described - read].map((time) => `${Math.round(time)} ms`)
    console.log(
      `${path.split('.').pop()}: ${reports.length} p-values; file ${ms[0]}, numbers ${ms[1]}, description ${ms[2]}`,
    )
  }
} finally {
  rmSync(folder, { recursive: true, force: true })
}
