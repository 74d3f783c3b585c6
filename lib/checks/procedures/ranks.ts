/**
 * The ranks of `values` from 1, ties sharing their mean, and the sum over groups of t tied values of t³ − t. Throws
 * RangeError for NaN.
 */
export function rankWithTies(values: readonly number[]): { ranks: number[]; ties: number } {
  if (values.some(Number.isNaN)) throw new RangeError('ranks are of numbers')
  const order = values.map((value, i) => ({ value, i })).sort((a, b) => a.value - b.value)
  const ranks = values.map(() => NaN)
  let ties = 0
  for (let from = 0; from < order.length;) {
    let to = from + 1
    while (to < order.length && order[to]?.value === order[from]?.value) to++
    for (const { i } of order.slice(from, to)) ranks[i] = (from + 1 + to) / 2
    ties += (to - from) ** 3 - (to - from)
    from = to
  }
  return { ranks, ties }
}

const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0)

/** The mean rank of each group among the values of all, and the sum of t³ − t over ties. */
export function rankGroups(groups: readonly (readonly number[])[]): { meanRanks: number[]; ties: number } {
  const { ranks, ties } = rankWithTies(groups.flat())
  let start = 0
  const meanRanks = groups.map((group) => {
    const own = ranks.slice(start, (start += group.length))
    return sum(own) / own.length
  })
  return { meanRanks, ties }
}
