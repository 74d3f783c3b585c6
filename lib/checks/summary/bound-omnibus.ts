import { tail } from '../distributions/tail'
import type { Interval } from '../numbers/printed-interval'
import { searchRange } from '../numbers/search-range'
import { welchDivisor } from './omnibus'
import { boundWithin, type GroupBox } from './rounding-box'

/** Up to here every corner of the means' box is looked at. */
const ALL_CORNERS_TO = 12

/** `exact`: whether F and p attain both ends; else they lie inside, perhaps strictly. `welch` is always an outer bound. */
export type OmnibusBounds = {
  f: Interval
  p: Interval
  exact: boolean
  welch: { f: Interval; df2: Interval; p: Interval } | null
}

/**
 * What F, Welch's F and their p-values can be over the rounding of the printed numbers. F is exact for up to 12
 * groups: the sum of squares between groups is convex in the means, with its largest value at a corner of their box
 * and its smallest where they draw together, and the mean square within depends on the spreads alone. Beyond 12 groups
 * the upper end of F takes each pair of means at its farthest, which all together may not attain. For Welch's test the
 * two parts of the statistic and df2 are bounded one by one: an outer bound. Null for it where a spread can be 0.
 */
export function boundOmnibus(box: readonly GroupBox[]): OmnibusBounds {
  const within = boundWithin(box)
  const dfs = [box.length - 1, box.reduce((total, { n }) => total + n - 1, 0)]
  const sizes = box.map(({ n }) => n)
  const f = {
    low: divide(smallestSpread(box, sizes), (box.length - 1) * within.high),
    high: divide(largestSpread(box, sizes), (box.length - 1) * within.low),
  }
  const p = { low: tail('F', f.high, dfs), high: tail('F', f.low, dfs) }
  return { f, p, exact: box.length <= ALL_CORNERS_TO, welch: boundWelch(box) }
}

const divide = (a: number, b: number) => (a === 0 ? 0 : a / b)

function boundWelch(box: readonly GroupBox[]): OmnibusBounds['welch'] {
  if (box.some(({ variance }) => variance.low === 0)) return null
  const k = box.length
  const least = box.map(({ n, variance }) => n / variance.high)
  const most = box.map(({ n, variance }) => n / variance.low)
  const spread = boundWelchSpread(box, least, most)
  const df2 = { low: (k * k - 1) / (3 * spread.high), high: (k * k - 1) / (3 * spread.low) }
  // The weighted sum of squares grows with every weight, as the smallest of sums that do.
  const f = {
    low: smallestSpread(box, least) / (k - 1) / welchDivisor(k, spread.high),
    high: largestSpread(box, most) / (k - 1) / welchDivisor(k, spread.low),
  }
  const pAt = (value: number) => searchRange((df) => tail('F', value, [k - 1, df]), df2.low, df2.high)
  return { f, df2, p: { low: pAt(f.high).low, high: pAt(f.low).high } }
}

/** Λ = Σ (1 − w_i / W)² / (n_i − 1), each share w_i / W at its own farthest. */
function boundWelchSpread(
  box: readonly GroupBox[],
  least: readonly number[],
  most: readonly number[],
): Interval {
  const [allLeast, allMost] = [least, most].map((w) => w.reduce((total, value) => total + value, 0))
  const at = (own: readonly number[], others: readonly number[], all: number) =>
    box.reduce((total, { n }, i) => {
      const rest = all - (others[i] ?? 0)
      return total + (rest / (rest + (own[i] ?? 0))) ** 2 / (n - 1)
    }, 0)
  return { low: at(most, least, allLeast ?? NaN), high: at(least, most, allMost ?? NaN) }
}

/**
 * The smallest Σ w_i (x_i − x̄)² with x_i in the intervals of the means and x̄ their weighted mean: the smallest over
 * a centre c of Σ w_i (distance of c from the i-th interval)², which is convex in c; by bisection on its slope.
 */
function smallestSpread(box: readonly GroupBox[], weights: readonly number[]): number {
  const gap = ({ low, high }: Interval, c: number) => (c < low ? low - c : c > high ? high - c : 0)
  let low = Math.min(...box.map(({ mean }) => mean.low))
  let high = Math.max(...box.map(({ mean }) => mean.high))
  for (let round = 0; round < 200; round++) {
    const c = 0.5 * (low + high)
    if (c === low || c === high) break
    const pull = box.reduce((total, { mean }, i) => total + (weights[i] ?? 0) * gap(mean, c), 0)
    if (pull > 0) low = c
    else high = c
  }
  const at = (c: number) =>
    box.reduce((total, { mean }, i) => total + (weights[i] ?? 0) * gap(mean, c) ** 2, 0)
  return Math.min(at(low), at(high))
}

/** The largest such sum: at a corner of the box, or above it for many groups. */
function largestSpread(box: readonly GroupBox[], weights: readonly number[]): number {
  const origin = box[0]?.mean.low ?? 0
  const ends = box.map(({ mean }) => [mean.low - origin, mean.high - origin] as const)
  if (box.length > ALL_CORNERS_TO) return farthestPairs(ends, weights)
  const all = weights.reduce((total, w) => total + w, 0)
  let largest = 0
  for (let corner = 0; corner < 2 ** box.length; corner++) {
    const means = ends.map(([low, high], i) => ((corner >> i) & 1 ? high : low))
    const centre = means.reduce((total, mean, i) => total + (weights[i] ?? 0) * mean, 0) / all
    const spread = means.reduce((total, mean, i) => total + (weights[i] ?? 0) * (mean - centre) ** 2, 0)
    largest = Math.max(largest, spread)
  }
  return largest
}

/** Σ over pairs of w_i w_j (largest |x_i − x_j|)² / W, which the sum of squares equals where all are attained at once. */
function farthestPairs(ends: readonly (readonly [number, number])[], weights: readonly number[]): number {
  const all = weights.reduce((total, w) => total + w, 0)
  let total = 0
  ends.forEach(([low, high], i) =>
    ends.slice(0, i).forEach(([otherLow, otherHigh], j) => {
      const gap = Math.max(high - otherLow, otherHigh - low)
      total += ((weights[i] ?? 0) * (weights[j] ?? 0) * gap * gap) / all
    }),
  )
  return total
}
