import { fits, type FitOptions } from '../recover/fits'
import type { Fit } from '../types'
import { intervalOf, type Reading } from './calculate'
import type { Entry } from './entry'

/**
 * Which procedures, at which family size, give the printed adjusted values of the entries from their raw ones (`fits`).
 * `compared`: the number of entries that carry an adjusted value; with none there is nothing to fit.
 */
export function fitPrinted(
  entries: readonly Entry[],
  reading: Reading,
  options: FitOptions = {},
): { compared: number; fits: Fit[] } {
  const both = entries.flatMap((entry) => (entry.adjusted ? [{ entry, adjusted: entry.adjusted }] : []))
  if (both.length === 0) return { compared: 0, fits: [] }
  return {
    compared: both.length,
    fits: fits(
      both.map(({ adjusted }) => ({ low: adjusted.low, high: adjusted.high })),
      both.map(({ entry }) => intervalOf(entry, reading)),
      options,
    ),
  }
}
