import { roundingInterval } from '../numbers/printed-interval'
import { pBounds } from '../numbers/p-bounds'
import { isCitedWork } from './grammar/cited-work'
import { findPValues, type PrintedP } from './grammar/p-value'
import { dfAfter, findStatistics, type PrintedStatistic } from './grammar/statistic'
import { isLegend, isThreshold } from './grammar/threshold'
import type { Sentence } from './sentences'

/** What one sentence reports: values that are results, statistics, and which was printed with which. */
export type SentenceReports = {
  sentence: Sentence
  reports: { p: PrintedP; statistic: number | null }[]
  statistics: PrintedStatistic[]
}

/** Degrees of freedom or n that stand after the p: 'r = −.45, p = .002, n = 45'. */
function completeDf(text: string, p: PrintedP | undefined, statistic: PrintedStatistic | undefined): void {
  if (p && statistic && statistic.df.length === 0 && p.end > statistic.end)
    statistic.df = dfAfter(text.slice(p.end), statistic.test).df
}

/** How far apart a statistic and its p may stand: '…, 95 % CI −7.3 to −0.2, d = 0.4, p = .03'. */
const REACH = 90

/** p-values and statistics of a sentence that are results of this paper; null where it has none. */
export function findReports(sentence: Sentence): SentenceReports | null {
  const { text, section, caption } = sentence
  const printed = findPValues(text)
  const plausible = findStatistics(text)
  if (printed.length === 0 && plausible.length === 0) return null
  if (isCitedWork(text, section)) return null
  const withMarks = [...printed, ...findMarks(text, plausible)].sort((a, b) => a.start - b.start)
  const links = link(text, withMarks, plausible)
  for (const [i, s] of links) completeDf(text, withMarks[i], plausible[s])
  const statistics = plausible.filter((statistic, i) => statistic.certain || [...links.values()].includes(i))
  const reports = withMarks
    .map((p, i) => ({ p, linked: links.get(i) ?? null }))
    .filter(({ p, linked }) => {
      const setting = { text, section, caption, linked: linked !== null }
      return !isThreshold(p, setting) && !isLegend(p, setting)
    })
    .map(({ p, linked }) => {
      const statistic = linked === null ? undefined : plausible[linked]
      return { p, statistic: statistic ? statistics.indexOf(statistic) : null }
    })
  return reports.length + statistics.length > 0 ? { sentence, reports, statistics } : null
}

/** 'n.s.' in place of a value straight after a statistic: 't(30) = 1.20, n.s.', 'F(1, 30) < 1, ns'. */
function findMarks(text: string, statistics: readonly PrintedStatistic[]): PrintedP[] {
  return statistics.flatMap(({ end }) => {
    // a comma or bracket, then the mark as a word of its own
    const mark = /^\s*[,;(]\s*(n\.\s?s\.|ns|NS|N\.S\.)(?![A-Za-z])/.exec(text.slice(end))
    if (!mark?.[1]) return []
    const start = end + mark[0].length - mark[1].length
    return [
      {
        start,
        end: start + mark[1].length,
        relation: '>' as const,
        value: Number.NaN,
        decimals: 2,
        scale: 'unknown' as const,
        of: null,
        oneSided: false,
        plural: false,
        item: null,
        items: 1,
        markOnly: true,
      },
    ]
  })
}

/**
 * Which p belongs to which statistic, by index: the next value after a statistic, before another statistic comes;
 * where the value stands first in its bracket, the value before. Lists 't(28) = 2.05 and 3.10, p = .05 and .004'
 * keep their first pair.
 */
function link(
  text: string,
  ps: readonly PrintedP[],
  statistics: readonly PrintedStatistic[],
): Map<number, number> {
  const links = new Map<number, number>()
  statistics.forEach((statistic, s) => {
    const next = statistics[s + 1]?.start ?? Infinity
    const i = ps.findIndex((p, at) => !links.has(at) && p.start >= statistic.end && p.start < next)
    const p = ps[i]
    if (p && p.start - statistic.end <= REACH && isTogether(text.slice(statistic.end, p.start)))
      links.set(i, s)
  })
  const linked = new Set(links.values())
  statistics.forEach((statistic, s) => {
    if (linked.has(s)) return
    const previous = statistics[s - 1]?.end ?? 0
    const i = ps.findLastIndex((p, at) => !links.has(at) && p.end <= statistic.start && p.start >= previous)
    const p = ps[i]
    if (p && statistic.start - p.end <= 30 && isTogether(text.slice(p.end, statistic.start))) links.set(i, s)
  })
  return links
}

/** Between a statistic and its p stand numbers, signs and effect sizes, hardly any words. */
function isTogether(between: string): boolean {
  const words = between.match(/[A-Za-z]{3,}/g) ?? []
  const allowed =
    /^(?:with|two|one|sided|tailed|adjusted|corrected|degrees|freedom|uncorrected|unadjusted|Bonferroni|Holm|Tukey|Dunnett|Benjamini|Hochberg|FDR|partial|eta|Cohen|Hedges|MSE|CI|confidence|interval|Wilcoxon|Mann|Whitney|test|and|exact|associated|yielding|giving|raw|both|all|the|value|values|for|Welch|corresponding|this|gave|was|mean|difference|ratio|odds|hazard|CrI|SEM|log|rank|paired|from|num|denom|the|than|less|having|omega|squared|post|hoc|family|wise|two-tailed)$/i
  const foreign = words.filter((word) => !allowed.test(word))
  return foreign.length <= 2 && !/[.;]\s+[A-Z]/.test(between)
}

/** The p-values a printed statistic can have: two-sided, upper tail for F and χ²; null without the df it needs. */
export function boundP({ test, df, value, decimals, relation }: PrintedStatistic): [number, number] | null {
  if (test === 'other' || relation !== '=') return null
  const need = test === 'F' ? 2 : test === 'z' ? 0 : 1
  if (df.length !== need || df.some((d) => !(d > 0))) return null
  const { low, high } = roundingInterval(value, decimals)
  const bounds = pBounds(test, low, high, df)
  return [bounds.low, bounds.high]
}
