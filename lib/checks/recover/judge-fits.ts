/**
 * What a list of fits says: 'impossible' where nothing reproduces the print, 'unique' where one procedure at one size
 * does, 'ambiguous' where several do. Two procedures that agree on this family (Holm and Bonferroni on tied values)
 * count as two: the print does not tell them apart.
 */
export type FitVerdict = 'unique' | 'ambiguous' | 'impossible'

/** The verdict of a list of fits as `fits` or `fitsFromStatistics` give it. */
export function judgeFits(found: readonly unknown[]): FitVerdict {
  if (found.length === 0) return 'impossible'
  return found.length === 1 ? 'unique' : 'ambiguous'
}
