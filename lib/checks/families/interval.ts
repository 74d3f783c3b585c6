/** A closed range of p-values, 0 <= low <= high. */
export type Interval = { low: number; high: number }

/** Relative slack that absorbs the last bits of the computation, never a printed digit. */
const slack = 1e-9

/** Whether the two ranges have a point in common; ends that touch do. */
export function overlaps(a: Interval, b: Interval): boolean {
  return a.low <= b.high * (1 + slack) + slack * 1e-6 && b.low <= a.high * (1 + slack) + slack * 1e-6
}

/** The common part; null where there is none. */
export function intersect(a: Interval, b: Interval): Interval | null {
  if (!overlaps(a, b)) return null
  const low = Math.max(a.low, b.low)
  return { low, high: Math.max(low, Math.min(a.high, b.high)) }
}

/** The smallest range that holds both. */
export function join(a: Interval, b: Interval): Interval {
  return { low: Math.min(a.low, b.low), high: Math.max(a.high, b.high) }
}

/** Kept inside [0, 1], as a probability. */
export function clip({ low, high }: Interval): Interval {
  const end = Math.min(1, Math.max(0, high))
  return { low: Math.min(end, Math.max(0, low)), high: end }
}

/**
 * What all the evidence on one number says: consistent ranges are intersected; where any contradicts, all are
 * joined and `conflict` is true. Null for no evidence.
 */
export function combine(ranges: readonly Interval[]): { range: Interval; conflict: boolean } | null {
  const [first, ...rest] = ranges
  if (!first) return null
  let range: Interval | null = first
  for (const next of rest) range = range && intersect(range, next)
  if (range) return { range, conflict: false }
  return { range: rest.reduce(join, first), conflict: true }
}
