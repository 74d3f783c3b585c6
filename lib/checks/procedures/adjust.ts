import type { Procedure } from '../vocabulary'
import type { AdjustSorted } from './sorted-family'
import { procedureTable } from './table'

/** `m`: size of the whole family, default the number of known p-values; `alpha`: for two-stage procedures, default 0.05. */
export type AdjustOptions = { m?: number; alpha?: number }

/**
 * Adjusted p-values in input order, each in [0, 1]. `p` in [0, 1]; NaN stays NaN and does not count towards m. Where
 * `m` exceeds the number of known p-values, the unknown members act as p = 1 at the end of the order (as `n` in R's
 * p.adjust). O(n log n).
 * Throws RangeError for a procedure that needs more than p-values, for p outside [0, 1], for an `m` that is not an
 * integer or is below the number of known p-values, and for alpha outside (0, 1).
 * Sources: see the files of the procedures.
 */
export function adjust(procedure: Procedure, p: readonly number[], options: AdjustOptions = {}): number[] {
  const sorted = getKnown(p).sort()
  const adjusted = getFunction(procedure)(sorted, getFamilySize(sorted.length, options), getLevel(options))
  const find = createFinder(sorted)
  return p.map((value) => (Number.isNaN(value) ? NaN : (adjusted[find(value)] ?? NaN)))
}

/** The function of the p-values; RangeError where the table has none. */
export function getFunction(procedure: Procedure): AdjustSorted {
  const row = Object.hasOwn(procedureTable, procedure) ? procedureTable[procedure] : null
  if (row === null) throw new RangeError(`'${procedure}' is no known procedure`)
  if (row.adjust === null) {
    throw new RangeError(`${row.label} cannot be computed from p-values alone: it needs ${row.needs}`)
  }
  return row.adjust
}

function getKnown(p: readonly number[]): Float64Array {
  const known = new Float64Array(p.length)
  let size = 0
  for (const value of p) {
    if (value < 0 || value > 1) throw new RangeError(`a p-value lies in [0, 1], not at ${value}`)
    if (!Number.isNaN(value)) known[size++] = value
  }
  return known.subarray(0, size)
}

function getFamilySize(known: number, { m = known }: AdjustOptions): number {
  if (!Number.isSafeInteger(m) || m < known) {
    throw new RangeError(`m is an integer and at least the number of p-values, ${known}, not ${m}`)
  }
  return m
}

function getLevel({ alpha = 0.05 }: AdjustOptions): number {
  if (!(alpha > 0 && alpha < 1)) throw new RangeError(`alpha lies between 0 and 1, not at ${alpha}`)
  return alpha
}

/**
 * Finds the index of the first element of ascending `sorted`, all in [0, 1], that is at least a given value: by
 * bisection within the stretch that a table of equal steps leads to. Equal p-values have equal adjusted values, so
 * that looking them up is as good as carrying their places through the sorting, and faster.
 */
function createFinder(sorted: Float64Array): (value: number) => number {
  const steps = Math.max(1, sorted.length)
  const first = new Uint32Array(steps + 2).fill(sorted.length)
  for (let i = sorted.length - 1; i >= 0; i--) first[Math.floor((sorted[i] ?? 1) * steps)] = i
  for (let step = steps; step >= 0; step--) first[step] = Math.min(first[step] ?? 0, first[step + 1] ?? 0)

  return (value) => {
    const step = Math.floor(value * steps)
    let low = first[step] ?? 0
    let high = first[step + 1] ?? sorted.length
    while (low < high) {
      const middle = (low + high) >> 1
      if ((sorted[middle] ?? 1) < value) low = middle + 1
      else high = middle
    }
    return low
  }
}
