import type { PdfTable, ReadReport, ReadStatistic } from '../types'
import type { Interval } from './interval'

/**
 * One reported p-value as the judgement handles it. `pair` holds canonical names in alphabetical order; `block` is
 * the place it stands in (a heading, a table), in which neighbours are taken to belong together.
 */
export type Item = {
  report: ReadReport
  statistic: ReadStatistic | null
  pair: [string, string] | null
  outcome: string | null
  block: string
}

/** All that is reported on one null hypothesis: duplicates in abstract, text, tables and results file. */
export type Comparison = {
  key: string
  label: string
  pair: [string, string] | null
  outcome: string | null
  items: Item[]
}

export type Cluster = {
  kind: 'pairs' | 'outcomes'
  comparisons: Comparison[]
  blocks: string[]
}

/** What the manuscript's own words say, as far as the judgement needs it beside the claims. */
export type Remarks = {
  text: string
  tables: readonly PdfTable[]
  oneSided: boolean
  sphericity: boolean
  welch: boolean
  repeated: boolean
  exact: boolean
  exploratory: boolean
  coPrimary: boolean
  order: { sentence: string; offset: number } | null
  allCompared: string | null
  familyWise: { sentence: string; offset: number } | null
}

/**
 * A comparison with its evidence. `raw`: two-sided unadjusted p; `direct`: from statistics or raw values, not only
 * inferred from an adjusted one; `adjusted`: printed adjusted p.
 */
export type Evidence = {
  raw: Interval | null
  direct: boolean
  conflict: boolean
  adjusted: Interval | null
}
