import { tail } from '../distributions/tail'
import type { Bench, Case } from '../families/case'
import { rangeOfP } from '../families/evidence'
import { clip, overlaps, type Interval } from '../families/interval'
import { findReasonApart } from '../families/items'
import type { ReadReport, ReadStatistic } from '../types'

/**
 * A printed p beside its statistic. `follows`: within rounding, or by a reading that the manuscript allows (sphericity
 * correction, Welch df, stated one-sided test); `one-sided`: only as half of the two-sided p, which is not stated.
 */
export type Checked = {
  report: ReadReport
  statistic: ReadStatistic
  computed: Interval
  family: string | null
  verdict: 'follows' | 'one-sided' | 'differs'
}

/** Every raw p-value that can be recomputed; duplicates of one print in several places are checked once. */
export function listChecked(bench: Bench): Checked[] {
  const known = checkedOf.get(bench)
  if (known) return known
  const checked = checkAll(bench)
  checkedOf.set(bench, checked)
  return checked
}

/** Several rules ask for the same. */
const checkedOf = new WeakMap<Bench, Checked[]>()

function checkAll(bench: Bench): Checked[] {
  const statisticOf = new Map(bench.reading.statistics.map((statistic) => [statistic.id, statistic] as const))
  const seen = new Set<string>()
  return bench.reading.reports.flatMap((report) => {
    const statistic = statisticOf.get(report.statistic ?? '')
    const computed = statistic ? rangeOfP(statistic) : null
    if (!statistic || !computed || !isRaw(report, statistic, computed, bench)) return []
    const print = [
      statistic.test,
      statistic.df.join(),
      Math.abs(statistic.value),
      report.relation,
      report.value,
    ]
    if (seen.has(print.join(' '))) return []
    seen.add(print.join(' '))
    const family = caseOf(report, bench)?.family.id ?? null
    return [{ report, statistic, computed, family, verdict: compare(report, statistic, computed, bench) }]
  })
}

const caseByReport = new WeakMap<Bench, Map<string, Case>>()

/** The first family that a report is a member of. */
function caseOf(report: ReadReport, bench: Bench): Case | null {
  const known = caseByReport.get(bench) ?? indexCases(bench)
  caseByReport.set(bench, known)
  return known.get(report.id) ?? null
}

function indexCases({ cases }: Bench): Map<string, Case> {
  const byReport = new Map<string, Case>()
  for (const one of cases)
    for (const { items } of one.comparisons)
      for (const { report } of items) if (!byReport.has(report.id)) byReport.set(report.id, one)
  return byReport
}

/**
 * Whether the value is to be held against the two-sided p of its statistic. A value that is, or may be, adjusted is
 * not; an adjusted value is never below the raw one, so that a smaller one is checked even where the scale is open.
 */
function isRaw(report: ReadReport, statistic: ReadStatistic, computed: Interval, bench: Bench): boolean {
  if (report.markOnly || !Number.isFinite(report.value) || report.value > 1 || report.value < 0) return false
  if (report.section === 'introduction' || report.section === 'references') return false
  if (report.scale === 'adjusted') return false
  const judged = caseOf(report, bench)
  const is = judged?.series.find(
    ({ source, presented }) => source === report.place.source && presented === report.scale,
  )?.is
  if (is === 'adjusted') return false
  if (is === 'one-sided' || is === 'raw' || report.scale === 'raw') return true
  const corrects = bench.views.some(({ procedure }) => procedure !== 'none')
  const apart = findReasonApart(report, statistic) !== null
  return apart || !corrects || report.high < computed.low
}

function compare(
  report: ReadReport,
  statistic: ReadStatistic,
  computed: Interval,
  bench: Bench,
): Checked['verdict'] {
  const printed = clip(report)
  const { remarks } = bench
  if (overlaps(printed, computed) || isNear(report, computed, bench)) return 'follows'
  if (halves(statistic, computed).some((range) => overlaps(printed, range)))
    return report.oneSided || remarks.oneSided ? 'follows' : 'one-sided'
  const upTo = allowance(statistic, computed, bench)
  return upTo !== null && overlaps(printed, { low: computed.low, high: upTo }) ? 'follows' : 'differs'
}

/** A last digit that is cut instead of rounded, or off by one; a tenth of the value. Never across the level. */
function isNear(report: ReadReport, computed: Interval, { reading }: Bench): boolean {
  const unit = 10 ** -report.decimals
  const exact = report.relation === '='
  const wide = { low: computed.low * 0.9, high: computed.high * 1.1 }
  const shifted = {
    low: Math.max(0, report.low - (exact ? unit : 0)),
    high: report.high + (exact ? unit : 0),
  }
  if (!overlaps(clip(shifted), computed) && !overlaps(clip(report), wide)) return false
  const alpha = reading.alpha.value
  return !(report.high <= alpha && computed.low > alpha) && !(report.low >= alpha && computed.high < alpha)
}

function halves({ test, df }: ReadStatistic, { low, high }: Interval): Interval[] {
  if (test !== 't' && test !== 'z' && test !== 'r' && !(test === 'F' && df[0] === 1)) return []
  return [
    { low: low / 2, high: high / 2 },
    { low: 1 - high / 2, high: 1 - low / 2 },
  ]
}

/**
 * How far above the computed value a printed p may lie by what the manuscript says it did: the lower bound of the
 * sphericity correction (Greenhouse and Geisser 1959: both df divided by the first), Welch's df (never below half of
 * the pooled ones for groups of equal size), continuity correction or an exact test.
 */
function allowance(
  { test, df, value }: ReadStatistic,
  { high }: Interval,
  { remarks }: Bench,
): number | null {
  const [first = 0, second = 0] = df
  if (test === 'F' && first > 1 && second > 0 && (remarks.sphericity || remarks.repeated))
    return tail('F', value, [1, second / first])
  if (test === 't' && remarks.welch && first > 1) return tail('t', value, [first / 2])
  if (test === 'chi2' && remarks.exact) return Math.min(1, high * 3)
  return null
}
