import type { Claim, Decision, Family, Report } from '@/lib/checks/types'

/** One reported p-value of an invented audit; what is not given is a plain 'p = value' on page 1. */
export function makeReport(id: string, value: number, decimals = 3, given: Partial<Report> = {}): Report {
  const half = 0.5 * 10 ** -decimals
  return {
    id,
    place: {
      source: 'text',
      page: 1,
      row: null,
      sheet: null,
      quote: `p = ${value.toFixed(decimals)}`,
      boxes: [],
    },
    relation: '=',
    value,
    decimals,
    low: Math.max(0, value - half),
    high: Math.min(1, value + half),
    scale: 'raw',
    statistic: null,
    comparison: null,
    called: null,
    family: 'f1',
    ...given,
  }
}

export function makeDecision(report: string, given: Partial<Decision> = {}): Decision {
  return { report, called: null, adjusted: [0.1, 0.1], significant: false, survivesUpTo: null, ...given }
}

export function makeFamily(reports: readonly Report[], given: Partial<Family> = {}): Family {
  return {
    id: 'f1',
    label: 'kelp attachment, all pairs of substrates',
    members: reports.map((report) => report.id),
    claim: 'c1',
    groups: null,
    m: { printed: reports.length, claimed: null, due: reports.length, why: 'Counted as printed.' },
    outcome: 'holds',
    why: 'Every call holds.',
    decisions: reports.map((report) => makeDecision(report.id)),
    fits: [],
    working: null,
    ...given,
  }
}

export function makeClaim(given: Partial<Claim> = {}): Claim {
  return {
    id: 'c1',
    place: { source: 'text', page: 1, row: null, sheet: null, quote: 'Bonferroni-corrected', boxes: [] },
    procedure: 'bonferroni',
    m: null,
    alpha: null,
    threshold: null,
    groups: null,
    ...given,
  }
}
