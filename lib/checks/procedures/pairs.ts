/** Two different groups by their index from 0, the earlier first. */
export type Pair = readonly [number, number]

/** All pairs of `groups` groups in the order (0,1), (0,2) … (1,2) …, in which results over all pairs are given. */
export function listPairs(groups: number): Pair[] {
  return Array.from({ length: groups }, (_, a) => a).flatMap((a) =>
    Array.from({ length: groups - a - 1 }, (_, i): Pair => [a, a + 1 + i]),
  )
}

/** The same of everything that is computed for a pair: its statistic and its p-value. */
export type PairResult = { pair: Pair; statistic: number; p: number }

/** RangeError unless `sizes` are at least two integers of at least 1. */
export function checkSizes(sizes: readonly number[]) {
  if (sizes.length < 2) throw new RangeError('comparisons take at least two groups')
  for (const n of sizes) {
    if (!(Number.isSafeInteger(n) && n >= 1))
      throw new RangeError(`a group holds an integer number of values, at least 1, not ${n}`)
  }
}
