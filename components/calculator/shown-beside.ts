import { fitPrinted } from '@/lib/checks/calculate/fit-printed'
import type { Reading } from '@/lib/checks/calculate/calculate'
import type { Entry } from '@/lib/checks/calculate/entry'
import { familyWiseError } from '@/lib/checks/sensitivity/family-wise-error'
import type { Fit } from '@/lib/checks/types'
import { readBetween, readWhole } from './read-settings'

/** Beyond these the integrals and the search take longer than a reader waits. */
export const MOST_CORRELATED = 5000
export const MOST_GROUPS = 100
export const MOST_COMPARED = 2000
const FURTHEST = 400

/** The error rate under a common correlation; null where it is not shown. */
export function getCorrelated(m: number, alpha: number, rho: string): { rho: number; error: number } | null {
  const { value } = readBetween(rho, 0, 1)
  if (value === null || m > MOST_CORRELATED) return null
  return { rho: value, error: familyWiseError(alpha, m, { rho: value }) }
}

/** The error rate of all pairs of the groups that are typed, or whose pairs m counts; null where it is not shown. */
export function getPairs(m: number, alpha: number, typed: string): { groups: number; error: number } | null {
  const groups = readWhole(typed, 2).value ?? findGroups(m)
  if (groups === null || groups > MOST_GROUPS) return null
  return { groups, error: familyWiseError(alpha, m, { allPairsOf: groups }) }
}

/** k where m is the number of pairs of k groups, else null. */
export function findGroups(m: number): number | null {
  const k = Math.round((1 + Math.sqrt(1 + 8 * m)) / 2)
  return k >= 3 && (k * (k - 1)) / 2 === m ? k : null
}

/** What reproduces the printed adjusted values, with m up to `upTo`; null where they are too many to compare. */
export function getFits(
  entries: readonly Entry[],
  reading: Reading,
): { compared: number; found: readonly Fit[]; upTo: number } | null {
  const compared = entries.filter((entry) => entry.adjusted !== null).length
  if (compared > MOST_COMPARED) return null
  const upTo = Math.max(compared, Math.min(FURTHEST, Math.max(60, entries.length)))
  return { compared, found: fitPrinted(entries, reading, { mMax: upTo }).fits, upTo }
}
