import type { Report } from '@/lib/checks/types'
import { formatComputed } from '../ui/format-value'

type Printed = Pick<Report, 'relation' | 'value' | 'decimals' | 'place'>

/** The value as the manuscript prints it, taken from its quote: '.008', '0,030', '< 0.001'. */
export function printedP({ relation, value, decimals, place }: Printed): string {
  // numbers within 'P = 0.246', 'p < .001', '3,1e-05'
  const tokens = place.quote.match(/\d*[.,]?\d+(?:[eE][-−+]?\d+)?/g) ?? []
  const token = tokens.find((one) => Number(one.replace(',', '.').replace('−', '-')) === value)
  const text = token ?? (decimals > 12 ? value.toExponential() : value.toFixed(decimals))
  return relation === '=' ? text : `${signs[relation]} ${text}`
}

const signs = { '<': '<', '<=': '≤', '>': '>', '>=': '≥' } as const

/** A recomputed p-value: one digit more than printed, four where that would show as zero, '< 0.0001' below. */
export function recomputedP(value: number, printedDecimals: number): string {
  if (value >= 0 && value < 0.0001) return '< 0.0001'
  const text = formatComputed(value, printedDecimals + 1)
  if (text.startsWith('<')) return formatComputed(value, 4)
  return Number(text) === 1 ? '1' : text
}

/** A recomputed interval; one value where both ends show the same. */
export function recomputedInterval(interval: readonly [low: number, high: number], decimals: number): string {
  const low = recomputedP(interval[0], decimals)
  const high = recomputedP(interval[1], decimals)
  return low === high ? low : `${low} – ${high}`
}
