import { tail } from '../distributions/tail'
import { sum, type GroupMoments } from './groups'

/**
 * Sums of squares (`ss`), degrees of freedom and mean squares (`ms`) between and within groups; `f` and its upper
 * tail `p`; `mean` is that of all observations, `etaSquared` the share of the sum of squares between groups.
 */
export type Anova = {
  between: { ss: number; df: number; ms: number }
  within: { ss: number; df: number; ms: number }
  mean: number
  f: number
  p: number
  etaSquared: number
}

export type WelchAnova = { f: number; df1: number; df2: number; p: number }

/**
 * One-way analysis of variance from sizes, means and standard deviations of at least two groups; not all sd may be 0.
 * Assumes independent normal observations with one variance. Source: Fisher (1925), Statistical Methods for Research
 * Workers; from summary statistics by the definition of the sums of squares.
 */
export function computeAnova(groups: readonly GroupMoments[]): Anova {
  const total = sum(groups.map(({ n }) => n))
  // Means are taken from the first one, so that far from 0 no digits are lost.
  const origin = groups[0]?.mean ?? 0
  const shift = sum(groups.map(({ n, mean }) => n * (mean - origin))) / total
  const ssBetween = sum(groups.map(({ n, mean }) => n * (mean - origin - shift) ** 2))
  const ssWithin = sum(groups.map(({ n, sd }) => (n - 1) * sd * sd))
  const between = { ss: ssBetween, df: groups.length - 1, ms: ssBetween / (groups.length - 1) }
  const within = { ss: ssWithin, df: total - groups.length, ms: ssWithin / (total - groups.length) }
  const f = between.ms / within.ms
  const p = tail('F', f, [between.df, within.df])
  return { between, within, mean: origin + shift, f, p, etaSquared: ssBetween / (ssBetween + ssWithin) }
}

/**
 * Welch's analysis of variance, which lets the variances differ; null where a standard deviation is 0, as that group
 * would have infinite weight. df2 is fractional. Source: Welch (1951), Biometrika 38, 330–336.
 */
export function computeWelchAnova(groups: readonly GroupMoments[]): WelchAnova | null {
  if (groups.some(({ sd }) => sd === 0)) return null
  const k = groups.length
  const weights = groups.map(({ n, sd }) => n / (sd * sd))
  const total = sum(weights)
  const origin = groups[0]?.mean ?? 0
  const weightOf = (i: number) => weights[i] ?? 0
  const shift = sum(groups.map(({ mean }, i) => weightOf(i) * (mean - origin))) / total
  const between = sum(groups.map(({ mean }, i) => weightOf(i) * (mean - origin - shift) ** 2))
  const spread = sum(groups.map(({ n }, i) => (1 - weightOf(i) / total) ** 2 / (n - 1)))
  const f = between / (k - 1) / welchDivisor(k, spread)
  const df2 = (k * k - 1) / (3 * spread)
  return { f, df1: k - 1, df2, p: tail('F', f, [k - 1, df2]) }
}

/** What Welch's statistic is divided by: 1 + 2 (k − 2) Λ / (k² − 1), Λ = Σ (1 − w_i / W)² / (n_i − 1). */
export const welchDivisor = (k: number, spread: number): number => 1 + (2 * (k - 2) * spread) / (k * k - 1)
