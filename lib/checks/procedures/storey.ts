import { bh } from './bh'

/** Where the p-values of true null hypotheses are taken to begin to prevail. */
const LAMBDA = 0.5

/**
 * Storey's q-values at lambda = 0.5: min(1, pi0 BH) with pi0 = min(1, #{p >= lambda} / (m (1 − lambda))). pi0 may
 * be 0, and q may be below p. Controls the (positive) false discovery rate for independent tests.
 * Source: Storey (2002), J R Stat Soc B 64, 479–498; Storey, Taylor and Siegmund (2004), J R Stat Soc B 66, 187–205.
 */
export function storey(sorted: Float64Array, m: number): Float64Array {
  let above = m - sorted.length
  for (const p of sorted) if (p >= LAMBDA) above++
  const share = Math.min(1, above / (m * (1 - LAMBDA)))
  const adjusted = bh(sorted, m)
  for (let i = 0; i < adjusted.length; i++) adjusted[i] = share * (adjusted[i] ?? 1)
  return adjusted
}
