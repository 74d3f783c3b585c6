import type { Adjusted, Calculation } from '@/lib/checks/calculate/calculate'
import type { Entry } from '@/lib/checks/calculate/entry'
import type { Claim, Decision, Place, Report } from '@/lib/checks/types'
import type { DrawnFamily } from '../charts/staircase-geometry'
import { STEPPED } from '../charts/thresholds'
import { standOf } from './judge-entry'

/** More dots than this no picture shows apart. */
export const MOST_DOTS = 300

export type Picture = {
  family: DrawnFamily
  reports: Report[]
  claim: Claim | null
  alpha: number
  left: number
}

const nowhere: Place = { source: 'results-table', page: null, row: null, sheet: null, quote: '', boxes: [] }

/**
 * What the staircase draws for a calculation: the raw values against the thresholds of the procedure where it has fixed
 * ones, else its adjusted values against its level. The call of a test is whether it is significant alone. Of a large
 * family the smallest values; `left` counts the others. Ids are the places in the list.
 */
export function pictureOf(
  entries: readonly Entry[],
  calculation: Calculation,
  main: Adjusted,
  alpha: number,
): Picture {
  const stepped = STEPPED.find((one) => one === main.procedure)
  const middle = (i: number) => (calculation.raw[i]?.low ?? 0) + (calculation.raw[i]?.high ?? 0)
  const order = entries.map((_, i) => i)
  const shown =
    entries.length > MOST_DOTS ? order.sort((a, b) => middle(a) - middle(b)).slice(0, MOST_DOTS) : order
  const reports: Report[] = []
  const decisions: Decision[] = []
  for (const i of shown) {
    const entry = entries[i]
    const raw = calculation.raw[i]
    const adjusted = main.adjusted[i] ?? { low: 0, high: 1 }
    if (!entry || !raw) continue
    const standing = standOf(raw, main.significant[i] ?? null, alpha)
    const drawn = stepped ? raw : adjusted
    reports.push({
      id: String(i),
      place: { ...nowhere, quote: entry.printed },
      relation: entry.relation,
      value: stepped ? entry.value : (drawn.low + drawn.high) / 2,
      decimals: entry.decimals,
      low: drawn.low,
      high: drawn.high,
      scale: stepped ? 'raw' : 'adjusted',
      statistic: null,
      comparison: null,
      called: null,
      family: 'list',
    })
    decisions.push({
      report: String(i),
      called: standing.alone,
      adjusted: [adjusted.low, adjusted.high],
      significant: standing.corrected,
      survivesUpTo: null,
    })
  }
  const { m } = calculation
  return {
    family: {
      id: 'list',
      label: 'the list',
      members: reports.map((report) => report.id),
      m: { printed: m, claimed: null, due: m, why: '' },
      outcome: 'holds',
      decisions,
    },
    reports,
    claim: {
      id: 'chosen',
      place: nowhere,
      procedure: stepped ?? 'unspecified',
      m: null,
      alpha,
      threshold: null,
      groups: null,
    },
    alpha: stepped ? alpha : main.level,
    left: entries.length - reports.length,
  }
}
