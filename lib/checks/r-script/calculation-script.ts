import type { Calculation, Reading } from '../calculate/calculate'
import { keepTaken } from '../calculate/calculate'
import type { Entry } from '../calculate/entry'
import type { AdjustOptions } from '../procedures/adjust'
import { procedureTable } from '../procedures/table'
import { familyWiseError } from '../sensitivity/family-wise-error'
import type { ProcedurePower } from '../sensitivity/compare-power'
import type { Fit } from '../types'
import { rComment, rLogical, rNumber, rNumbers, rString, rStrings, rVector } from './literals'
import { writeScript, type RFunctions } from './script'

/**
 * What is shown beside the adjusted values, each null where it is not: the error rate under a common correlation and
 * of all pairs of groups, the power of one comparison by procedure (`groups` where the design has them), and what reproduces printed adjusted
 * values with m up to `upTo`.
 */
export type ShownBeside = {
  correlated: { rho: number; error: number } | null
  pairs: { groups: number; error: number } | null
  power: {
    design: 'independent' | 'pairs' | 'many-to-one' | 'paired'
    n: number
    effect: number
    groups: number | null
    rows: readonly ProcedurePower[]
  } | null
  fits: { found: readonly Fit[]; upTo: number } | null
}

/**
 * A calculation as an R script that computes again, from the printed numbers alone, the range of every p-value, the
 * adjusted ranges and decisions by each procedure, how far they hold and the error rates, and prints "agrees" or what
 * differs (see `writeScript`). `options` as they were given to `calculate`.
 */
export function writeCalculationScript(
  entries: readonly Entry[],
  calculation: Calculation,
  options: { alpha: number; reading: Reading; family: AdjustOptions },
  beside: ShownBeside,
): string {
  const { alpha, reading, family } = options
  const results = calculation.results.filter((one) => one.refused === null)
  const inOrder = results.some(({ procedure }) => procedureTable[procedure].adjustInOrder !== null)
  const functions: RFunctions[] = ['tails', 'procedures']
  if (inOrder) functions.push('ordered')
  if (beside.pairs || beside.power?.design === 'pairs') functions.push('studentized-range')
  if (beside.power?.design === 'many-to-one') functions.push('dunnett')
  if (beside.fits) functions.push('fitting')
  return writeScript({
    title: 'Assize. Recomputation of a list of tests.',
    facts: [
      `${entries.length} tests, m = ${calculation.m}, level ${alpha}`,
      reading === 'exact'
        ? 'Values count as exact numbers.'
        : 'Every value stands for the range of its rounding.',
      'It helps a qualified statistician and decides nothing. What was misread is computed as it was read.',
    ],
    functions,
    body: [
      writeEntries(entries, reading),
      writeRanges,
      `check("raw p, low ends", ${rNumbers(calculation.raw.map((one) => one.low))}, low)`,
      `check("raw p, high ends", ${rNumbers(calculation.raw.map((one) => one.high))}, high)`,
      `m <- ${calculation.m}\nalpha <- ${rNumber(alpha)}`,
      checkDecisions,
      ...results.map((result) => writeResult(result, family)),
      writeSurvives(calculation),
      ...writeErrors(calculation.m, alpha, beside),
      ...(beside.fits ? [writeFits(entries, beside.fits)] : []),
    ].join('\n\n'),
  })
}

function writeEntries(entries: readonly Entry[], reading: Reading): string {
  const printed = entries.flatMap(({ statistic }, i) => {
    if (!statistic) return []
    const { test, df, value, decimals, sides, alone } = statistic
    return [
      `  list(at = ${i + 1}, test = ${rString(test)}, value = ${rNumber(value)}, decimals = ${decimals}, df = ${rStrings(df.map(String))}, sides = ${rString(sides)}, alone = ${rLogical(alone)})`,
    ]
  })
  const ofP = (entry: Entry) => entry.statistic?.alone !== true
  return [
    '# the tests as they are printed; NA where only a statistic is',
    `name <- ${rStrings(entries.map((entry) => entry.name))}`,
    `relation <- ${rStrings(entries.map((entry) => entry.relation))}`,
    `value <- ${rNumbers(entries.map((entry) => (ofP(entry) ? entry.value : null)))}`,
    `decimals <- ${rNumbers(entries.map((entry) => (ofP(entry) ? entry.decimals : null)))}`,
    `statistics <- ${printed.length === 0 ? 'list()' : `list(\n${printed.join(',\n')}\n)`}`,
    `exact <- ${rLogical(reading === 'exact')}`,
  ].join('\n')
}

const writeRanges = `
# the range of p that each stands for
half <- if (exact) rep(0, length(value)) else 0.5 * 10^-decimals
low <- ifelse(relation %in% c("<", "<="), 0, ifelse(relation %in% c(">", ">="), value, pmax(0, value - half)))
high <- ifelse(relation %in% c("<", "<="), value, ifelse(relation %in% c(">", ">="), 1, pmin(1, value + half)))
tiny <- !exact & !is.na(decimals) & decimals > 300 & relation == "="
low[tiny] <- 0
high[tiny] <- 1e-300

# one-sided: the upper tail, or the lower one
p_directed <- function(test, value, df, sides) {
  df <- as.numeric(df)
  if (test == "r") value <- max(-1, min(1, value))
  statistic <- switch(test, t = value, z = value, r = value * sqrt(df[1] / (1 - value^2)))
  upper <- sides == "greater"
  if (test == "z") pnorm(statistic, lower.tail = !upper) else pt(statistic, df[1], lower.tail = !upper)
}

for (one in statistics) {
  if (exact && !one$alone && relation[one$at] == "=") next
  ends <- if (exact && one$alone) c(one$value, one$value) else rounding(one$value, one$decimals)
  if (one$sides == "two-sided") {
    range <- if (exact && one$alone) rep(p_value(one$test, one$value, as.numeric(one$df)), 2)
             else p_range(one$test, one$value, one$decimals, one$df)
  } else {
    range <- sort(sapply(ends, function(end) p_directed(one$test, end, one$df, one$sides)))
  }
  if (one$alone) {
    low[one$at] <- range[1]
    high[one$at] <- range[2]
  } else if (max(low[one$at], range[1]) <= min(high[one$at], range[2])) {
    low[one$at] <- max(low[one$at], range[1])
    high[one$at] <- min(high[one$at], range[2])
  }
}`.trim()

const checkDecisions = `
# Decisions: TRUE and FALSE for certain, NA where the rounding leaves it open. Where an end of the range falls on the
# level itself, the last bit decides, which two machines may round apart: such a one is taken as it is shown.
check_decisions <- function(what, shown, bounds, level) {
  decided <- ifelse(bounds$high <= level * (1 + 1e-12), TRUE, ifelse(bounds$low >= level, FALSE, NA))
  on_edge <- abs(bounds$low - level) <= 1e-12 * level
  check(what, shown, ifelse(on_edge, shown, decided))
}`.trim()

function writeResult(result: Calculation['results'][number], family: AdjustOptions): string {
  const { procedure, adjusted, significant, level } = result
  const { label, adjustInOrder, takes } = procedureTable[procedure]
  const { weights, transitions, groups } = keepTaken(takes, family)
  const call =
    adjustInOrder === null
      ? `adjust_bounds(${rString(procedure)}, low, high, m, alpha)`
      : [
          `adjust_in_order_bounds(${rString(procedure)}, low, high, m = m`,
          ...(weights ? [`weights = ${rNumbers(weights)}`] : []),
          ...(transitions
            ? [`graph = matrix(${rNumbers(transitions.flat())}, ${transitions.length}, byrow = TRUE)`]
            : []),
          ...(groups === undefined ? [] : [`groups = ${groups}`]),
        ].join(', ') + ')'
  const name = rString(label)
  return [
    rComment(label),
    `bounds <- ${call}`,
    `check(paste0(${name}, ", low ends"), ${rNumbers(adjusted.map((one) => one.low))}, bounds$low)`,
    `check(paste0(${name}, ", high ends"), ${rNumbers(adjusted.map((one) => one.high))}, bounds$high)`,
    `level <- ${rNumber(level)}`,
    `check_decisions(paste0(${name}, ", significant"), ${rVector(significant.map(rLogical), 'numeric(0)')}, bounds, level)`,
  ].join('\n')
}

function writeSurvives({ survives }: Calculation): string {
  const lines = Object.entries(survives).flatMap(([procedure, list]) => [
    `check("significant up to m, ${procedure}, for certain", ${rNumbers(list.map((one) => one.certain))}, kept_${procedure}(high))`,
    `check("significant up to m, ${procedure}, at best", ${rNumbers(list.map((one) => one.possible))}, kept_${procedure}(low))`,
  ])
  return [
    `
# the largest m at which each is significant; members that join are larger than all that are listed
kept_bonferroni <- function(p) floor(alpha * (1 + 1e-12) / p)
by_rank <- function(p, find) {
  up <- order(p)
  kept <- find(p[up], seq_along(p))
  kept[kept < length(p)] <- 0
  kept[order(up)]
}
kept_holm <- function(p) by_rank(p, function(p, rank) cummin(kept_bonferroni(p) + rank - 1))
kept_bh <- function(p) by_rank(p, function(p, rank) rev(cummax(rev(floor(rank * alpha * (1 + 1e-12) / p)))))`.trim(),
    ...lines,
  ].join('\n')
}

function writeErrors(m: number, alpha: number, { correlated, pairs, power }: ShownBeside): string[] {
  const lines = [
    '# the error rate without correction',
    `check("independent tests", ${rNumber(familyWiseError(alpha, m))}, -expm1(m * log1p(-alpha)))`,
    `check("any dependence", ${rNumber(Math.min(1, m * alpha))}, min(1, m * alpha))`,
  ]
  if (correlated && correlated.rho > 0 && correlated.rho < 1 && m > 1) {
    lines.push(
      `rho <- ${rNumber(correlated.rho)}`,
      'critical <- qnorm(alpha / 2, lower.tail = FALSE)',
      'inside <- function(z) (pnorm((critical - sqrt(rho) * z) / sqrt(1 - rho)) -',
      '                       pnorm((-critical - sqrt(rho) * z) / sqrt(1 - rho)))^m * dnorm(z)',
      `check("equal correlation", ${rNumber(correlated.error)},`,
      '      1 - integrate(inside, -Inf, Inf, rel.tol = 1e-10, subdivisions = 1000)$value, 1e-6)',
    )
  }
  if (pairs) {
    lines.push(
      `check("all pairs of ${pairs.groups} groups", ${rNumber(pairs.error)}, tukey_p(qnorm(alpha / 2, lower.tail = FALSE), ${pairs.groups}, Inf), 1e-6)`,
    )
  }
  if (power) lines.push(...writePower(power))
  return [lines.join('\n')]
}

/** Noncentral t at the critical value of each procedure that has one; what goes by steps is not computed again. */
function writePower({ design, n, effect, groups, rows }: NonNullable<ShownBeside['power']>): string[] {
  const paired = design === 'paired'
  const df = paired ? `${n} - 1` : `${groups ?? 2} * (${n} - 1)`
  const critical: Partial<Record<ProcedurePower['procedure'], string>> = {
    none: 'qt(alpha / 2, df, lower.tail = FALSE)',
    bonferroni: 'qt(alpha / tests / 2, df, lower.tail = FALSE)',
    sidak: 'qt(-expm1(log1p(-alpha) / tests) / 2, df, lower.tail = FALSE)',
    scheffe: `sqrt((${groups} - 1) * qf(alpha, ${groups} - 1, df, lower.tail = FALSE))`,
  }
  const tests =
    groups === null ? 'm' : design === 'pairs' ? `${groups} * (${groups} - 1) / 2` : `${groups} - 1`
  return [
    '# the power of one comparison; procedures that go by steps are not computed again here',
    `df <- ${df}`,
    `tests <- ${tests}`,
    `shift <- ${rNumber(effect)} * sqrt(${paired ? n : `${n} / 2`})`,
    'power_at <- function(critical) {',
    '  pt(critical, df, shift, lower.tail = FALSE) + pt(-critical, df, shift)',
    '}',
    ...rows.flatMap(({ procedure, power, criticalValue }) => {
      const computed = critical[procedure]
      if (power !== null && computed !== undefined) {
        return [`check("power, ${procedure}", ${rNumber(power)}, power_at(${computed}), 1e-6)`]
      }
      if (power === null || criticalValue === null) return []
      const error =
        procedure === 'tukey'
          ? `tukey_p(${rNumber(criticalValue)}, ${groups}, df)`
          : `dunnett_p(${rNumber(criticalValue)}, rep(sqrt(0.5), ${groups} - 1), df)`
      return [
        `check("critical value, ${procedure}", alpha, ${error}, 1e-6)`,
        `check("power, ${procedure}", ${rNumber(power)}, power_at(${rNumber(criticalValue)}), 1e-6)`,
      ]
    }),
  ]
}

function writeFits(entries: readonly Entry[], { found, upTo }: NonNullable<ShownBeside['fits']>): string {
  const both = entries.flatMap((entry, i) =>
    entry.adjusted ? [{ at: i + 1, adjusted: entry.adjusted }] : [],
  )
  return [
    '# which procedures reproduce the printed adjusted values',
    `compared <- ${rNumbers(both.map(({ at }) => at))}`,
    `printed_low <- ${rNumbers(both.map(({ adjusted }) => adjusted.low))}`,
    `printed_high <- ${rNumbers(both.map(({ adjusted }) => adjusted.high))}`,
    `check_fits("printed adjusted values", ${rStrings(found.map((fit) => `${fit.procedure} ${fit.m}`))},`,
    '           Map(c, printed_low, printed_high), Map(c, low[compared], high[compared]),',
    `           ${upTo})`,
  ].join('\n')
}
