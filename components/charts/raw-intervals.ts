import type { Family, Report, Statistic } from '@/lib/checks/types'

export type Interval = { low: number; high: number }

/**
 * For each decision of a family, the unadjusted p-value behind its printed one, where the audit knows it: from
 * the statistic that is printed with it, else from another report of the same comparison (its raw value or its
 * statistic). Keyed by the decision's report.
 */
export function rawIntervals(
  family: Family,
  reports: ReadonlyMap<string, Report>,
  statistics: ReadonlyMap<string, Statistic>,
): Map<string, Interval> {
  const siblings = new Map<string, Report[]>()
  for (const report of reports.values()) {
    const key = report.family === family.id ? pairKey(report) : null
    if (key !== null) siblings.set(key, [...(siblings.get(key) ?? []), report])
  }
  const found = new Map<string, Interval>()
  for (const { report: id } of family.decisions) {
    const report = reports.get(id)
    if (!report) continue
    const others = siblings.get(pairKey(report) ?? '') ?? []
    const raw =
      fromStatistic(report, statistics) ??
      others.find((other) => other.scale === 'raw') ??
      others.map((other) => fromStatistic(other, statistics)).find((one) => one !== null)
    if (raw) found.set(id, { low: raw.low, high: raw.high })
  }
  return found
}

function fromStatistic(report: Report, statistics: ReadonlyMap<string, Statistic>): Interval | null {
  const statistic = report.statistic === null ? undefined : statistics.get(report.statistic)
  if (!statistic || statistic.pLow === null || statistic.pHigh === null) return null
  return { low: statistic.pLow, high: statistic.pHigh }
}

function pairKey({ comparison }: Report): string | null {
  return comparison === null
    ? null
    : [...comparison]
        .map((name) => name.toLowerCase())
        .sort()
        .join('\u0000')
}
