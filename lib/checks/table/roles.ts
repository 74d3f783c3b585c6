import type { ClaimedProcedure, Scale, Test } from '../vocabulary'
import { fold } from '../extract/grammar/fold'
import { splitPair } from '../extract/grammar/comparison'
import { findProcedures } from '../extract/grammar/procedure'
import { parseDf } from '../extract/grammar/statistic'
import { isMark, isMissing, readCall, readNumber, readP } from './cell'

/**
 * What a column of a table holds. `p`: p-values on a scale, by a procedure where the head names one; `df.index`:
 * which of two degrees of freedom, 0-based; `statistic.df`: degrees of freedom printed in the head.
 */
export type ColumnRole =
  | { kind: 'p'; scale: Scale; procedure: ClaimedProcedure | null }
  | { kind: 'statistic'; test: Test; df: number[] }
  | { kind: 'df'; index: 0 | 1 }
  | { kind: 'stars' }
  | { kind: 'call' }
  | {
      kind:
        | 'comparison'
        | 'group'
        | 'group2'
        | 'outcome'
        | 'label'
        | 'n'
        | 'mean'
        | 'sd'
        | 'se'
        | 'estimate'
        | 'ci'
        | 'other'
    }

export type Column = { header: string; cells: string[] }

/** 'p', 'P-value', 'p.value', 'Pr(>|t|)', 'P>|t|', 'Sig.', 'Sig. (2-tailed)', 'Prob > F', 'p (two-sided)', 'Exact Sig.'. */
const P_HEAD =
  /^(?:(?:raw|unadj(?:usted|\.)?|uncorr?(?:ected|\.)?|nominal|crude|exact|asymp\.?|two-sided|one-sided|2-tailed|1-tailed|adj(?:usted|\.)?|corr(?:ected|\.)?|bonferroni|holm|tukey|fdr|multiplicity|[a-zšé]+-(?:adjusted|corrected))[\s-]*)*(?:p|q|sig\.?|signif\.?|significance|prob\.?)(?![a-z])(?!\s?\d)|\bp[\s._-]?val(?:ue)?s?\b|^pr\s?\(?\s?>|\bp\s?>\s?\|?[tzf]\|?|^prob\b|^p\s?[_.(-]|^p(?:adj|corr|bonf|holm|tukey|fdr|unc|raw|b|h|fwe|sidak)\b|^q(?:val(?:ue)?)?\b|^padj|^adj\.?p/i
/** 'p adj', 'p.adj', 'adj.P.Val', 'Adjusted P', 'p_corr', 'p_bonf', 'pB', 'FDR', 'q', 'Adj. Sig.', 'p (Holm)', 'Stepdown Bonferroni'. */
const ADJUSTED_HEAD =
  /\badj|corr(?!el)|bonf|holm|hochberg|hommel|tukey|dunnett|scheff|s[iı]d[aá]k|šidák|\bfdr|fwe|^q\b|^q[\s._-]?val|\bbh\b|\bby\b|^p[\s_]?[bhc]$|false discovery|multiplicity|game|\bhsd\b|step-?down|familywise|p_?adj|padj/i
const RAW_HEAD = /\braw|unadj|un-?adjusted|uncorr|un-?corrected|\bunc\b|nominal|crude|p_?raw|praw/i
/** Heads that name a procedure alone, over values that are p-values: 'Bonferroni', 'Holm', 'FDR', 'False Discovery Rate'. */
const PROCEDURE_HEAD =
  /^(?:(?:step-?\s?down\s|step-?\s?up\s)?bonferroni(?:[\s-]holm)?|holm(?:[\s-]bonferroni)?|hochberg|hommel|[sš]id[aá]k|tukey(?:\shsd)?|dunnett|scheff[eé]|games[\s-]howell|fdr|false discovery rate|benjamini[\s–-]hochberg|bh)$/i

const STATISTIC_HEADS: readonly (readonly [Test, RegExp])[] = [
  // 't', 't(28)', 't_28', 't value', 't ratio', 't-statistic', 'T', 'Welch t', '|t|'
  [
    't',
    /^(?:welch'?s?\s|student'?s?\s|paired\s)?\|?t\|?(?:[\s._-]?(?:value|ratio|stat(?:istic)?|test))?s?(?:\s?[_[(]|\s?\d|$|\s?,|\s)/i,
  ],
  ['F', /^(?:welch'?s?\s)?F(?:[\s._-]?(?:value|ratio|stat(?:istic)?|test))?(?:\s?[_[(]|\s?\d|$|\s?,)/],
  [
    'chi2',
    /^(?:(?:pearson|wald|lr)\s)?(?:χ\s?\^?2|chi-?\s?\^?(?:2|sq(?:uare)?d?)\.?|x\^?2|x-squared|chisq)(?![a-z])/i,
  ],
  ['z', /^(?:wald\s)?z(?:[\s._-]?(?:value|ratio|score|stat(?:istic)?))?(?:\s?\(|$)/i],
  [
    'r',
    /^(?:pearson'?s?\s)?r(?:\s?\(|$|_?\{?\d)|^pearson(?:'s)?(?:\sr|\scorrelation)?$|^correlation(?:\scoefficient)?$/,
  ],
  ['other', /^(?:[UWHVQD]|spearman.*|rho|ρ|tau|τ|r_?s|kendall.*)$/],
]

/** Roles by head, checked against what the cells hold; the first column of words that has no role is the label. */
export function findRoles(all: readonly Column[]): ColumnRole[] {
  const columns = all.map(sampleCells)
  const roles = columns.map(roleOf)
  const hasAdjusted = roles.some((role) => role.kind === 'p' && role.scale === 'adjusted')
  const settled = roles.map((role): ColumnRole =>
    role.kind === 'p' && role.scale === 'unknown' && hasAdjusted ? { ...role, scale: 'raw' } : role,
  )
  pairGroups(columns, settled)
  const label = settled.findIndex((role, i) => role.kind === 'other' && isWords(columns[i]?.cells ?? []))
  const named = settled.some(({ kind }) => kind === 'comparison' || kind === 'outcome' || kind === 'group')
  if (label >= 0 && (!named || label === 0))
    settled[label] = { kind: isPairs(columns[label]?.cells ?? []) ? 'comparison' : 'label' }
  return settled
}

const SAMPLE = 2000

/** Of a long column every so many cells tell what it holds, the first among them. */
function sampleCells(column: Column): Column {
  const { cells } = column
  if (cells.length <= SAMPLE) return column
  const step = cells.length / SAMPLE
  return { ...column, cells: Array.from({ length: SAMPLE }, (_, i) => cells[Math.floor(i * step)] ?? '') }
}

function roleOf({ header, cells }: Column): ColumnRole {
  const head = fold(header)
    .replace(/[*†‡§#]+$/, '')
    .replace(/\s+/g, ' ')
    .trim()
  const all = cells.filter((cell) => cell.trim() !== '')
  // signs for a missing value say nothing of a column; one of nothing else is judged by them
  const given = all.filter((cell) => !isMissing(cell))
  const filled = given.length > 0 ? given : all
  const share = (test: (cell: string) => boolean) =>
    filled.length === 0 ? 0 : filled.filter(test).length / filled.length
  const isP = (cell: string) => readP(cell) !== null
  if (share(isMark) >= 0.99 && filled.length > 0) return { kind: 'stars' }
  if (
    all.length > 0 &&
    all.filter((cell) => readCall(cell) !== null).length / all.length >= 0.8 &&
    /sig|reject|differ|call|different|result|conclusion|summary|thresh|decision|^$/i.test(head)
  )
    return { kind: 'call' }
  const last = lastPart(head)
  if (
    (P_HEAD.test(last) || P_HEAD.test(head) || PROCEDURE_HEAD.test(last)) &&
    !/interval|level|CI\b/.test(last)
  ) {
    if (share((cell) => isP(cell) || isMark(cell)) >= 0.5) return toP(head)
  }
  const test =
    STATISTIC_HEADS.find(([, form]) => form.test(last)) ??
    // an upper line says it only where the lowest says nothing: 't test | df' holds degrees of freedom
    (head !== last && plainKind(last, last, share) === 'other'
      ? STATISTIC_HEADS.find(([, form]) => form.test(head))
      : undefined)
  if (test && share((cell) => readNumber(cell) !== null) >= 0.5) {
    return { kind: 'statistic', test: test[0], df: dfOfHead(last, test[0]) }
  }
  return { kind: plainKind(head, last, share) } as ColumnRole
}

/** The degrees of freedom printed in a head: 't(28)', 't_28', 'F(2, 57)', 't 28'; [] where there are none. */
export function dfOfHead(head: string, test: Test): number[] {
  const inside =
    /[([_]\s?\{?([^)\]}]*\d[^)\]}]*)/.exec(head) ??
    /^[A-Za-zχ]+\s?(\d[\d.,;\s]*)$/.exec(test === 'chi2' ? '' : head)
  return inside?.[1] ? (parseDf(inside[1], test) ?? []) : []
}

const PLAIN: readonly (readonly [
  'comparison' | 'group' | 'group2' | 'outcome' | 'n' | 'mean' | 'sd' | 'se' | 'estimate' | 'ci',
  RegExp,
])[] = [
  ['ci', /\bCI\b|confidence|\blwr\b|\bupr\b|^(?:lower|upper)\b/i],
  ['se', /^(?:s\.?e\.?m?\.?|std\.? ?err(?:or)?\.?|standard error)\b/i],
  ['sd', /^(?:s\.?d\.?|std\.? ?dev(?:iation)?\.?|standard deviation)\b/i],
  ['n', /^(?:n|no\.?|number|sample size|count)\b(?!.*(?:mean|%))/i],
  ['estimate', /\bdiff|estimate|coef|^(?:β|b|md|or|hr|rr|d|g|log2?fc|effect(?: size)?|delta|Δ)\b|fold/i],
  ['mean', /^(?:means?|average|m|median)\b/i],
  [
    'group2',
    /^(?:\(j\)|group ?(?:b|2|ii|j)\b|treatment ?(?:b|2)\b|versus|vs\.?|reference|compared (?:with|to)|second group|condition ?(?:b|2)\b|level ?(?:b|2)\b)/i,
  ],
  ['comparison', /compar|contrast|\bpairs?\b|pairing|versus|\bvs\b/i],
  [
    'outcome',
    /outcome|end-?\s?point|measure|variable|behaviou?r|gene|transcript|region|trait|parameter|item|scale|protein|metabolite|marker|response|dependent|test\b|characteristic|source|effect|term|predictor|factor|feature|probe|SNP/i,
  ],
  [
    'group',
    /^(?:\(i\)|group|treatment|condition|arm|first group|level|dose|depth|variety|species|site|additive|diet|material|method)s?(?: ?(?:a|1|i)\b)?/i,
  ],
]

function plainKind(
  head: string,
  last: string,
  share: (test: (cell: string) => boolean) => number,
): Exclude<ColumnRole['kind'], 'p' | 'statistic' | 'stars' | 'call'> {
  // 'df', 'd.f.', 'DF', 'FG', 'df1', 'num df', 'den df'
  if (/^(?:num\s?|den(?:om)?\s?)?(?:d\.?f\.?|fg|degrees of freedom|ν)\d?\b|^(?:num|den)df/i.test(last))
    return 'df'
  const words = share((cell) => /[A-Za-z]{2,}|[A-Za-z]\d|^[A-Z]$/.test(cell))
  const numbers = share((cell) => readNumber(cell) !== null)
  for (const [kind, form] of PLAIN) {
    if (!form.test(last) && !form.test(head)) continue
    if (
      /^(?:comparison|group2?|outcome)$/.test(kind)
        ? words >= 0.4 || (kind !== 'outcome' && numbers < 0.6)
        : numbers >= 0.3 || kind === 'ci'
    )
      return kind
  }
  return 'other'
}

/** Two columns of names beside each other are the two groups of a comparison. */
function pairGroups(columns: readonly Column[], roles: ColumnRole[]): void {
  const compared = roles.flatMap((role, i) =>
    role.kind === 'comparison' && !isPairs(columns[i]?.cells ?? []) ? [i] : [],
  )
  const [one, two] = compared
  if (compared.length === 2 && one !== undefined && two === one + 1) {
    roles[one] = { kind: 'group' }
    roles[two] = { kind: 'group2' }
  }
  const groups = roles.flatMap((role, i) => (role.kind === 'group' ? [i] : []))
  const [a, b] = groups
  if (a !== undefined && b === a + 1 && !roles.some(({ kind }) => kind === 'group2' || kind === 'comparison'))
    roles[b] = { kind: 'group2' }
  roles.forEach((role, i) => {
    if (role.kind !== 'group' && role.kind !== 'outcome') return
    // a column of pairs under a head that says 'Treatment' or 'Effect'
    if (isPairs(columns[i]?.cells ?? [])) roles[i] = { kind: 'comparison' }
  })
  roles.forEach((role, i) => {
    if (role.kind !== 'df') return
    const head = columns[i]?.header ?? ''
    const since = roles.slice(0, i).findLastIndex(({ kind }) => kind === 'statistic')
    const earlier = roles.slice(since + 1, i).some(({ kind }) => kind === 'df')
    roles[i] = {
      kind: 'df',
      index: /den|2|error|resid/i.test(head) || (earlier && /^df$/i.test(head.trim())) ? 1 : 0,
    }
  })
}

function toP(head: string): ColumnRole {
  const own = lastPart(head)
  const scale: Scale = scaleOf(own) ?? scaleOf(head) ?? 'unknown'
  const procedure = scale === 'adjusted' ? (findProcedures(head)[0]?.procedure ?? namedShort(head)) : null
  return { kind: 'p', scale, procedure }
}

const scaleOf = (head: string): Scale | null =>
  RAW_HEAD.test(head) ? 'raw' : ADJUSTED_HEAD.test(head) ? 'adjusted' : null

/** 'p_bonf', 'p_holm', 'pB', 'p.adj (BH)' name the procedure by a short form. */
function namedShort(head: string): ClaimedProcedure | null {
  if (/bonf|^p[\s_]?B$/.test(head)) return 'bonferroni'
  if (/holm/i.test(head)) return 'holm'
  if (/\bbh\b/i.test(head)) return 'bh'
  if (/tukey|hsd/i.test(head)) return 'tukey'
  return /^q\b|qval|fdr/i.test(head) ? 'fdr' : null
}

/** Of a head in several lines only the lowest says what the column holds. */
export function lastPart(head: string): string {
  return head.split(' | ').pop()?.trim() ?? head
}

const isWords = (cells: readonly string[]): boolean => {
  const filled = cells.filter((cell) => cell.trim() !== '')
  return (
    filled.length > 0 &&
    filled.filter((cell) => /[A-Za-z]/.test(cell) && readP(cell) === null && !isMark(cell)).length /
      filled.length >=
      0.5
  )
}

/** Most cells name two groups. Hyphens without blanks do not count: they stand within names. */
function isPairs(cells: readonly string[]): boolean {
  const filled = cells.filter((cell) => cell.trim() !== '')
  const pairs = filled.filter(
    (cell) =>
      splitPair(cell) !== null && /\s(?:vs?\.?|versus|-|–|−|—|:|\/|minus|against)\s|[–—:/]|−/i.test(cell),
  )
  return filled.length > 0 && pairs.length / filled.length >= 0.6
}
