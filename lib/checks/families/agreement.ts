import type { ReadStatistic } from '../types'
import type { Item } from './comparison'
import { overlaps, type Interval } from './interval'

/** The range that a printed statistic stands for, without its sign: |value| plus or minus half a last digit. */
export function rangeOfStatistic({ value, decimals }: ReadStatistic): Interval {
  const half = 0.5 * 10 ** -decimals
  const size = Math.abs(value)
  return { low: Math.max(0, size - half), high: size + half }
}

type AsT = { test: string; df: number | undefined; range: Interval }

/** A statistic is compared with many others. */
const compared = new WeakMap<ReadStatistic, AsT>()

function asT(statistic: ReadStatistic): AsT {
  const known = compared.get(statistic)
  if (known) return known
  const made = makeT(statistic)
  compared.set(statistic, made)
  return made
}

/** F with one numerator degree of freedom is t squared: both are compared as t. */
function makeT(statistic: ReadStatistic): AsT {
  const range = rangeOfStatistic(statistic)
  if (statistic.test === 'F' && statistic.df[0] === 1)
    return {
      test: 't',
      df: statistic.df[1],
      range: { low: Math.sqrt(range.low), high: Math.sqrt(range.high) },
    }
  return { test: statistic.test, df: statistic.df[0], range }
}

/** Whether two printed statistics can be one and the same; null where they cannot be compared. */
export function sameStatistic(a: ReadStatistic, b: ReadStatistic): boolean | null {
  const [one, other] = [asT(a), asT(b)]
  if (one.test !== other.test || one.test === 'other') return null
  return overlaps(one.range, other.range)
}

function sameDf(a: ReadStatistic, b: ReadStatistic): boolean {
  const [one, other] = [asT(a).df, asT(b).df]
  return one === undefined || other === undefined || Math.abs(one - other) < 0.5
}

/**
 * Whether two reports can speak of one test by their numbers: true by the statistic, or by p-values on one scale;
 * false where these contradict; null where nothing printed can be compared.
 */
export function agreement(a: Item, b: Item): boolean | null {
  if (a.statistic && b.statistic) {
    const same = sameStatistic(a.statistic, b.statistic)
    if (same !== null) return same && sameDf(a.statistic, b.statistic)
  }
  const close = overlaps(a.report, b.report)
  if (a.report.scale === b.report.scale) return close
  return close ? true : null
}

/** True only where the numbers are so particular that they identify the test: statistic and df, or a p of two digits. */
export function isIdentified(a: Item, b: Item): boolean {
  if (a.statistic && b.statistic) return agreement(a, b) === true
  if (a.report.scale !== b.report.scale) return false
  const exact = a.report.relation === '=' && b.report.relation === '='
  const digits = Math.min(digitsOf(a), digitsOf(b))
  return exact && digits >= 2 && agreement(a, b) === true
}

/** Whether two p-values are printed alike, with two digits or more, whatever scale they are taken for. */
export function isSamePrint(a: Item, b: Item): boolean {
  const exact = a.report.relation === '=' && b.report.relation === '='
  return exact && digitsOf(a) >= 2 && a.report.value === b.report.value
}

/** Significant digits printed of a p-value. */
function digitsOf({ report }: Item): number {
  if (report.value <= 0) return 0
  return Math.floor(Math.log10(report.value) + report.decimals + 1e-9) + 1
}
