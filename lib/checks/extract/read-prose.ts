import { printedInterval } from '../numbers/printed-interval'
import type { LaidOut, ReadReport, ReadStatistic } from '../types'
import { findCall, type WordedCall } from './grammar/call'
import { findKnown } from './grammar/comparison'
import { findFurther, findPair } from './grammar/pair'
import type { PrintedP } from './grammar/p-value'
import { findRole } from './grammar/role'
import { findOutcome } from './grammar/outcome'
import type { Names } from './names'
import { placeIn } from './places'
import { boundP, findReports, type SentenceReports } from './reports'
import type { Sentence } from './sentences'

export type Part = { reports: ReadReport[]; statistics: ReadStatistic[] }

/** Reports and statistics of the running text, with provisional ids. */
export function readProse(
  laidOut: LaidOut,
  sentences: readonly Sentence[],
  names: Names,
  alpha: number,
  controls: readonly string[] = [],
): Part {
  const known = { ...names, control: findControl(names, controls) }
  let before: ReadReport | undefined
  const parts = sentences
    .map(findReports)
    .filter((found): found is SentenceReports => found !== null)
    .map((found) => {
      const part = readSentence(laidOut, found, known, alpha)
      const reports = part.reports.map((report) => likeBefore(report, before, alpha))
      before = reports[reports.length - 1] ?? before
      return { ...part, reports }
    })
  return {
    reports: parts.flatMap(({ reports }) => reports),
    statistics: parts.flatMap(({ statistics }) => statistics),
  }
}

/** 'The same was true of …', 'So did …', 'Likewise': called as the result before it, unless the value speaks against it. */
function likeBefore(report: ReadReport, before: ReadReport | undefined, alpha: number): ReadReport {
  const alike =
    /^(?:the same (?:was|held|is|applie[sd])|likewise|similarly|so (?:was|were|did)|this was also|and so)\b/i
  if (report.called !== null || !before?.called || before.heading !== report.heading) return report
  if (!alike.test(report.sentence)) return report
  const against = before.called === 'significant' ? report.high >= alpha * 1.5 : report.high < alpha
  return against ? report : { ...report, called: before.called }
}

type Known = Names & { control: string | null }

function readSentence(laidOut: LaidOut, found: SentenceReports, names: Known, alpha: number): Part {
  const { sentence, reports, statistics } = found
  const { text, start, section, heading } = sentence
  const idOf = (kind: 'p' | 's', at: number) => `text-${kind}-${start + at}`
  const clauses = cutClauses(found)
  const calls = settleCalls(found, clauses, names, alpha)
  const pairs: ([string, string] | null)[] = []
  for (const clause of clauses)
    pairs.push(findComparison(clause, text, names, pairs[pairs.length - 1] ?? null))
  return {
    reports: reports.map(({ p, statistic }, i) => {
      const printed = toValue(p, alpha)
      const clause = clauses[i] ?? { before: '', after: '' }
      const own = statistic === null ? null : (statistics[statistic] ?? null)
      const comparison = pairs[i] ?? null
      const from = own && own.start < p.start && p.start - own.end < 6 ? own.start : p.start
      return {
        id: idOf('p', p.start),
        place: placeIn(laidOut.prose, start + Math.min(from, p.start), start + p.end),
        ...printed,
        scale: p.scale === 'unknown' ? scaleBeside(text, p) : p.scale,
        statistic: own ? idOf('s', own.start) : null,
        comparison,
        called: calls[i] ?? null,
        family: null,
        offset: start + p.start,
        section,
        heading,
        table: null,
        cell: null,
        sentence: text.trim(),
        outcome: findOutcome(clause.before, text, names),
        role: findRole(`${clause.before} ${clause.after}`, own, p.of, comparison !== null),
        oneSided: p.oneSided || isOneSided(text, p),
        markOnly: p.markOnly,
      }
    }),
    statistics: statistics.map((statistic, i) => {
      const report = reports.find((r) => r.statistic === i)
      const bounds = boundP(statistic)
      return {
        id: idOf('s', statistic.start),
        place: placeIn(laidOut.prose, start + statistic.start, start + statistic.end),
        test: statistic.test,
        df: statistic.df,
        value: statistic.value,
        decimals: statistic.decimals,
        pLow: bounds?.[0] ?? null,
        pHigh: bounds?.[1] ?? null,
        report: report ? idOf('p', report.p.start) : null,
        offset: start + statistic.start,
        table: null,
        sentence: text.trim(),
      }
    }),
  }
}

/** Value and interval; a mark 'n.s.' stands for 'above the level'. */
function toValue({ relation, value, decimals, markOnly }: PrintedP, alpha: number) {
  const printed = markOnly
    ? { relation, value: alpha, decimals: Math.max(2, String(alpha).length - 2) }
    : { relation, value, decimals }
  return { ...printed, ...printedInterval(printed.value, printed.decimals, printed.relation) }
}

/** 'one-tailed' beside the value, and no 'two-tailed' there. */
function isOneSided(text: string, p: PrintedP): boolean {
  const beside = text.slice(Math.max(0, p.start - 60), p.end + 30)
  return (
    /\b(?:one|1)[- ](?:sided|tailed)\b/i.test(beside) && !/\b(?:two|2)[- ](?:sided|tailed)\b/i.test(beside)
  )
}

type Clause = { before: string; after: string }

/** The words before each value back to the value before it, and after it to the next one or the end of its clause. */
function cutClauses({ sentence: { text }, reports, statistics }: SentenceReports): Clause[] {
  return reports.map(({ p, statistic }, i) => {
    const own = statistic === null ? undefined : statistics[statistic]
    const startsAt = Math.min(p.start, own?.start ?? p.start)
    const endsAt = Math.max(p.end, own?.end ?? p.end)
    const previous = reports[i - 1]
    const earlier = previous
      ? Math.max(previous.p.end, previous.statistic === null ? 0 : (statistics[previous.statistic]?.end ?? 0))
      : 0
    const next = reports[i + 1]
    const later = next
      ? Math.min(
          next.p.start,
          next.statistic === null ? Infinity : (statistics[next.statistic]?.start ?? Infinity),
        )
      : text.length
    return {
      before: text.slice(Math.min(earlier, startsAt), startsAt),
      after: text.slice(endsAt, Math.max(endsAt, later)),
    }
  })
}

/**
 * What each value is called. Its own clause counts first; a clause without a verb takes the call of the clause
 * before it, or of what follows the last value. Words of mere direction ('higher than') and inherited calls count
 * only where the value itself does not speak against them.
 */
function settleCalls(
  { reports }: SentenceReports,
  clauses: readonly Clause[],
  names: Names,
  alpha: number,
): ReadReport['called'][] {
  const hidden = [...names.groups, ...names.outcomes].map(({ name }) => name)
  const own = clauses.map(({ before }) => findCall(before, hidden))
  const tail = findCall(clauses[clauses.length - 1]?.after ?? '', hidden)
  let last: WordedCall = null
  return reports.map(({ p }, i) => {
    const clause = clauses[i]
    const worded = own[i] ?? null
    const earlier: WordedCall = last
    if (worded) last = worded
    if (p.markOnly) return 'not significant'
    // the value heads its clause: 'p = .02 for A', or the verb follows: '(p = .02) differed'
    const next = clause?.after.split(/[,;(]/)[0] ?? ''
    const following: WordedCall = worded && !PREDICATE.test(next) ? null : findCall(next, hidden)
    if (worded?.strength === 'strong') return worded.call
    // 'The difference between A and B (p = .012) was not significant': the verb decides, not the noun before it
    if (worded && following?.strength === 'strong') {
      last = following
      return following.call
    }
    const candidates = worded ? [worded] : [following, earlier, tail]
    const call = candidates.find((other) => other !== null && !isAgainst(other.call, p, alpha))
    return call?.call ?? null
  })
}

/** The verb of the clause follows the bracket with the value: ') was not significant', ') did not reach'. */
const PREDICATE = /^\s*\)\s*(?:was|were|is|are|did|does|do|failed|fails|remained|reached|missed)\b/

/** Whether the printed value itself contradicts the call. */
function isAgainst(call: 'significant' | 'not significant', p: PrintedP, alpha: number): boolean {
  const { low, high } = toValue(p, alpha)
  return call === 'significant' ? low >= alpha || high > alpha * 1.5 : high < alpha
}

/** The pair that a clause compares: names known from tables first, else by its own grammar. */
function findComparison(
  { before, after }: Clause,
  text: string,
  names: Known,
  previous: [string, string] | null,
): [string, string] | null {
  const label = /^\s*(?:for|in|between)\s[^,;()]*/i.exec(after)?.[0] ?? ''
  for (const stretch of [before, label]) {
    const [a, b, more] = findKnown(stretch, names.groups)
    if (a && b && !more) return [a, b]
  }
  const pair = findPair(before) ?? findPair(label)
  if (pair) return pair
  const [only, other] = findKnown(before, names.groups)
  if (previous) {
    // '… and C', 'but not from C'
    const further = only && !other ? only : findFurther(before)
    if (
      further &&
      !previous.some((name) => name.toLowerCase() === further.toLowerCase()) &&
      findFurther(before)
    )
      return joinFurther(previous, further, before)
  }
  const [a, b, more] = findKnown(text, names.groups)
  const isControl = (name: string) => name.toLowerCase() === names.control?.toLowerCase()
  // one treatment alone, where all are compared with one control
  const alone: [string, string] | null =
    only && !other && names.control && !isControl(only) ? [only, names.control] : null
  // '… for brick (p = .37), nor for turf (p = .70)': two treatments of one sentence are no pair there
  return a && b && !more && (!alone || isControl(a) || isControl(b)) ? [a, b] : alone
}

/** A further group stands against the control of the pair before, or, after 'than' or 'from', against its first. */
function joinFurther(previous: [string, string], further: string, clause: string): [string, string] {
  const control = previous.find((name) =>
    /\b(?:control|placebo|vehicle|sham|untreated|reference|baseline)s?\b/i.test(name),
  )
  return control && !/\b(?:than|from|to|with)\b/i.test(clause) ? [further, control] : [previous[0], further]
}

/** The one group with which all others are compared: in every pair of the tables, and named as such or in three pairs. */
function findControl(names: Names, stated: readonly string[]): string | null {
  const [first] = names.shared
  if (names.shared.length === 1 && first) return first
  return names.groups.length === 0 ? null : (stated[0] ?? null)
}

/** 'p = .03, Bonferroni-corrected', '(p = .03, uncorrected)', 'after Bonferroni correction (p = .03)'. */
function scaleBeside(text: string, p: PrintedP): ReadReport['scale'] {
  const after = text.slice(p.end, p.end + 60)
  const before = text.slice(Math.max(0, p.start - 90), p.start)
  if (/^\s*[,(]?\s*\(?(?:unadjusted|uncorrected|nominal|raw|unc\.)/i.test(after)) return 'raw'
  if (
    /^\s*[,(]?\s*\(?(?:after\s(?:\w+\s)?)?(?:[A-ZŠ][\w–-]*[\s-])?(?:adjusted|corrected|correction|adjustment|FDR)/.test(
      after,
    )
  )
    return 'adjusted'
  if (/\b(?:before|without)\s(?:\w+[\s-]){0,3}(?:correction|adjustment)[^.;()]{0,40}\(?$/i.test(before))
    return 'raw'
  if (/\bafter\s(?:\w+[\s–-]){0,4}(?:correction|adjustment)[^.;()]{0,40}\(?$/i.test(before)) return 'adjusted'
  return 'unknown'
}
