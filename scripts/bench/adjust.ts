/** Prints how much processor time each procedure takes for 10^3 … 10^6 p-values, beside R's p.adjust where Rscript is installed. */
import { spawnSync } from 'node:child_process'
import { median } from 'simple-statistics'
import { adjust, PROCEDURES, procedureTable, type Procedure } from '../../lib/checks'

const SIZES = [1e3, 1e4, 1e5, 1e6]
const ROUNDS = 5
const R_METHODS: Partial<Record<Procedure, string>> = {
  bonferroni: 'bonferroni',
  holm: 'holm',
  hochberg: 'hochberg',
  hommel: 'hommel',
  bh: 'BH',
  by: 'BY',
}

/** The same p-values in every run: a linear congruential generator, a tenth of them small. */
function drawPValues(count: number): number[] {
  let state = 20240611
  const next = () => (state = (state * 1664525 + 1013904223) % 4294967296) / 4294967296
  return Array.from({ length: count }, () => (next() < 0.1 ? next() ** 6 : next()))
}

function timeOurs(procedure: Procedure, p: readonly number[]): number {
  const times = Array.from({ length: ROUNDS }, () => {
    const start = process.cpuUsage()
    adjust(procedure, p)
    return process.cpuUsage(start).user / 1000
  })
  return median(times)
}

/** Median milliseconds in R, null where Rscript is missing. Hommel in R takes n² steps: from 10^5 it is left out. */
function timeInR(method: string | undefined, count: number): number | null {
  if (method === undefined || (method === 'hommel' && count > 1e4)) return null
  const script = `set.seed(1); p <- runif(${count}); cat(median(replicate(${ROUNDS}, system.time(p.adjust(p, "${method}"))[[1]])) * 1000)`
  const { status, stdout } = spawnSync('Rscript', ['-e', script], { encoding: 'utf8' })
  return status === 0 ? Number(stdout) : null
}

const show = (ms: number | null) => (ms === null ? '–' : ms.toFixed(1)).padStart(9)

console.log(`median milliseconds of processor time of ${ROUNDS} runs: ours, R`)
console.log('procedure'.padEnd(12), ...SIZES.map((size) => `${size}`.padStart(19)))
const vectors = SIZES.map(drawPValues)
for (const procedure of PROCEDURES.filter((name) => procedureTable[name].adjust !== null)) {
  const cells = vectors.map(
    (p) => show(timeOurs(procedure, p)) + ' ' + show(timeInR(R_METHODS[procedure], p.length)),
  )
  console.log(procedure.padEnd(12), ...cells)
}
