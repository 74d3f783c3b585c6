import { fits } from '../recover/fits'
import type { Fit } from '../types'
import { adjustRanges } from './adjusted'
import type { Evidence } from './comparison'
import type { Design } from './design'
import { overlaps } from './interval'

/** What reproduces the printed adjusted values, and the largest m that was tried: twice the family's own, at most 60. */
export function fitsOf(
  evidence: readonly Evidence[],
  printed: readonly Evidence['adjusted'][],
  design: Design,
  claimedM: number | null,
): { fits: Fit[]; upTo: number } {
  const direct = evidence.map(({ raw, adjusted }, i) =>
    adjusted && raw ? { raw, printed: printed[i] } : null,
  )
  const pairs = direct.flatMap((pair) => (pair?.printed ? [{ raw: pair.raw, printed: pair.printed }] : []))
  if (pairs.length === 0) return { fits: [], upTo: 0 }
  const largest = Math.max(design.due ?? 0, ...design.alternatives, pairs.length)
  const below = [claimedM ?? 0, ...design.alternatives].filter((m) => m >= 2 && m < pairs.length)
  const single = (['bonferroni', 'sidak'] as const).flatMap((procedure) =>
    below
      .filter((m) =>
        pairs.every((pair) =>
          adjustRanges(procedure, [pair.raw], m, 0.05).some((range) => overlaps(range, pair.printed)),
        ),
      )
      .map((m) => ({ procedure, m })),
  )
  const upTo = Math.max(largest, Math.min(60, 2 * largest))
  const whole = fits(
    pairs.map((pair) => pair.printed),
    pairs.map((pair) => pair.raw),
    { mMax: upTo },
  )
  return { fits: [...single, ...whole], upTo }
}
