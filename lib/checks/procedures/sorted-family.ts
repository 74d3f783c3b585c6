/**
 * What every procedure that works on p-values alone implements: `sorted` are the known p-values of one family in
 * ascending order, each in [0, 1]; `m` >= sorted.length is the size of the whole family, whose unknown members
 * act as p = 1 at the end of the order; `alpha` in (0, 1) matters to two-stage procedures only. Answers the
 * adjusted p-values in the same order, each in [0, 1], equal where the p-values are equal.
 */
export type AdjustSorted = (sorted: Float64Array, m: number, alpha: number) => Float64Array

/** Makes `values` non-decreasing from its start (step-down) and caps them at 1, in place. */
export function climb(values: Float64Array): Float64Array {
  let largest = 0
  for (let i = 0; i < values.length; i++) {
    largest = Math.max(largest, values[i] ?? 0)
    values[i] = Math.min(1, largest)
  }
  return values
}

/** Makes `values` non-decreasing from its end (step-up) and caps them at 1, in place. */
export function descend(values: Float64Array): Float64Array {
  let smallest = 1
  for (let i = values.length - 1; i >= 0; i--) {
    smallest = Math.min(smallest, values[i] ?? 1)
    values[i] = smallest
  }
  return values
}
