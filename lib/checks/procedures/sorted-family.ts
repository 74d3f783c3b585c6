/**
 * What every procedure that works on p-values alone implements: `sorted` are the known p-values of one family in
 * ascending order, each in [0, 1]; `m` >= sorted.length is the size of the whole family, whose unknown members
 * act as p = 1 at the end of the order; `alpha` in (0, 1) matters to two-stage procedures only. Answers the
 * adjusted p-values in the same order, each in [0, 1], equal where the p-values are equal.
 */
export type AdjustSorted = (sorted: Float64Array, m: number, alpha: number) => Float64Array

/** What turns one p-value of an ascending family, at index i from 0, into its own bound before those around it count. */
export type Step = (p: number, i: number) => number

/** Step-down: the largest step so far, capped at 1. */
export function stepDown(sorted: Float64Array, step: Step): Float64Array {
  const adjusted = new Float64Array(sorted.length)
  let largest = 0
  for (let i = 0; i < sorted.length; i++) {
    const value = step(sorted[i] ?? 1, i)
    if (value > largest) largest = value < 1 ? value : 1
    adjusted[i] = largest
  }
  return adjusted
}

/** Step-up: the smallest step from here to the end, capped at 1. */
export function stepUp(sorted: Float64Array, step: Step): Float64Array {
  const adjusted = new Float64Array(sorted.length)
  let smallest = 1
  for (let i = sorted.length - 1; i >= 0; i--) {
    const value = step(sorted[i] ?? 1, i)
    if (value < smallest) smallest = value
    adjusted[i] = smallest
  }
  return adjusted
}

/** What a single-step procedure does to each p-value in [0, 1] of a family of `m`, whatever the others are. */
export type AdjustEach = (p: number, m: number) => number

/** A single-step procedure as a function of the whole family. */
export function adjustAll(each: AdjustEach): AdjustSorted {
  return (p, m) => p.map((value) => each(value, m))
}
