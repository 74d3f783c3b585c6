import type { Report } from '@/lib/checks/types'

/** The value as the manuscript prints it, for cells of a table: '= 0.030' without the sign of equality. */
export function printedP(report: Pick<Report, 'relation' | 'value' | 'decimals'>): string {
  const value = report.value.toFixed(report.decimals)
  return report.relation === '=' ? value : `${signs[report.relation]} ${value}`
}

const signs = { '<': '<', '<=': '≤', '>': '>', '>=': '≥' } as const

/** A recomputed p-value: one digit more than printed, four where that would show as zero, '< 0.0001' below. */
export function recomputedP(value: number, printedDecimals: number): string {
  if (Number.isNaN(value)) return '–'
  if (value >= 1) return '1'
  if (value > 0.9999 && printedDecimals < 4) return '1'
  if (value < 0.0001) return '< 0.0001'
  const text = value.toFixed(Math.min(6, printedDecimals + 1))
  return Number(text) === 0 ? value.toFixed(4) : text
}

/** A recomputed interval; one value where both ends show the same. */
export function recomputedInterval(interval: readonly [low: number, high: number], decimals: number): string {
  const low = recomputedP(interval[0], decimals)
  const high = recomputedP(interval[1], decimals)
  return low === high ? low : `${low} – ${high}`
}
