import { survivesUpTo } from '../sensitivity/survives-up-to'
import type { HouseRules, Working } from '../types'
import type { ClaimedProcedure, Outcome, Procedure } from '../vocabulary'
import { worksOnP, worksOnT } from './adjusted'
import type { Assigned } from './assign'
import { impliedCall, statedCall } from './calls'
import type { Case, Exemption, Judged } from './case'
import type { Cluster, Comparison, Evidence, Remarks } from './comparison'
import { adjustFamily, isSignificant, type Yardstick } from './decide'
import { designOf, type Design } from './design'
import { expectAdjusted, readSeries, statisticsOf, type Series } from './evidence'
import { findExemption } from './exemption'
import { fitsOf } from './family-fits'
import type { FamilyDraft } from './join-outcomes'
import { labelOf } from './label'
import { leadOf } from './lead'
import { outcomeOf, whyOf } from './outcome'
import { isOneSided, weighEvidence } from './weigh-evidence'

export type Setting = { remarks: Remarks; rules: HouseRules; alpha: number }

/** Judges one family under the claim that speaks for it. `number`: 1, 2 … for the id. */
export function buildCase(draft: FamilyDraft, setting: Setting, number: number): Case {
  const { remarks, alpha } = setting
  const { cluster, assigned } = draft
  const ownView = assigned?.own ? assigned.view : null
  const design = designOf(cluster, ownView, remarks, draft.alternatives)
  const claimed = toProcedure(assigned?.view.procedure ?? 'none')
  const groups = groupsOf(design, assigned)
  const counts = [...new Set([design.due, assigned?.view.m ?? null, ...design.alternatives])].flatMap(
    (m) => m ?? [],
  )
  const expected = expectAdjusted(cluster.comparisons, claimed, counts, groups, alpha)
  const series = readSeries(cluster.comparisons, expected, remarks.oneSided)
  const used = { procedure: claimed, m: assigned?.view.m ?? design.due ?? cluster.comparisons.length }
  const evidence = cluster.comparisons.map((comparison) => weighEvidence(comparison, series, used))
  const printed = cluster.comparisons.map((_, i) => evidence[i]?.adjusted ?? null)
  const found = fitsOf(evidence, printed, design, assigned?.view.m ?? null)
  const effective = isCorrected(assigned, series) ? assigned : null
  const exemption = findExemption(cluster, design, effective, setting)
  const given = 2 * printed.filter((range) => range !== null).length > printed.length
  const procedure = !effective && !exemption && given && !assigned ? 'any' : yardstickOf(effective, exemption)
  const instead = procedure === 'holm' && claimed === 'bh' ? claimed : null
  const trusted =
    claimed !== null && found.fits.some((fit) => fit.procedure === claimed && fit.m === design.due)

  const judgeAt = (m: number) => {
    const yardstick = { procedure, m, groups, alpha }
    const adjusted = listParts(draft, m).flatMap(([from, to]) =>
      adjustFamily(cluster.comparisons.slice(from, to), evidence.slice(from, to), yardstick, trusted),
    )
    return cluster.comparisons.map((comparison, i): Judged => {
      const due = adjusted[i] ?? { low: 0, high: 1 }
      const each = evidence[i]
      const stated = statedCall(comparison, alpha)
      const implied = stated === null ? impliedCall(comparison, effective?.view ?? null, series, alpha) : null
      return {
        ...comparison,
        raw: each?.raw ?? null,
        conflict: each?.conflict ?? false,
        printed: each?.adjusted ?? null,
        due,
        called: stated ?? implied,
        implied: stated === null && implied !== null,
        significant: isSignificant(due, alpha),
        survivesUpTo: each?.raw ? keptUpTo(each.raw.high, alpha) : null,
      }
    })
  }
  const corrected = effective !== null || exemption !== null || procedure === 'any'
  const alternatives = design.alternatives.map((m) => ({ m, judged: judgeAt(m) }))
  const under = alternatives.map(({ m, judged }) => ({ m, outcome: outcomeOf(judged, corrected) }))
  const settledM = design.due ?? Math.max(...design.alternatives, cluster.comparisons.length)
  const comparisons =
    alternatives.length > 0 ? blur(alternatives.map(({ judged }) => judged)) : judgeAt(settledM)
  const outcome = outcomeUnder(under) ?? outcomeOf(comparisons, corrected)
  const asPrinted = procedure !== 'raw' && procedure !== 'any' && !worksOnP(procedure) && !worksOnT(procedure)
  return {
    family: {
      id: `family-${number}`,
      label: labelOf(cluster, design),
      members: membersOf(cluster),
      claim: assigned?.view.lead.id ?? null,
      groups: design.groups.length > 0 ? design.groups.length : null,
      m: {
        printed: cluster.comparisons.length,
        claimed: ownView?.m ?? null,
        due: design.due,
        why: design.why,
      },
      outcome,
      why: whyOf(comparisons, outcome, { procedure, design, alpha, exemption, instead, under }),
      decisions: comparisons.map(({ items, called, due, significant, survivesUpTo: upTo }) => ({
        report: leadOf({ items })?.id ?? '',
        called,
        adjusted: [due.low, due.high],
        significant,
        survivesUpTo: upTo,
      })),
      fits: found.fits,
      working: {
        procedure,
        alpha,
        groups,
        sizes: alternatives.length > 0 ? design.alternatives : [settledM],
        parts: draft.parts.length > 0 ? draft.parts.map(countOf) : [countOf(draft)],
        undone: used,
        trusted,
        fitsUpTo: found.upTo,
        tests: cluster.comparisons.map((comparison, i) => showTest(comparison, evidence[i])),
      },
    },
    kind: cluster.kind,
    comparisons,
    assigned,
    design,
    procedure,
    asPrinted,
    alpha,
    series,
    exemption,
    under,
  }
}

const countOf = ({ cluster }: FamilyDraft) => cluster.comparisons.length

function showTest(comparison: Comparison, evidence: Evidence | undefined): Working['tests'][number] {
  const { raw = null, witnesses = [] } = evidence ?? {}
  return {
    statistics: statisticsOf(comparison).map(({ id }) => id),
    oneSided: isOneSided(comparison),
    witnesses: witnesses.map(({ id, is }) => ({ id, is })),
    raw: raw && [raw.low, raw.high],
  }
}

/** The stretches of a joined family that an m below its size corrects one by one; else the whole. */
function listParts({ cluster, parts }: FamilyDraft, m: number): [from: number, to: number][] {
  const whole = cluster.comparisons.length
  if (parts.length === 0 || m >= whole) return [[0, whole]]
  const ends = parts.map((_, i) => parts.slice(0, i + 1).reduce((sum, part) => sum + countOf(part), 0))
  return ends.map((to, i) => [ends[i - 1] ?? 0, to])
}

/** Null where no family of any use is too large for it. */
function keptUpTo(p: number, alpha: number): number | null {
  return p < 1e-12 ? null : survivesUpTo(p, alpha)
}

/** A claim's word for a procedure as the one that is computed; null where it names none. */
function toProcedure(claimed: ClaimedProcedure): Procedure | null {
  if (claimed === 'fdr') return 'bh'
  return claimed === 'unspecified' || claimed === 'none' ? null : claimed
}

function groupsOf(design: Design, assigned: Assigned): number {
  const named = design.groups.length
  const stated = assigned?.view.groups ?? 0
  if (design.kind === 'many-to-one') return Math.max(named, (design.due ?? 0) + 1)
  return Math.max(named, stated)
}

/**
 * Whether the claim was acted on: a statement on the whole manuscript does not count for a family whose printed
 * values are the raw ones, held against the full level.
 */
function isCorrected(assigned: Assigned, series: readonly Series[]): boolean {
  if (!assigned || assigned.view.procedure === 'none') return false
  if (assigned.own) return true
  const inManuscript = series.filter(({ source }) => source !== 'results-table')
  return !inManuscript.some(({ is }) => is === 'raw') || inManuscript.some(({ is }) => is === 'adjusted')
}

/** The procedure that the calls are judged by: Holm where none is claimed, or where control of the family-wise rate is. */
function yardstickOf(assigned: Assigned, exemption: Exemption | null): Yardstick['procedure'] {
  if (exemption) return 'raw'
  if (!assigned) return 'holm'
  const { procedure, errorRate } = assigned.view
  const named = toProcedure(procedure)
  if (procedure === 'unspecified') return 'any'
  if (named === 'lsd') return 'raw'
  if (named === 'bh' && errorRate === 'fwer') return 'holm'
  return named ?? 'holm'
}

/** One judgement out of several admissible ones: a decision stands only where all agree. */
function blur(judgements: readonly Judged[][]): Judged[] {
  const [first = [], ...rest] = judgements
  return first.map((judged, i) => {
    const others = rest.flatMap((list) => list[i] ?? [])
    const low = Math.min(judged.due.low, ...others.map(({ due }) => due.low))
    const high = Math.max(judged.due.high, ...others.map(({ due }) => due.high))
    const agreed = others.every(({ significant }) => significant === judged.significant)
    return { ...judged, due: { low, high }, significant: agreed ? judged.significant : null }
  })
}

function outcomeUnder(under: readonly { m: number; outcome: Outcome }[]): Outcome | null {
  if (under.length === 0) return null
  const outcomes = new Set(under.map(({ outcome }) => outcome))
  return outcomes.size === 1 ? (under[0]?.outcome ?? null) : 'undecidable'
}

/** What the manuscript prints of the family; a results file stands in only where the manuscript prints nothing of it. */
function membersOf({ comparisons }: Cluster): string[] {
  const reports = comparisons.flatMap(({ items }) => items.map(({ report }) => report))
  const printed = reports.filter(({ place }) => place.source !== 'results-table')
  return [...new Set((printed.length > 0 ? printed : reports).map(({ id }) => id))]
}
