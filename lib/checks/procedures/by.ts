import { stepUp } from './sorted-family'

const EULER = 0.5772156649015329

/** 1 + 1/2 + … + 1/m for an integer m >= 1, by the asymptotic series from m = 100 (error below 1e-17). */
export function harmonic(m: number): number {
  if (m >= 100) {
    const r = 1 / (m * m)
    return Math.log(m) + EULER + 1 / (2 * m) - r * (1 / 12 - r * (1 / 120 - r / 252))
  }
  let sum = 0
  for (let i = m; i >= 1; i--) sum += 1 / i
  return sum
}

/**
 * Benjamini–Yekutieli, step-up: min over j >= i of (m / j) p(j) (1 + 1/2 + … + 1/m). Controls the false discovery
 * rate under any dependence. Source: Benjamini and Yekutieli (2001), Ann Stat 29, 1165–1188, theorem 1.3.
 */
export function by(sorted: Float64Array, m: number): Float64Array {
  const sum = harmonic(m)
  return stepUp(sorted, (p, i) => (m / (i + 1)) * sum * p)
}
