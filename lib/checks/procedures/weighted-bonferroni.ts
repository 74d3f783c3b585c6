import type { AdjustInOrder } from './in-order'
import { levelOf, readWeights } from './weights'

/**
 * Weighted Bonferroni: min(1, p / w), w >= 0 with a sum of at most 1 (default 1 / m each); with w = 0 only p = 0 is
 * rejected. Controls the family-wise error rate under any dependence where the weights do not come from the data.
 * Source: Rosenthal and Rubin (1983), Ensemble-adjusted p values, Psychol Bull 94, 540–541.
 */
export const weightedBonferroni: AdjustInOrder = (p, { m, weights }) => {
  const shares = readWeights(weights, p.length, m)
  const adjusted = new Float64Array(p.length)
  for (let i = 0; i < p.length; i++) adjusted[i] = Math.min(1, levelOf(p[i] ?? 1, shares[i] ?? 0))
  return adjusted
}
