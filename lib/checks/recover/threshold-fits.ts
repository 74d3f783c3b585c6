import type { Interval } from '../numbers/printed-interval'
import { atLeastOneOf } from '../procedures/sidak'

/** A per-test threshold is alpha / m (Bonferroni) or 1 − (1 − alpha)^(1/m) (Šidák) for every m from `from` to `to`. */
export type ThresholdFit = { procedure: 'bonferroni' | 'sidak'; alpha: number; from: number; to: number }

const SLACK = 1e-15

const THRESHOLDS = {
  bonferroni: (alpha: number, m: number) => alpha / m,
  sidak: (alpha: number, m: number) => atLeastOneOf(1 / m, alpha),
} as const

/**
 * Which family sizes m <= `mMax` (default 1000) lead from an `alpha` of `alphas` to a printed per-test threshold,
 * given as its rounding interval.
 */
export function thresholdFits(
  printed: Interval,
  alphas: readonly number[] = [0.05, 0.01, 0.1],
  mMax: number = 1000,
): ThresholdFit[] {
  const found: ThresholdFit[] = []
  for (const alpha of alphas) {
    for (const procedure of ['bonferroni', 'sidak'] as const) {
      // The threshold falls as m grows: the m that fit are consecutive.
      const sizes: number[] = []
      for (let m = 1; m <= mMax; m++) {
        const threshold = THRESHOLDS[procedure](alpha, m)
        if (threshold < printed.low - SLACK) break
        if (threshold <= printed.high + SLACK) sizes.push(m)
      }
      const [from, to] = [sizes[0], sizes.at(-1)]
      if (from !== undefined && to !== undefined) found.push({ procedure, alpha, from, to })
    }
  }
  return found
}
