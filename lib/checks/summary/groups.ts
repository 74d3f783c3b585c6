/**
 * What is printed of one group: its size (an integer >= 2), mean, and standard deviation or standard error (>= 0).
 * `meanDecimals` and `spreadDecimals`: digits after the point that the mean and the sd or se were printed with; where
 * they are missing the number counts as exact.
 */
export type SummaryGroup = {
  group: string
  n: number
  mean: number
  meanDecimals?: number
  spreadDecimals?: number
} & ({ sd: number; se?: undefined } | { se: number; sd?: undefined })

/** Beyond these sizes squares leave what a double holds; no measurement is printed there. */
const LARGEST = 1e100
const SMALLEST = 1e-100

/** `sd` is the standard deviation with divisor n − 1; `se` = sd / √n. */
export type GroupMoments = { group: string; n: number; mean: number; sd: number; se: number }

/**
 * The groups with both sd and se, in input order. Throws RangeError with the group's name for fewer than two groups,
 * a name that occurs twice, n that is no integer or below 2, a mean or spread that is no number or beyond 1e100, a spread
 * below 0 or between 0 and 1e-100, both or neither of sd and se, and where every spread is 0, as nothing can be tested.
 */
export function getMoments(groups: readonly SummaryGroup[]): GroupMoments[] {
  if (groups.length < 2) throw new RangeError(`a comparison takes at least two groups, not ${groups.length}`)
  const names = new Set<string>()
  const moments = groups.map((each) => {
    if (names.has(each.group)) throw new RangeError(`two groups are called '${each.group}'`)
    names.add(each.group)
    return getMomentsOf(each)
  })
  if (moments.every(({ sd }) => sd === 0)) {
    throw new RangeError('the spread of every group is 0: there is no error to compare the means with')
  }
  return moments
}

function getMomentsOf({ group, n, mean, sd, se }: SummaryGroup): GroupMoments {
  const refuse = (what: string) => new RangeError(`group '${group}': ${what}`)
  if (!(Number.isSafeInteger(n) && n >= 2)) throw refuse(`n is an integer of at least 2, not ${n}`)
  if (!(Math.abs(mean) <= LARGEST)) throw refuse(`the mean is a number of at most 1e100 in size, not ${mean}`)
  if ((sd === undefined) === (se === undefined)) throw refuse('give either the sd or the se')
  const spread = sd ?? se ?? NaN
  const name = sd === undefined ? 'se' : 'sd'
  if (!(spread === 0 || (spread >= SMALLEST && spread <= LARGEST))) {
    throw refuse(`the ${name} is 0 or a number from 1e-100 to 1e100, not ${spread}`)
  }
  const root = Math.sqrt(n)
  return { group, n, mean, sd: sd ?? spread * root, se: se ?? spread / root }
}

export const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0)
