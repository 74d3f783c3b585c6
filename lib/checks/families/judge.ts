import { findAll } from '../findings/find-all'
import type { Family, Finding, HouseRules, LaidOut, Reading } from '../types'
import type { Call } from '../vocabulary'
import { assignClaims, type Assigned } from './assign'
import { buildCase, type Setting } from './build-case'
import type { Case } from './case'
import { groupClaims } from './claims'
import { clusterItems } from './cluster'
import type { Cluster } from './comparison'
import { listItems } from './items'
import { joinOutcomes, type FamilyDraft } from './join-outcomes'
import { readRemarks } from './remarks'

/**
 * Which reported tests form a family, how many are to be counted, whether the stated calls of significance stand, and
 * what a reviewer should look at. `called`: by report, what the manuscript calls it where the stated level tells
 * and no word does. Pure; never throws on what was read.
 */
export function judge(
  reading: Reading,
  laidOut: LaidOut,
  rules: HouseRules,
): { families: Family[]; findings: Finding[]; called: Map<string, Call> } {
  const clusters = clusterItems(listItems(reading, laidOut)).filter(isOfThisManuscript)
  const views = groupClaims(reading.claims)
  const said = readRemarks(laidOut)
  // with several sets of pairs such a sentence is tied to none of them
  const oneSet = clusters.filter(({ kind }) => kind === 'pairs').length <= 1
  const remarks = { ...said, allCompared: oneSet ? said.allCompared : null }
  const setting: Setting = { remarks, rules, alpha: reading.alpha.value }
  const assigned = assignClaims(clusters, views)
  const apart = clusters.map((cluster, i) => ({
    cluster,
    assigned: assigned[i] ?? null,
    alternatives: [],
    parts: [],
  }))
  const drafts = joinOutcomes(apart)
    .flatMap((draft) => (makesNoDifference(draft, setting) ? draft.parts : [draft]))
    .filter(({ cluster, assigned: claim }) => isFamily(cluster, claim, rules))
    .sort((a, b) => firstOffset(a.cluster) - firstOffset(b.cluster))
  const cases = drafts.map((draft, i) => buildCase(draft, setting, i + 1))
  return {
    families: cases.map(({ family }) => family),
    findings: findAll({ reading, laidOut, rules, remarks, cases, views }),
    called: impliedCalls(cases),
  }
}

/** Whether it does not matter for any call how a family that the text leaves open is drawn; then it is drawn apart. */
function makesNoDifference(draft: FamilyDraft, setting: Setting): boolean {
  if (draft.alternatives.length === 0) return false
  const { under } = buildCase(draft, setting, 0)
  return new Set(under.map(({ outcome }) => outcome)).size === 1 && under[0]?.outcome !== 'undecidable'
}

/** An abstract or a discussion repeats results; it founds no family of its own. */
function isOfThisManuscript({ comparisons }: Cluster): boolean {
  const founds = new Set(['results', 'other', 'methods'])
  return comparisons.some(({ items }) =>
    items.some(({ report }) => report.place.source !== 'text' || founds.has(report.section)),
  )
}

function isFamily(cluster: Cluster, assigned: Assigned, rules: HouseRules): boolean {
  return cluster.comparisons.length >= Math.max(2, rules.correctionFrom) || (assigned?.view.m ?? 0) >= 2
}

function firstOffset({ comparisons }: Cluster): number {
  return Math.min(...comparisons.flatMap(({ items }) => items.map(({ report }) => report.offset)))
}

function impliedCalls(cases: readonly Case[]): Map<string, Call> {
  const implied = cases.flatMap(({ comparisons }) => comparisons.filter((comparison) => comparison.implied))
  return new Map(
    implied.flatMap(({ items, called }) =>
      items.map(({ report }) => [report.id, called ? 'significant' : 'not significant'] as const),
    ),
  )
}
