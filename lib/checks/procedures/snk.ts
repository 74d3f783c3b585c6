import { studentizedRangeUpper } from '../distributions/studentized-range'
import { adjustBySpan, type RangeLayout } from './multiple-range'
import type { PairResult } from './pairs'

/**
 * Student–Newman–Keuls: all pairs (in the order of `listPairs`) with their studentized range q and adjusted p, the
 * largest of P(Q_r > q) over the stretches of the ordered means that hold the pair, r the means of a stretch. Does not
 * control the family-wise error rate for four groups or more. Layout, harmonic forms for unequal sizes and errors as in multiple-range.ts; RangeError for df below 1 too.
 * Source: Newman (1939), Biometrika 31, 20–30; Keuls (1952), Euphytica 1, 112–122.
 */
export function compareBySnk(layout: RangeLayout): PairResult[] {
  return adjustBySpan(layout, (q, span) => studentizedRangeUpper(q, span, layout.df))
}
