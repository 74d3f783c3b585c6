import type { ReadClaim, SectionKind } from '../types'
import type { ClaimedProcedure } from '../vocabulary'

/**
 * One correction that the manuscript claims, put together from every sentence that speaks of it: `lead` is the
 * sentence that says most. `m`, `threshold`, `groups`: null where no sentence states them.
 */
export type ClaimView = {
  lead: ReadClaim
  all: ReadClaim[]
  procedure: ClaimedProcedure
  m: number | null
  threshold: number | null
  alpha: number | null
  groups: number | null
  design: ReadClaim['scope']['design']
  errorRate: ReadClaim['errorRate']
  experiment: string | null
}

/** Sentences of one procedure and with compatible numbers are taken for one claim. */
export function groupClaims(claims: readonly ReadClaim[]): ClaimView[] {
  const own = claims.filter(({ section }) => section !== 'introduction' && section !== 'references')
  const ordered = [...own].sort((a, b) => weigh(b) - weigh(a) || a.offset - b.offset)
  const views: ClaimView[] = []
  for (const claim of ordered) {
    const view = views.find((candidate) => isCompatible(candidate, claim))
    if (view) extend(view, claim)
    else views.push(toView(claim))
  }
  return views.sort((a, b) => a.lead.offset - b.lead.offset)
}

const weightOf: Partial<Record<ClaimedProcedure, number>> = { unspecified: 0, none: 2, fdr: 2 }
const weightAt: Partial<Record<SectionKind, number>> = {
  methods: 3,
  results: 2,
  abstract: -2,
  discussion: -2,
}

/** How much a sentence says; the methods section outranks the rest. */
function weigh({ procedure, m, threshold, groups, section }: ReadClaim): number {
  const named = weightOf[procedure] ?? 4
  const stated = [m, threshold, groups].filter((value) => value !== null).length
  const place = weightAt[section] ?? 0
  return named + stated + place
}

/** "Experiment 1", "Study 2a", "Trial B" */
const experiment = /\b(?:experiment|study|trial)\s+([1-9][a-z]?|[A-H])\b/i

export function experimentIn(text: string): string | null {
  return experiment.exec(text)?.[1]?.toLowerCase() ?? null
}

/**
 * Abstract and discussion sum up, and so does a sentence outside the methods that names less than is named elsewhere;
 * numbers in them count results rather than tests.
 */
function sumsUp({ section, procedure }: ReadClaim, view: ClaimView): boolean {
  const vague = (procedure === 'fdr' || procedure === 'unspecified') && procedure !== view.procedure
  return section === 'abstract' || section === 'discussion' || (vague && section !== 'methods')
}

/** "FDR" alone may stand for any of the procedures that control it. */
const falseDiscovery = new Set<ClaimedProcedure>(['fdr', 'bh', 'by', 'bky', 'storey'])

function isCompatible(view: ClaimView, claim: ReadClaim): boolean {
  const sameProcedure =
    claim.procedure === view.procedure ||
    claim.procedure === 'unspecified' ||
    view.procedure === 'unspecified' ||
    ([claim.procedure, view.procedure].includes('fdr') &&
      falseDiscovery.has(claim.procedure) &&
      falseDiscovery.has(view.procedure))
  if (sumsUp(claim, view)) return sameProcedure
  const number = experimentIn(claim.sentence)
  return (
    sameProcedure &&
    isUnstatedOrEqual(view.m, claim.m) &&
    isUnstatedOrEqual(view.threshold, claim.threshold) &&
    (number === null || view.experiment === null || number === view.experiment)
  )
}

function isUnstatedOrEqual(a: number | null, b: number | null): boolean {
  return a === null || b === null || Math.abs(a - b) <= 0.02 * Math.max(a, b)
}

function toView(claim: ReadClaim): ClaimView {
  return {
    lead: claim,
    all: [claim],
    procedure: claim.procedure,
    m: claim.m,
    threshold: claim.threshold,
    alpha: claim.alpha,
    groups: claim.groups,
    design: claim.scope.design,
    errorRate: claim.errorRate,
    experiment: experimentIn(claim.sentence),
  }
}

function extend(view: ClaimView, claim: ReadClaim) {
  const summary = sumsUp(claim, view)
  view.all.push(claim)
  if (view.procedure === 'unspecified' || (view.procedure === 'fdr' && claim.procedure !== 'unspecified'))
    view.procedure = claim.procedure
  view.errorRate ??= claim.errorRate
  if (summary) return
  view.m ??= claim.m
  view.threshold ??= claim.threshold
  view.alpha ??= claim.alpha
  view.groups ??= claim.groups
  view.design ??= claim.scope.design
  view.experiment ??= experimentIn(claim.sentence)
}
