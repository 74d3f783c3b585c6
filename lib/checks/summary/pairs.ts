import { tail } from '../distributions/tail'
import type { GroupMoments } from './groups'

/** Two groups to compare; the difference is the second's mean less the first's. */
export type Pair = { first: GroupMoments; second: GroupMoments }

export type TTest = { se: number; t: number; df: number; p: number }

/** Every pair in input order: (1, 2), (1, 3), …, (2, 3), …; with the name of a `control`, each other group less it. */
export function listPairs(groups: readonly GroupMoments[], control: string | null): Pair[] {
  if (control === null) {
    return groups.flatMap((first, i) => groups.slice(i + 1).map((second) => ({ first, second })))
  }
  const first = groups.find(({ group }) => group === control)
  if (first === undefined) throw new RangeError(`no group is called '${control}'`)
  return groups.filter((each) => each !== first).map((second) => ({ first, second }))
}

/**
 * The two-sided t test of a pair with the variance `ms` > 0 pooled over all groups on `df` degrees of freedom.
 * Assumes normal observations with one variance.
 */
export function testPooled({ first, second }: Pair, ms: number, df: number): TTest {
  const se = Math.sqrt(ms * (1 / first.n + 1 / second.n))
  const t = (second.mean - first.mean) / se
  return { se, t, df, p: tail('t', t, [df]) }
}

/**
 * Welch's two-sided t test of a pair with the Welch–Satterthwaite df; null where both standard deviations are 0.
 * Source: Welch (1947), Biometrika 34, 28–35.
 */
export function testWelch({ first, second }: Pair): TTest | null {
  const [a, b] = [first.se ** 2, second.se ** 2]
  const se = Math.sqrt(a + b)
  if (se === 0) return null
  const t = (second.mean - first.mean) / se
  const df = welchDf(a / (a + b), first.n, second.n)
  return { se, t, df, p: tail('t', t, [df]) }
}

/**
 * Welch–Satterthwaite degrees of freedom by the first group's share of the squared standard error, `share` in [0, 1]:
 * 1 / (share² / (n1 − 1) + (1 − share)² / (n2 − 1)); never below the smaller n − 1.
 */
export function welchDf(share: number, n1: number, n2: number): number {
  const df = 1 / ((share * share) / (n1 - 1) + ((1 - share) * (1 - share)) / (n2 - 1))
  return Math.max(df, Math.min(n1, n2) - 1)
}
