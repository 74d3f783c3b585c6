import type { Interval } from '../numbers/printed-interval'
import { adjust } from '../procedures/adjust'
import { atLeastOneOf } from '../procedures/sidak'
import { harmonic } from '../procedures/by'
import type { Fit } from '../types'
import { fits, listKnown, type FitOptions, type Known } from './fits'
import { SLACK } from './intervals'

/**
 * A fit that is not excluded. `witness`: raw p-values within their intervals that give every printed value at once, in
 * input order, NaN for items that are left out; null where none was found and none is excluded either.
 */
export type JointFit = Fit & { witness: number[] | null }

/**
 * The fits of `fits` for which one vector of raw p-values may give all printed values at once. Arguments, order and
 * errors as in `fits`, without its adaptive procedures.
 *
 * - A fit with a witness is proven: the procedure was run on it.
 * - 'raw', Bonferroni and Šidák treat each value by itself: here `fits` is exact already, and there always is a witness.
 * - Holm, Holm–Šidák, Hochberg, Benjamini–Hochberg and Benjamini–Yekutieli: once the order of the raw p-values is
 *   known it is decided exactly. Under a given order the vectors of a step-down procedure that stay below the upper
 *   ends have a largest one, and it either reaches the lower ends or no vector does; for a step-up procedure the same
 *   holds of the least one, turned around. The order is known where for any two items either their raw intervals do not
 *   overlap, or both ends of both intervals, raw and printed, agree in which item comes first (if a vector with the
 *   two the other way round fits, so does the one with the two exchanged). Values rounded to the same digit are mostly
 *   of this kind. Where the order is open, those of the raw and of the printed intervals are tried: they
 *   may give a witness, but exclude nothing.
 * - Hommel: a few vectors are tried for a witness; nothing is excluded.
 */
export function fitsJointly(
  printed: readonly Interval[],
  raw: readonly Interval[],
  { mMax, alpha }: Pick<FitOptions, 'mMax' | 'alpha'> = {},
): JointFit[] {
  const known = listKnown(printed, raw).sort(compareItems)
  const ordered = isOrderKnown(known)
  const orders = ordered ? [known] : [known, known.toSorted(compareByPrint)]
  const options = { ...(mMax === undefined ? {} : { mMax }), ...(alpha === undefined ? {} : { alpha }) }
  return fits(printed, raw, options).flatMap((fit): JointFit[] => {
    const witness = findWitness(orders, fit, raw.length)
    const excluded = witness === null && ordered && fit.procedure !== 'hommel'
    return excluded ? [] : [{ ...fit, witness }]
  })
}

/** The first vector that one of the orders leads to, in input order of `size` items. */
function findWitness(orders: readonly Known[][], fit: Fit, size: number): number[] | null {
  for (const known of orders) {
    const vector = findVector(known, fit)
    if (vector === null) continue
    const witness = new Array<number>(size).fill(NaN)
    known.forEach(({ at }, i) => (witness[at] = vector[i] ?? NaN))
    return witness
  }
  return null
}

function compareItems(a: Known, b: Known): number {
  return (
    a.raw.low - b.raw.low ||
    a.raw.high - b.raw.high ||
    a.print.low - b.print.low ||
    a.print.high - b.print.high
  )
}

function compareByPrint(a: Known, b: Known): number {
  return a.print.low - b.print.low || a.print.high - b.print.high || compareItems(a, b)
}

function isOrderKnown(known: readonly Known[]): boolean {
  return known.every((a, i) =>
    known.slice(i + 1).every((b) => {
      if (a.raw.high <= b.raw.low) return true
      const rawAgrees = a.raw.low <= b.raw.low && a.raw.high <= b.raw.high
      return rawAgrees && a.print.low <= b.print.low && a.print.high <= b.print.high
    }),
  )
}

/** What a step does to the p of an index, and the p that it takes to a value; both grow. */
type Step = { bound: (p: number, i: number) => number; inverse: (value: number, i: number) => number }

const times = (factor: (i: number) => number): Step => ({
  bound: (p, i) => factor(i) * p,
  inverse: (value, i) => value / factor(i),
})

/** A vector in the order of `known` that gives every printed value, or null. */
function findVector(known: readonly Known[], { procedure, m }: Fit): number[] | null {
  switch (procedure) {
    case 'raw':
      return confirm(
        known,
        procedure,
        m,
        inEach(
          known,
          times(() => 1),
        ),
      )
    case 'bonferroni':
      return confirm(
        known,
        procedure,
        m,
        inEach(
          known,
          times(() => m),
        ),
      )
    case 'sidak':
      return confirm(
        known,
        procedure,
        m,
        inEach(known, { bound: (p) => atLeastOneOf(m, p), inverse: (value) => atLeastOneOf(1 / m, value) }),
      )
    case 'holm':
      return confirm(
        known,
        procedure,
        m,
        climbHighest(
          known,
          times((i) => m - i),
        ),
      )
    case 'holm-sidak':
      return confirm(
        known,
        procedure,
        m,
        climbHighest(known, {
          bound: (p, i) => atLeastOneOf(m - i, p),
          inverse: (value, i) => atLeastOneOf(1 / (m - i), value),
        }),
      )
    case 'hochberg':
      return confirm(
        known,
        procedure,
        m,
        stayLowest(
          known,
          times((i) => m - i),
        ),
      )
    case 'bh':
      return confirm(
        known,
        procedure,
        m,
        stayLowest(
          known,
          times((i) => m / (i + 1)),
        ),
      )
    case 'by':
      return confirm(
        known,
        procedure,
        m,
        stayLowest(
          known,
          times((i) => (m / (i + 1)) * harmonic(m)),
        ),
      )
    default:
      return listTries(known, m).reduce<number[] | null>(
        (found, vector) => found ?? confirm(known, procedure, m, vector),
        null,
      )
  }
}

/** For each item by itself, the middle of what its raw and its printed interval leave. */
function inEach(known: readonly Known[], { inverse }: Step): number[] {
  return known.map(({ print, raw }, i) => {
    const low = Math.max(raw.low, inverse(clip(print.low), i))
    const high = Math.min(raw.high, print.high >= 1 ? 1 : inverse(clip(print.high), i))
    return Math.min(raw.high, Math.max(raw.low, (low + high) / 2))
  })
}

/** Step-down in this order: the largest ascending vector whose adjusted values stay at or below the printed upper ends. */
function climbHighest(known: readonly Known[], { inverse }: Step): number[] {
  const vector = new Array<number>(known.length)
  let ceiling = 1
  let next = 1
  for (let i = known.length - 1; i >= 0; i--) {
    const item = known[i]
    if (item === undefined) continue
    // an adjusted value is at most every later one
    ceiling = Math.min(ceiling, item.print.high)
    const most = ceiling >= 1 ? 1 : inverse(clip(ceiling), i)
    next = Math.min(next, item.raw.high, most)
    vector[i] = next
  }
  return vector
}

/** Step-up in this order: the least ascending vector whose adjusted values reach the printed lower ends. */
function stayLowest(known: readonly Known[], { inverse }: Step): number[] {
  let floor = 0
  let before = 0
  return known.map((item, i) => {
    // an adjusted value is at least every earlier one
    floor = Math.max(floor, item.print.low)
    before = Math.max(before, item.raw.low, inverse(clip(floor), i))
    return before
  })
}

/** Hommel lies between Benjamini–Hochberg and Hochberg: their vectors, both ends and points between them. */
function listTries(known: readonly Known[], m: number): number[][] {
  const between = (share: number) => known.map(({ raw }) => raw.low + share * (raw.high - raw.low))
  return [
    ...[0.5, 0, 1, 0.25, 0.75, 0.1, 0.9].map(between),
    stayLowest(
      known,
      times((i) => m - i),
    ),
    stayLowest(
      known,
      times((i) => m / (i + 1)),
    ),
    climbHighest(
      known,
      times((i) => m - i),
    ),
  ]
}

/** The vector, moved into the raw intervals by no more than rounding errors, if it gives every printed value. */
function confirm(
  known: readonly Known[],
  procedure: Fit['procedure'],
  m: number,
  vector: readonly number[],
): number[] | null {
  // an error in p is up to m times as large in its adjusted value
  const room = SLACK * (m + 1)
  const within = known.every(({ raw }, i) => {
    const p = vector[i] ?? NaN
    return p >= raw.low - SLACK && p <= raw.high + SLACK
  })
  if (!within) return null
  const inside = known.map(({ raw }, i) => Math.min(raw.high, Math.max(raw.low, vector[i] ?? NaN)))
  const adjusted = procedure === 'raw' ? inside : adjust(procedure, inside, { m })
  const all = known.every(({ print }, i) => {
    const value = adjusted[i] ?? NaN
    return value >= print.low - room && value <= print.high + room
  })
  return all ? inside : null
}

const clip = (value: number) => Math.min(1, Math.max(0, value))
