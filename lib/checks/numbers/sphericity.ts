import { tail } from '../distributions/tail'
import { pBounds } from './p-bounds'
import type { Interval } from './printed-interval'
import { searchRange } from './search-range'

/**
 * The p-values that an F of repeated measures between `low` and `high` can have where both degrees of freedom are
 * multiplied by an ε of sphericity (Greenhouse and Geisser, Huynh and Feldt): over all ε from its lower bound 1 / df1
 * to 1, or over a printed ε's rounding `epsilon` (cut to that range). Degrees of freedom that are no integers count as
 * multiplied already and are taken as they are, with their own rounding (`pBounds`).
 * p falls with F at any ε. In ε it falls for F that are significant, but not for every F (F(6, 60) = 1: from .34 at the
 * lower bound to .43), so that both ends are searched for, right to 1e-9 (`searchRange`).
 * Throws RangeError where `low` exceeds `high`, for df as in `tail`, and for an ε without a value between 1 / df1 and 1.
 * Source: Box (1954), Ann Math Stat 25, 484–498; Greenhouse and Geisser (1959), Psychometrika 24, 95–112.
 */
export function pBoundsOverSphericity(
  low: number,
  high: number,
  df: readonly [df1: number, df2: number],
  epsilon: Interval = { low: 0, high: 1 },
): Interval {
  const [df1, df2] = df
  const uncorrected = pBounds('F', low, high, df)
  if (!Number.isInteger(df1) || !Number.isInteger(df2)) return uncorrected
  const least = Math.max(1 / df1, epsilon.low)
  const most = Math.min(1, epsilon.high)
  if (!(least <= most)) {
    throw new RangeError(`ε lies between ${1 / df1} and 1, not in ${epsilon.low} to ${epsilon.high}`)
  }
  const over = (value: number) =>
    searchRange((at) => tail('F', Math.max(0, value), [at * df1, at * df2]), least, most)
  return { low: over(high).low, high: over(low).high }
}
