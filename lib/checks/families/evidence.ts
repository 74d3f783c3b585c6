import type { ReadReport, ReadStatistic } from '../types'
import type { Procedure } from '../vocabulary'
import { rangeOfStatistic } from './agreement'
import { adjustRanges, adjustStatistics, worksOnP, worksOnT } from './adjusted'
import type { Comparison, Item } from './comparison'
import { clip, combine, overlaps, type Interval } from './interval'

/** What a source's p-values turn out to be, by the statistics and raw values printed of the same tests. */
export type Series = {
  source: ReadReport['place']['source']
  presented: ReadReport['scale']
  /** 'one-sided': half of the two-sided p of the statistics; 'unknown': nothing printed tells. */
  is: 'raw' | 'adjusted' | 'one-sided' | 'unknown'
  /** Comparisons whose value can be checked, and those that are as `is` says. */
  checked: number
  agreeing: number
  /** Whether the check can tell raw from adjusted at all. */
  telling: boolean
}

/** Every statistic of a comparison, those of duplicates too. */
export function statisticsOf(comparison: Comparison): ReadStatistic[] {
  const found = comparison.items.flatMap(({ statistic }) => (statistic ? [statistic] : []))
  return [...new Map(found.map((statistic) => [statistic.id, statistic] as const)).values()]
}

/**
 * The two-sided p that the statistic stands for over its rounding; null without degrees of freedom, and for a "Z" so
 * large that it is a rank sum rather than a standard normal.
 */
export function rangeOfP({ pLow, pHigh, test, value }: ReadStatistic): Interval | null {
  if (test === 'z' && Math.abs(value) > 38) return null
  return pLow === null || pHigh === null ? null : clip({ low: pLow, high: pHigh })
}

/** A printed p-value as a range; values above 1 (an uncapped product) stand for 1. */
export function rangeOfReport({ low, high }: ReadReport): Interval {
  return clip({ low, high })
}

/** p-values from the statistics and, of sources presented as raw, the p-values themselves. */
export function independentRaw(comparison: Comparison): Interval[] {
  const byStatistic = statisticsOf(comparison).flatMap((statistic) => rangeOfP(statistic) ?? [])
  const printed = comparison.items
    .filter(({ report }) => report.scale === 'raw' && !report.markOnly && !report.oneSided)
    .map(({ report }) => rangeOfReport(report))
  return [...byStatistic, ...printed]
}

/** How the adjusted values of a family would look: by the claimed procedure at each number of tests in question. */
export type Expected = { procedure: Procedure; m: number; ranges: (Interval | null)[] }[]

export function expectAdjusted(
  comparisons: readonly Comparison[],
  procedure: Procedure | null,
  counts: readonly number[],
  groups: number,
  alpha: number,
): Expected {
  if (!procedure) return []
  if (worksOnT(procedure)) {
    const ranges = comparisons.map((comparison) =>
      adjustStatistics(procedure, statisticsOf(comparison), groups),
    )
    return [{ procedure, m: comparisons.length, ranges }]
  }
  if (!worksOnP(procedure)) return []
  const raw = comparisons.map((comparison) => combine(independentRaw(comparison))?.range ?? null)
  return counts.map((m) => {
    const all = adjustRanges(procedure, raw, m, alpha)
    return { procedure, m, ranges: all.map((range, i) => (raw[i] ? range : null)) }
  })
}

/** What the p-values of each source and presentation really are. */
export function readSeries(
  comparisons: readonly Comparison[],
  expected: Expected,
  oneSidedStated: boolean,
): Series[] {
  const series = new Map<string, { item: Item; at: number }[]>()
  comparisons.forEach((comparison, at) => {
    for (const item of comparison.items) {
      const key = `${item.report.place.source} ${item.report.scale}`
      const members = series.get(key) ?? []
      series.set(key, members)
      members.push({ item, at })
    }
  })
  return [...series.values()].flatMap((members) => {
    const [first] = members
    if (!first) return []
    const { place, scale } = first.item.report
    return [
      { source: place.source, presented: scale, ...tell(members, comparisons, expected, oneSidedStated) },
    ]
  })
}

function tell(
  members: readonly { item: Item; at: number }[],
  comparisons: readonly Comparison[],
  expected: Expected,
  oneSidedStated: boolean,
): Pick<Series, 'is' | 'checked' | 'agreeing' | 'telling'> {
  const truthsOf = makeTruths()
  const votes = { raw: 0, adjusted: 0, oneSided: 0, checked: 0, rawOnly: 0, adjustedOnly: 0, oneSidedOnly: 0 }
  for (const { item, at } of members) {
    const comparison = comparisons[at]
    if (!comparison || item.report.markOnly) continue
    const printed = rangeOfReport(item.report)
    const { truths, halves } = truthsOf(comparison, item.report.place.source)
    if (truths.length === 0) continue
    votes.checked += 1
    const raw = truths.some((range) => overlaps(range, printed))
    const adjusted = expected.some(({ ranges }) => {
      const range = ranges[at]
      return range ? overlaps(widen(range), printed) : false
    })
    const half = halves.some((range) => overlaps(range, printed))
    votes.raw += raw ? 1 : 0
    votes.adjusted += adjusted ? 1 : 0
    votes.oneSided += half ? 1 : 0
    votes.rawOnly += raw && !adjusted ? 1 : 0
    votes.adjustedOnly += adjusted && !raw ? 1 : 0
    votes.oneSidedOnly += half && !raw && !adjusted ? 1 : 0
  }
  const { checked } = votes
  const isOneSided =
    !oneSidedStated && votes.oneSidedOnly >= 1 && votes.oneSided === checked && votes.rawOnly === 0
  if (isOneSided) return { is: 'one-sided', checked, agreeing: votes.oneSided, telling: true }
  const telling = votes.rawOnly + votes.adjustedOnly > 0
  if (votes.rawOnly > votes.adjustedOnly && 2 * votes.raw > checked)
    return { is: 'raw', checked, agreeing: votes.raw, telling }
  if (votes.adjustedOnly > votes.rawOnly && 2 * votes.adjusted > checked)
    return { is: 'adjusted', checked, agreeing: votes.adjusted, telling }
  if (!telling && checked > 0 && votes.raw === checked)
    return { is: 'unknown', checked, agreeing: checked, telling }
  return { is: 'unknown', checked, agreeing: Math.max(votes.raw, votes.adjusted), telling: false }
}

type Truths = { truths: Interval[]; halves: Interval[] }

/** What a comparison's p can be by its statistics and by other sources' raw values; made once for its duplicates. */
function makeTruths(): (comparison: Comparison, source: ReadReport['place']['source']) => Truths {
  const known = new Map<Comparison, Map<string, Truths>>()
  return (comparison, source) => {
    const bySource = known.get(comparison) ?? new Map<string, Truths>()
    known.set(comparison, bySource)
    const found = bySource.get(source)
    if (found) return found
    const others = comparison.items.filter(
      ({ report }) => report.scale === 'raw' && report.place.source !== source,
    )
    const made = {
      truths: [
        ...statisticsOf(comparison).flatMap((statistic) => rangeOfP(statistic) ?? []),
        ...others.map(({ report }) => rangeOfReport(report)),
      ],
      halves: halfOf(comparison),
    }
    bySource.set(source, made)
    return made
  }
}

/** Printed values of simulation-based and unbalanced procedures differ in the third digit. */
function widen({ low, high }: Interval): Interval {
  return { low: low * 0.99, high: high * 1.01 }
}

/** The one-sided p in the direction of the statistic, and in the other direction. */
function halfOf(comparison: Comparison): Interval[] {
  return statisticsOf(comparison)
    .filter(({ test }) => test === 't' || test === 'z' || test === 'r')
    .flatMap((statistic) => {
      const range = rangeOfP(statistic)
      if (!range || rangeOfStatistic(statistic).high === 0) return []
      return [
        { low: range.low / 2, high: range.high / 2 },
        { low: 1 - range.high / 2, high: 1 - range.low / 2 },
      ]
    })
}
