import type { SummaryGroup } from '../summary/groups'
import type { SummaryProcedure } from '../summary/simultaneous'
import type { Summary } from '../summary/summarize'
import { rNumber, rNumbers, rString, rStrings } from './literals'
import { writeScript, type RFunctions } from './script'

/**
 * A summary of groups as an R script that computes again, from the printed sizes, means and spreads alone, the analysis
 * of variance, Welch's, every comparison by every procedure with its joint limits, and the ranges over the rounding of
 * the pooled tests; and prints "agrees" or what differs (see `writeScript`). `groups` as they were given to `summarize`.
 */
export function writeSummaryScript(groups: readonly SummaryGroup[], summary: Summary): string {
  const procedures = summary.comparisons[0]?.adjusted.map((one) => one.procedure) ?? []
  const functions: RFunctions[] = ['studentized-range']
  if (procedures.includes('dunnett')) functions.push('dunnett')
  const ranged = summary.bounds !== null
  return writeScript({
    title: 'Assize. Recomputation of a comparison of groups.',
    facts: [
      `${groups.length} groups, level ${summary.alpha}, joint confidence ${summary.confidence}`,
      ...(ranged
        ? [
            'Ranges over the rounding are computed again for the pooled tests and what follows from each by itself;',
            'those of F, of Welch, of Games-Howell and of Holm are not.',
          ]
        : []),
      'It helps a qualified statistician and decides nothing. What was misread is computed as it was read.',
    ],
    functions,
    body: [
      writeGroups(groups, summary),
      computations,
      writeOmnibus(summary),
      writeTests(summary),
      ...procedures.map((procedure) => writeProcedure(procedure, summary)),
      ...(ranged ? [writeBox(groups), ...procedures.map((procedure) => writeRange(procedure, summary))] : []),
    ].join('\n\n'),
  })
}

function writeGroups(groups: readonly SummaryGroup[], summary: Summary): string {
  const at = (name: string) => groups.findIndex((one) => one.group === name) + 1
  const isSd = groups.every((one) => one.sd !== undefined)
  return [
    '# the groups as they are printed',
    `group <- ${rStrings(groups.map((one) => one.group))}`,
    `n <- ${rNumbers(groups.map((one) => one.n))}`,
    `mean <- ${rNumbers(groups.map((one) => one.mean))}`,
    `spread <- ${rNumbers(groups.map((one) => one.sd ?? one.se ?? NaN))}`,
    `sd <- spread${isSd ? '' : ' * sqrt(n)  # standard errors are printed'}`,
    `first <- ${rNumbers(summary.comparisons.map((one) => at(one.first)))}`,
    `second <- ${rNumbers(summary.comparisons.map((one) => at(one.second)))}`,
    `alpha <- ${rNumber(summary.alpha)}`,
    `confidence <- ${rNumber(summary.confidence)}`,
  ].join('\n')
}

const computations = `
k <- length(n)
df <- sum(n) - k
ms_within <- sum((n - 1) * sd^2) / df
grand <- sum(n * mean) / sum(n)
ms_between <- sum(n * (mean - grand)^2) / (k - 1)
f <- ms_between / ms_within

w <- n / sd^2
centre <- sum(w * mean) / sum(w)
spread_of_weights <- sum((1 - w / sum(w))^2 / (n - 1))
welch_f <- (sum(w * (mean - centre)^2) / (k - 1)) / (1 + 2 * (k - 2) / (k^2 - 1) * spread_of_weights)
welch_df2 <- (k^2 - 1) / (3 * spread_of_weights)

difference <- mean[second] - mean[first]
unit <- 1 / n[first] + 1 / n[second]
se <- sqrt(ms_within * unit)
t <- difference / se
p <- 2 * pt(-abs(t), df)
parts <- sd^2 / n
welch_se <- sqrt(parts[first] + parts[second])
welch_t <- difference / welch_se
welch_df <- welch_se^4 / (parts[first]^2 / (n[first] - 1) + parts[second]^2 / (n[second] - 1))
welch_p <- 2 * pt(-abs(welch_t), welch_df)
tests <- length(t)`.trim()

function writeOmnibus({ anova, welch }: Summary): string {
  return [
    `check("F", ${rNumbers([anova.f, anova.within.df])}, c(f, df))`,
    `check("p of F", ${rNumber(anova.p)}, pf(f, k - 1, df, lower.tail = FALSE))`,
    `check("eta squared", ${rNumber(anova.etaSquared)}, f * (k - 1) / (f * (k - 1) + df))`,
    ...(welch
      ? [
          `check("Welch F", ${rNumbers([welch.f, welch.df2])}, c(welch_f, welch_df2))`,
          `check("p of Welch F", ${rNumber(welch.p)}, pf(welch_f, k - 1, welch_df2, lower.tail = FALSE))`,
        ]
      : []),
  ].join('\n')
}

function writeTests({ comparisons }: Summary): string {
  const of = (pick: (one: Summary['comparisons'][number]) => number | null) => rNumbers(comparisons.map(pick))
  const shownWelch = comparisons.every((one) => one.welch !== null)
  return [
    `check("differences", ${of((one) => one.difference)}, difference)`,
    `check("pooled t", ${of((one) => one.pooled.t)}, t)`,
    `check("pooled p", ${of((one) => one.pooled.p)}, p)`,
    ...(shownWelch
      ? [
          `check("Welch t", ${of((one) => one.welch?.t ?? null)}, welch_t)`,
          `check("Welch df", ${of((one) => one.welch?.df ?? null)}, welch_df)`,
          `check("Welch p", ${of((one) => one.welch?.p ?? null)}, welch_p)`,
        ]
      : []),
  ].join('\n')
}

/** The adjusted p of one t, of the procedures that take each comparison by itself. */
const OF_T: Partial<Record<SummaryProcedure, string>> = {
  lsd: '2 * pt(-t, df)',
  bonferroni: 'pmin(1, tests * 2 * pt(-t, df))',
  sidak: '-expm1(tests * log1p(-2 * pt(-t, df)))',
  tukey: 'sapply(t, function(one) tukey_p(one, k, df))',
  scheffe: 'pf(t^2 / (k - 1), k - 1, df, lower.tail = FALSE)',
  dunnett: 'sapply(t, function(one) dunnett_p(one, sqrt(n[second] / (n[second] + n[first])), df))',
}

/** Half the width of the joint limits over the standard error, held against its error rate. */
const LEVEL_OF_LIMITS: Partial<Record<SummaryProcedure, string>> = {
  ...OF_T,
  'games-howell': 'mapply(function(one, own) tukey_p(one, k, own), t, welch_df)',
}

function writeProcedure(procedure: SummaryProcedure, { comparisons }: Summary): string {
  const shown = comparisons.map((one) => one.adjusted.find((each) => each.procedure === procedure) ?? null)
  const name = rString(procedure)
  const byT = OF_T[procedure]
  const computed =
    procedure === 'holm'
      ? 'p.adjust(p, "holm")'
      : procedure === 'games-howell'
        ? 'mapply(function(one, own) tukey_p(one, k, own), abs(welch_t), welch_df)'
        : `local({ t <- abs(t); ${byT ?? 'NA'} })`
  const lines = [`check(${name}, ${rNumbers(shown.map((one) => one?.p ?? null))}, ${computed}, 1e-6)`]
  const level = LEVEL_OF_LIMITS[procedure]
  if (level !== undefined && shown.every((one) => one?.interval)) {
    const half = shown.map((one) => (one?.interval ? (one.interval.high - one.interval.low) / 2 : null))
    const error = procedure === 'games-howell' ? 'welch_se' : 'se'
    lines.push(
      `check(paste(${name}, "limits"), rep(1 - confidence, tests), local({ t <- ${rNumbers(half)} / ${error}; ${level} }), 1e-6)`,
    )
  }
  return lines.join('\n')
}

function writeBox(groups: readonly SummaryGroup[]): string {
  return [
    '# the ranges over the rounding of the print',
    `mean_half <- ${rNumbers(groups.map((one) => (one.meanDecimals === undefined ? 0 : 0.5 * 10 ** -one.meanDecimals)))}`,
    `spread_half <- ${rNumbers(groups.map((one) => (one.spreadDecimals === undefined ? 0 : 0.5 * 10 ** -one.spreadDecimals)))}`,
    'low_sd <- pmax(0, spread - spread_half) * sd / spread',
    'high_sd <- (spread + spread_half) * sd / spread',
    'reach <- mean_half[first] + mean_half[second]',
    'least <- pmax(0, abs(difference) - reach) / sqrt(sum((n - 1) * high_sd^2) / df * unit)',
    'most <- (abs(difference) + reach) / sqrt(sum((n - 1) * low_sd^2) / df * unit)',
  ].join('\n')
}

function writeRange(procedure: SummaryProcedure, { comparisons }: Summary): string {
  const level = OF_T[procedure]
  if (level === undefined) return ''
  const shown = comparisons.map(
    (one) => one.bounds?.adjusted.find((each) => each.procedure === procedure)?.p ?? null,
  )
  const name = rString(procedure)
  return [
    `check(paste(${name}, "low ends"), ${rNumbers(shown.map((one) => one?.low ?? null))}, local({ t <- most; ${level} }), 1e-6)`,
    `check(paste(${name}, "high ends"), ${rNumbers(shown.map((one) => one?.high ?? null))}, local({ t <- least; ${level} }), 1e-6)`,
  ].join('\n')
}
