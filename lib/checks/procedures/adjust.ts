import type { CatalogueProcedure } from '../vocabulary'
import type { AdjustEach, AdjustSorted } from './sorted-family'
import { rankValues } from './rank-values'
import { procedureTable, type ProcedureRow } from './table'

/**
 * `m`: size of the whole family, default the number of known p-values; `alpha`: for two-stage procedures, default
 * 0.05. `weights`, `transitions` (rows of a square matrix) and `groups` are for the procedures whose row in the table
 * takes them.
 */
export type AdjustOptions = {
  m?: number
  alpha?: number
  weights?: readonly number[]
  transitions?: readonly (readonly number[])[]
  groups?: number
}

/**
 * Adjusted p-values in input order, each in [0, 1]. `p` in [0, 1]; NaN stays NaN and does not count towards m. Where
 * `m` exceeds the number of known p-values, the unknown members act as p = 1 at the end of the order (as `n` in R's
 * p.adjust). O(n log n) or better for every procedure but the graphical one, O(n³).
 * The procedures with `adjustInOrder` in the table need more than the set of p-values: weights or a place in the order.
 * There NaN holds its place and its weight, acts on the others as p = 1, and counts towards m, whose default is the
 * length of `p`.
 * Throws RangeError for a procedure that needs statistics or data, for p outside [0, 1], for an `m` that is not an
 * integer or is below the number of p-values, for alpha outside (0, 1), for an option that the procedure does not take,
 * and for weights, transitions or groups that do not fit (see the files of these procedures).
 * Sources: see the files of the procedures.
 */
export function adjust(
  procedure: CatalogueProcedure,
  p: readonly number[],
  options: AdjustOptions = {},
): number[] {
  const row = findRow(procedure)
  checkOptions(row, options)
  const alpha = getLevel(options)
  if (row.adjustEach !== null) return adjustOneByOne(p, row.adjustEach, getFamilySize(countKnown(p), options))
  const known = getKnown(p)
  if (row.adjustInOrder !== null) {
    const { weights, transitions, groups } = options
    const m = getFamilySize(p.length, options)
    const places =
      known.length === p.length ? known : Float64Array.from(p, (value) => (value >= 0 ? value : 1))
    return spread(p, row.adjustInOrder(places, { m, weights, transitions, groups }), true)
  }
  const run = getFunction(row)
  const m = getFamilySize(known.length, options)
  return spread(p, adjustByRank(run, known, m, alpha), false)
}

function adjustOneByOne(p: readonly number[], adjustEach: AdjustEach, m: number): number[] {
  // A copy is the fastest way to a list of that many numbers.
  const adjusted = p.slice()
  for (let i = 0; i < adjusted.length; i++) {
    const value = adjusted[i] ?? NaN
    if (!Number.isNaN(value)) adjusted[i] = adjustEach(value, m)
  }
  return adjusted
}

/** Adjusted values of `known` in its own order, by a function of the ascending ones. */
function adjustByRank(run: AdjustSorted, known: Float64Array, m: number, alpha: number): Float64Array {
  const { values, places } = rankValues(known)
  return putInPlace(run(values, m, alpha), places)
}

function putInPlace(ascending: Float64Array, places: Uint32Array): Float64Array {
  const adjusted = new Float64Array(ascending.length)
  for (let rank = 0; rank < places.length; rank++) adjusted[places[rank] ?? 0] = ascending[rank] ?? 1
  return adjusted
}

/** The adjusted values as a list beside `p`, NaN where `p` is; `aligned` where `adjusted` has a place for these too. */
function spread(p: readonly number[], adjusted: Float64Array, aligned: boolean): number[] {
  const list = p.slice()
  let next = 0
  for (let i = 0; i < list.length; i++) {
    if (!Number.isNaN(list[i])) list[i] = adjusted[aligned ? i : next++] ?? NaN
  }
  return list
}

/** The row of a procedure; RangeError for what is none. */
export function findRow(procedure: CatalogueProcedure): ProcedureRow {
  const row = Object.hasOwn(procedureTable, procedure) ? procedureTable[procedure] : null
  if (row === null) throw new RangeError(`'${procedure}' is no known procedure`)
  return row
}

/** The function of the p-values alone; RangeError where the row has none. */
function getFunction(row: ProcedureRow): AdjustSorted {
  if (row.adjust === null) {
    throw new RangeError(`${row.label} cannot be computed from p-values alone: it needs ${row.needs}`)
  }
  return row.adjust
}

function checkOptions({ label, takes }: ProcedureRow, options: AdjustOptions) {
  for (const option of ['weights', 'transitions', 'groups'] as const) {
    if (options[option] !== undefined && !takes.includes(option))
      throw new RangeError(`${label} takes no ${option}`)
  }
}

function getKnown(p: readonly number[]): Float64Array {
  const known = new Float64Array(countKnown(p))
  let size = 0
  for (let i = 0; i < p.length; i++) {
    const value = p[i] ?? NaN
    if (!Number.isNaN(value)) known[size++] = value
  }
  return known
}

function countKnown(p: readonly number[]): number {
  let count = 0
  for (let i = 0; i < p.length; i++) {
    const value = p[i] ?? NaN
    if (value >= 0 && value <= 1) count++
    else if (!Number.isNaN(value)) throw new RangeError(`a p-value lies in [0, 1], not at ${value}`)
  }
  return count
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
