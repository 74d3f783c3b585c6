import { studentizedRangeUpper } from '../distributions/studentized-range'
import { adjustBySpan, type RangeLayout } from './multiple-range'
import type { PairResult } from './pairs'

/**
 * Duncan's multiple range test: as Student–Newman–Keuls, but a stretch of r means is tested at 1 − (1 − alpha)^(r − 1);
 * as a p-value 1 − (1 − P(Q_r > q))^(1 / (r − 1)). Does not control the family-wise error rate. Layout, harmonic forms
 * for unequal sizes and errors as in multiple-range.ts; RangeError for df below 1 too.
 * Source: Duncan (1955), Biometrics 11, 1–42; unequal sizes: Kramer (1956), Biometrics 12, 307–310.
 */
export function compareByDuncan(layout: RangeLayout): PairResult[] {
  return adjustBySpan(layout, (q, span) => {
    const p = studentizedRangeUpper(q, span, layout.df)
    return -Math.expm1(Math.log1p(-p) / (span - 1))
  })
}
