import type { AdjustSorted } from './sorted-family'

/**
 * The points (r, p(m − r)) of the descending p-values and their lower convex hull, as a stack. `add` takes them
 * with growing r and falling p; `leastSlope(s)` is the minimum of p / (s − r) over the points added, for s > r and,
 * from call to call, growing s. The point that gives it then never moves to the left: both take O(1) on average.
 */
function createHull(capacity: number) {
  const xs = new Float64Array(capacity)
  const ys = new Float64Array(capacity)
  let size = 0
  let touching = 0
  const slope = (i: number, x: number, y: number) => (y - (ys[i] ?? 0)) / (x - (xs[i] ?? 0))
  const towards = (i: number, s: number) => (ys[i] ?? 0) / (s - (xs[i] ?? 0))
  return {
    add(x: number, y: number) {
      while (size >= 2 && slope(size - 1, x, y) <= slope(size - 2, xs[size - 1] ?? 0, ys[size - 1] ?? 0))
        size--
      xs[size] = x
      ys[size] = y
      size++
    },
    leastSlope(s: number): number {
      touching = Math.min(touching, size - 1)
      while (touching < size - 1 && towards(touching + 1, s) <= towards(touching, s)) touching++
      return towards(touching, s)
    },
  }
}

/**
 * Hommel: the largest Simes p-value among all intersections that hold the hypothesis. With d(s) the minimum over
 * j = 2 … s of s p(m − s + j) / j, which falls in s, and e(s) = min(d(s), s p(m − s + 1)), the adjusted p(i) is
 * the larger of max{min(d(s), s p(i)) : s <= m − i} and max{e(s) : s > m − i}. d is a tangent to the convex hull
 * of the descending p-values, and the first maximum lies where the falling d crosses the rising s p(i), which moves
 * down as i grows: linear in the number of p-values once they are sorted, whatever m is. Controls the family-wise
 * error rate where Simes's inequality holds.
 * Source: Hommel (1988), Biometrika 75, 383–386; adjusted p after Wright (1992), Biometrics 48, 1005–1013; that the
 * convex hull makes it linear: Meijer, Krebs and Goeman (2019), Hommel's procedure in linear time, Biom J 61, 73–82.
 */
export const hommel: AdjustSorted = (sorted, m) => {
  const n = sorted.length
  const unknown = m - n
  const p = (rank: number) => sorted[rank - 1] ?? 1

  // d(s) is 1 (the cap) up to s = unknown + 1, where only members at p = 1 enter; least[s - unknown] from there on.
  // Those members need no point of their own: what they give is the cap.
  const least = new Float64Array(n + 1).fill(1)
  const hull = createHull(n)
  for (let s = unknown + 2; s <= m; s++) {
    hull.add(s - 2, p(m - s + 2))
    least[s - unknown] = Math.min(1, s * hull.leastSlope(s))
  }
  const d = (s: number) => least[s - unknown] ?? 1

  const adjusted = new Float64Array(n)
  let crossing = m
  let simes = 0
  for (let i = 1; i <= n; i++) {
    const value = p(i)
    while (crossing > unknown + 1 && crossing * value > d(crossing)) crossing--
    const last = m - i
    const below = last <= crossing ? last * value : Math.max(crossing * value, d(crossing + 1))
    const size = last + 1
    simes = Math.max(simes, Math.min(d(size), size * value))
    adjusted[i - 1] = Math.min(1, Math.max(below, simes))
  }
  return adjusted
}
