import type { AdjustInOrder } from './in-order'

/**
 * Fixed sequence: each hypothesis is tested at the full level, in the order given, until one is not rejected: max
 * over j <= i of p_j. Controls the family-wise error rate under any dependence where the order was fixed beforehand.
 * Source: Maurer, Hothorn and Lehmacher (1995), in: Biometrie in der chemisch-pharmazeutischen Industrie 6, 3–18;
 * Westfall and Krishen (2001), J Stat Plan Inference 99, 25–40.
 */
export const fixedSequence: AdjustInOrder = (p) => {
  const adjusted = new Float64Array(p.length)
  let largest = 0
  for (let i = 0; i < p.length; i++) {
    largest = Math.max(largest, p[i] ?? 1)
    adjusted[i] = largest
  }
  return adjusted
}
