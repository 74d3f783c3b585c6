import { bh } from './bh'

/** How many of the `m` hypotheses Benjamini–Hochberg rejects at `level`; `sorted` ascending. */
export function countRejected(sorted: Float64Array, m: number, level: number): number {
  for (let i = sorted.length; i >= 1; i--) {
    if ((sorted[i - 1] ?? 1) <= (level * i) / m) return i
  }
  return 0
}

/**
 * What all two-stage procedures share: r hypotheses are rejected by Benjamini–Hochberg at `level`, the first stage;
 * m0 = m − r of them may be true (m where r is 0 or m); adjusted p = min(1, BH (m0 / m) `scale`). Not monotone:
 * where the last hypothesis falls in the first stage, m0 leaps from 1 back to m.
 */
export function adjustInTwoStages(
  sorted: Float64Array,
  m: number,
  level: number,
  scale: number,
): Float64Array {
  const rejected = countRejected(sorted, m, level)
  const remaining = rejected === 0 || rejected === m ? m : m - rejected
  const share = remaining / m
  const adjusted = bh(sorted, m)
  for (let i = 0; i < adjusted.length; i++) adjusted[i] = Math.min(1, (adjusted[i] ?? 1) * share * scale)
  return adjusted
}
