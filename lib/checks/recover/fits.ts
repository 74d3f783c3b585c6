import type { Interval } from '../numbers/printed-interval'
import { adjustBounds } from '../procedures/adjust-bounds'
import type { Fit } from '../types'
import type { Procedure } from '../vocabulary'
import { meet } from './intervals'

/** The procedures that are tried: each can be computed from p-values at any m. */
export const RECOVERABLE = [
  'bonferroni',
  'sidak',
  'holm',
  'holm-sidak',
  'hochberg',
  'hommel',
  'bh',
  'by',
] as const satisfies readonly Procedure[]

/** Tried only on request: they depend on a level or an estimate, and reproduce much by chance in small families. */
const ADAPTIVE = ['bky', 'storey'] as const satisfies readonly Procedure[]

/** `mMax`: largest family size tried, default 60; `adaptive`: try two-stage and Storey too; `alpha`: their level. */
export type FitOptions = { mMax?: number; adaptive?: boolean; alpha?: number }

/**
 * Which procedures, at which family size m, reproduce printed adjusted p-values from raw ones: all for which the
 * bounds of every adjusted value over the raw intervals meet the printed interval, item by item. `printed` and `raw`:
 * closed intervals of the same tests in the same order. m runs from the number of items to `mMax` (members that are
 * not shown act as p = 1); 'raw' stands for no adjustment, with m the number of items. Items with NaN on either side
 * are left out. Sorted by the order of RECOVERABLE after 'raw', then by m. An empty answer means that nothing
 * fits; several answers are all equally consistent with the print.
 * Throws RangeError where the two differ in length and where a raw interval is no interval within [0, 1].
 */
export function fits(
  printed: readonly Interval[],
  raw: readonly Interval[],
  options: FitOptions = {},
): Fit[] {
  if (printed.length !== raw.length) throw new RangeError('printed and raw values differ in number')
  const { mMax = 60, adaptive = false, alpha = 0.05 } = options
  const known = printed.flatMap((print, i) => {
    const given = raw[i]
    return given === undefined || isUnknown(print) || isUnknown(given) ? [] : [{ print, raw: given }]
  })
  if (known.length === 0) return []

  const low = known.map((item) => item.raw.low)
  const high = known.map((item) => item.raw.high)
  const found: Fit[] = []
  if (known.every((item) => meet(item.print, item.raw))) found.push({ procedure: 'raw', m: known.length })
  for (const procedure of [...RECOVERABLE, ...(adaptive ? ADAPTIVE : [])]) {
    for (let m = known.length; m <= Math.max(mMax, known.length); m++) {
      const bounds = adjustBounds(procedure, low, high, { m, alpha })
      const all = known.every(({ print }, i) =>
        meet(print, { low: bounds.low[i] ?? NaN, high: bounds.high[i] ?? NaN }),
      )
      if (all) found.push({ procedure, m })
    }
  }
  return found
}

const isUnknown = ({ low, high }: Interval) => Number.isNaN(low) || Number.isNaN(high)
