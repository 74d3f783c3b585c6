import { bh } from './bh'

/** The level of the first stage, alpha / (1 + alpha). */
export function firstStageLevel(alpha: number): number {
  return alpha / (1 + alpha)
}

/** How many of the `m` hypotheses Benjamini–Hochberg rejects at `level`; `sorted` ascending. */
function countRejected(sorted: Float64Array, m: number, level: number): number {
  for (let i = sorted.length; i >= 1; i--) {
    if ((sorted[i - 1] ?? 1) <= (level * i) / m) return i
  }
  return 0
}

/**
 * Two-stage linear step-up at level `alpha`: r hypotheses are rejected by Benjamini–Hochberg at alpha / (1 + alpha);
 * m0 = m − r (m where r is 0 or m); adjusted p = min(1, BH (m0 / m) (1 + alpha)), to be held against that alpha
 * only. Controls the false discovery rate for independent tests. Not monotone: where the last hypothesis falls in
 * the first stage, m0 leaps from 1 back to m.
 * Source: Benjamini, Krieger and Yekutieli (2006), Biometrika 93, 491–507, definition 6.
 */
export function bky(sorted: Float64Array, m: number, alpha: number): Float64Array {
  const rejected = countRejected(sorted, m, firstStageLevel(alpha))
  const remaining = rejected === 0 || rejected === m ? m : m - rejected
  return bh(sorted, m).map((q) => Math.min(1, q * (remaining / m) * (1 + alpha)))
}
