/**
 * Prints how long each procedure takes for 10^3 … 10^6 p-values: wall time, median of 5, beside R's p.adjust on the same
 * values where Rscript is installed and R has the procedure. Small vectors are adjusted many times in a row on both sides.
 */
import { spawnSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { median } from 'simple-statistics'
import {
  adjust,
  CATALOGUE,
  procedureTable,
  type AdjustOptions,
  type CatalogueProcedure,
} from '../../lib/checks'
import { createRandom } from './random'

const SIZES = [1e3, 1e4, 1e5, 1e6]
const ROUNDS = 5
const R_METHODS: Partial<Record<CatalogueProcedure, string>> = {
  bonferroni: 'bonferroni',
  holm: 'holm',
  hochberg: 'hochberg',
  hommel: 'hommel',
  bh: 'BH',
  by: 'BY',
}
/** R's hommel takes n² steps. */
const MOST_FOR_HOMMEL_IN_R = 1e4

/** All but the graphical procedure, which takes n³ steps and is meant for tens of hypotheses. */
const TIMED = CATALOGUE.filter((procedure) => {
  const { adjust: ofSet, adjustInOrder } = procedureTable[procedure]
  return procedure !== 'graphical' && (ofSet !== null || adjustInOrder !== null)
})

/** A tenth of them small. */
function drawPValues(count: number): number[] {
  const next = createRandom(20240611)
  return Array.from({ length: count }, () => (next() < 0.1 ? next() ** 6 : next()))
}

/** The fewest groups with at least as many pairs. */
const groupsFor = (pairs: number) => Math.ceil((1 + Math.sqrt(1 + 8 * pairs)) / 2)

const repeatsFor = (count: number) => Math.max(1, Math.round(2e5 / count))

function timeOurs(procedure: CatalogueProcedure, p: readonly number[]): number {
  const options: AdjustOptions = procedure === 'shaffer' ? { groups: groupsFor(p.length) } : {}
  const repeats = repeatsFor(p.length)
  const run = () => {
    const start = performance.now()
    for (let i = 0; i < repeats; i++) adjust(procedure, p, options)
    return (performance.now() - start) / repeats
  }
  run()
  return median(Array.from({ length: ROUNDS }, run))
}

/** Median milliseconds by R's name of the method; empty where Rscript is missing. */
function timeInR(p: readonly number[], folder: string): Map<string, number> {
  const file = join(folder, `p-${p.length}.bin`)
  writeFileSync(file, new Uint8Array(Float64Array.from(p).buffer))
  const methods = Object.values(R_METHODS).filter(
    (method) => method !== 'hommel' || p.length <= MOST_FOR_HOMMEL_IN_R,
  )
  const script = `
    p <- readBin("${file}", "double", ${p.length})
    for (method in c(${methods.map((method) => `"${method}"`).join(', ')})) {
      repeats <- if (method == "hommel") 1 else ${repeatsFor(p.length)}
      run <- function() system.time(for (i in seq_len(repeats)) p.adjust(p, method))[["elapsed"]] / repeats
      if (method != "hommel") run()
      cat(method, 1000 * median(replicate(if (method == "hommel" && length(p) > 1000) 1 else ${ROUNDS}, run())), "\\n")
    }`
  const { status, stdout } = spawnSync('Rscript', ['--vanilla', '-e', script], { encoding: 'utf8' })
  if (status !== 0) return new Map()
  const rows = stdout.trim().split('\n')
  return new Map(
    rows.map((row): [string, number] => {
      const [method = '', ms] = row.split(' ')
      return [method, Number(ms)]
    }),
  )
}

const show = (ms: number | undefined) =>
  (ms === undefined ? '–' : ms >= 10 ? ms.toFixed(0) : ms.toPrecision(2)).padStart(8)

const folder = mkdtempSync(join(tmpdir(), 'assize-bench-'))
try {
  const vectors = SIZES.map((size) => {
    const p = drawPValues(size)
    return { p, inR: timeInR(p, folder) }
  })
  console.log(`milliseconds, median of ${ROUNDS}: ours, R`)
  console.log('procedure'.padEnd(20), ...SIZES.map((size) => `${size}`.padStart(17)))
  for (const procedure of TIMED) {
    const method = R_METHODS[procedure]
    const cells = vectors.map(
      ({ p, inR }) =>
        `${show(timeOurs(procedure, p))} ${show(method === undefined ? undefined : inR.get(method))}`,
    )
    console.log(procedure.padEnd(20), ...cells)
  }
} finally {
  rmSync(folder, { recursive: true, force: true })
}
