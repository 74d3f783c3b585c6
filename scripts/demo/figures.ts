import { adjust, tail } from '@/lib/checks'
import type { Procedure } from '@/lib/checks/vocabulary'

export type Group = { name: string; n: number; mean: number; sd: number }

export type Pair = {
  a: string
  b: string
  difference: number
  se: number
  df: number
  t: number
  raw: number
}

/** All pairs of groups by t tests on the pooled variance; differences a − b. */
export function comparePairs(groups: readonly Group[]): Pair[] {
  const { df, variance } = pool(groups)
  return groups.flatMap((a, i) => groups.slice(i + 1).map((b) => compare(a, b, df, variance)))
}

/** Each group against the first. */
export function compareWithFirst(groups: readonly Group[]): Pair[] {
  const { df, variance } = pool(groups)
  const [control, ...others] = groups
  return control ? others.map((other) => compare(other, control, df, variance)) : []
}

/** The one-way analysis of variance of the groups. */
export function compareAll(groups: readonly Group[]): { df1: number; df2: number; F: number; p: number } {
  const { df, variance } = pool(groups)
  const total = groups.reduce((sum, g) => sum + g.n, 0)
  const grand = groups.reduce((sum, g) => sum + g.n * g.mean, 0) / total
  const between = groups.reduce((sum, g) => sum + g.n * (g.mean - grand) ** 2, 0) / (groups.length - 1)
  const F = between / variance
  return { df1: groups.length - 1, df2: df, F, p: tail('F', F, [groups.length - 1, df]) }
}

export function adjustPairs(pairs: readonly Pair[], procedure: Procedure, m?: number): number[] {
  return adjust(
    procedure,
    pairs.map((pair) => pair.raw),
    m === undefined ? {} : { m },
  )
}

function pool(groups: readonly Group[]): { df: number; variance: number } {
  const df = groups.reduce((sum, g) => sum + g.n - 1, 0)
  return { df, variance: groups.reduce((sum, g) => sum + (g.n - 1) * g.sd ** 2, 0) / df }
}

function compare(a: Group, b: Group, df: number, variance: number): Pair {
  const difference = a.mean - b.mean
  const se = Math.sqrt(variance * (1 / a.n + 1 / b.n))
  const t = difference / se
  return { a: a.name, b: b.name, difference, se, df, t, raw: tail('t', t, [df]) }
}

/** A number as it is printed: a true minus sign, never '−0.00'. */
export function fixed(value: number, decimals: number): string {
  const text = Math.abs(value).toFixed(decimals)
  return value < 0 && Number(text) !== 0 ? `−${text}` : text
}

/** `p = 0.012`, or `p < 0.001` below that. */
export function printP(p: number, decimals = 3): string {
  const least = 10 ** -decimals
  return p < least ? `p < ${least.toFixed(decimals)}` : `p = ${p.toFixed(decimals)}`
}

/** The cell of a table: `0.012`, or `<0.001`. */
export function cellP(p: number, decimals = 3): string {
  const least = 10 ** -decimals
  return p < least ? `<${least.toFixed(decimals)}` : p.toFixed(decimals)
}

export function printT(pair: Pair): string {
  return `t(${pair.df}) = ${fixed(pair.t, 2)}`
}
