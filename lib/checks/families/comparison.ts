import type { PdfTable, ReadReport, ReadStatistic } from '../types'
import type { Interval } from './interval'

/** What a test is of, for people: its pair (in the order of the canonical pair) and its outcome as printed. */
export type Shown = { pair: [string, string] | null; outcome: string | null }

/**
 * One reported p-value as the judgement handles it. `pair` holds canonical names in alphabetical order; `block` is
 * the place it stands in (a heading, a table), in which neighbours are taken to belong together.
 */
export type Item = {
  report: ReadReport
  statistic: ReadStatistic | null
  pair: [string, string] | null
  outcome: string | null
  shown: Shown
  block: string
}

/**
 * All that is reported on one null hypothesis: duplicates in abstract, text, tables and results file. `key` tells it
 * from the others of its family; `label` is the same for people, with names as the manuscript prints them.
 */
export type Comparison = {
  key: string
  label: string
  shown: Shown
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

/** One print that speaks of a comparison: its id, the range of p it stands for, and what that p is taken for. */
export type Witness = { id: string; range: Interval; is: 'raw' | 'adjusted' | 'open' }

/**
 * A comparison with its evidence. `raw`: two-sided unadjusted p; `direct`: from statistics or raw values, not only
 * inferred from an adjusted one; `adjusted`: printed adjusted p; `witnesses`: the prints that all this rests on.
 */
export type Evidence = {
  raw: Interval | null
  direct: boolean
  conflict: boolean
  adjusted: Interval | null
  witnesses: Witness[]
}
