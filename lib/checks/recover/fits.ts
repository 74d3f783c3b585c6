import type { Interval } from '../numbers/printed-interval'
import { adjustBounds } from '../procedures/adjust-bounds'
import { rankValues } from '../procedures/rank-values'
import { procedureTable } from '../procedures/table'
import type { Fit } from '../types'
import type { CatalogueProcedure, Procedure } from '../vocabulary'
import { findFirst } from './find-first'
import { meet, SLACK } from './intervals'

/** The procedures that are tried: each can be computed from p-values at any m, and grows with m. */
export const RECOVERABLE = [
  'bonferroni',
  'sidak',
  'holm',
  'holm-sidak',
  'hochberg',
  'hommel',
  'bh',
  'by',
] as const satisfies readonly Procedure[]
type Recoverable = (typeof RECOVERABLE)[number]

/** Tried only on request: they depend on a level or an estimate, and reproduce much by chance in small families. */
const ADAPTIVE = ['bky', 'storey'] as const satisfies readonly Procedure[]
const ALL_ADAPTIVE = [
  'bky',
  'bky-unscaled',
  'tsbh',
  'storey',
] as const satisfies readonly CatalogueProcedure[]

/** `mMax`: largest family size tried, default 60; `adaptive`: try two-stage and Storey too; `alpha`: their level. */
export type FitOptions = { mMax?: number; adaptive?: boolean; alpha?: number }

/** A fit of any convention of the two-stage procedure. */
export type AdaptiveFit = { procedure: (typeof ALL_ADAPTIVE)[number]; m: number }

/**
 * Which procedures, at which family size m, reproduce printed adjusted p-values from raw ones: all for which the
 * bounds of every adjusted value over the raw intervals meet the printed interval, item by item. `printed` and `raw`:
 * closed intervals of the same tests in the same order. m runs from the number of items to `mMax` (members that are
 * not shown act as p = 1); 'raw' stands for no adjustment, with m the number of items. Items with NaN on either side
 * are left out. Sorted by the order of RECOVERABLE after 'raw', then by m. An empty answer means that nothing
 * fits; several answers are all equally consistent with the print (see `judgeFits`). That each value fits does not
 * mean that all do at once: see `fitsJointly`.
 *
 * The sizes at which one procedure fits are consecutive, as its adjusted values grow with m: the smallest and the
 * largest are found by bisection.
 * Throws RangeError where the two differ in length and where a raw interval is no interval within [0, 1].
 */
export function fits(
  printed: readonly Interval[],
  raw: readonly Interval[],
  options: FitOptions = {},
): Fit[] {
  const { mMax = 60, adaptive = false, alpha = 0.05 } = options
  const known = listKnown(printed, raw)
  if (known.length === 0) return []
  const found: Fit[] = []
  if (known.every((item) => meet(item.print, item.raw))) found.push({ procedure: 'raw', m: known.length })
  for (const { procedure, from, to } of findSizes(known, Math.max(mMax, known.length))) {
    for (let m = from; m <= to; m++) found.push({ procedure, m })
  }
  return adaptive ? [...found, ...tryEach(ADAPTIVE, known, mMax, alpha)] : found
}

/**
 * The same for procedures that depend on a level or an estimate alone, with every convention of the two-stage
 * procedure. In small families they reproduce much by chance: an answer is a hint where the procedure is named.
 */
export function fitsAdaptive(
  printed: readonly Interval[],
  raw: readonly Interval[],
  { mMax = 60, alpha = 0.05 }: Pick<FitOptions, 'mMax' | 'alpha'> = {},
): AdaptiveFit[] {
  return tryEach(ALL_ADAPTIVE, listKnown(printed, raw), mMax, alpha)
}

/** What is printed of one test and what its raw p can be. */
export type Known = { print: Interval; raw: Interval; at: number }

/** The items that are known on both sides; RangeError as in `fits`. */
export function listKnown(printed: readonly Interval[], raw: readonly Interval[]): Known[] {
  if (printed.length !== raw.length) throw new RangeError('printed and raw values differ in number')
  return printed.flatMap((print, at) => {
    const given = raw[at]
    if (given === undefined || isUnknown(print) || isUnknown(given)) return []
    if (!(given.low >= 0 && given.low <= given.high && given.high <= 1)) {
      throw new RangeError(`raw p-values lie in [0, 1], not between ${given.low} and ${given.high}`)
    }
    return [{ print, raw: given, at }]
  })
}

/** For each procedure that fits, the smallest and the largest m up to `mMax`. */
function findSizes(
  known: readonly Known[],
  mMax: number,
): { procedure: Recoverable; from: number; to: number }[] {
  const low = rankValues(Float64Array.from(known, ({ raw }) => raw.low))
  const high = rankValues(Float64Array.from(known, ({ raw }) => raw.high))
  const printAt = (places: Uint32Array, end: 'low' | 'high') =>
    Float64Array.from(places, (place) => known[place]?.print[end] ?? NaN)
  const most = printAt(low.places, 'high')
  const least = printAt(high.places, 'low')

  return RECOVERABLE.flatMap((procedure) => {
    const { adjust } = procedureTable[procedure]
    if (adjust === null) return []
    const lowFits = (m: number) => {
      const adjusted = adjust(low.values, m, 0.05)
      return most.every((end, i) => (adjusted[i] ?? NaN) <= end + SLACK)
    }
    const highFits = (m: number) => {
      const adjusted = adjust(high.values, m, 0.05)
      return least.every((end, i) => end <= (adjusted[i] ?? NaN) + SLACK)
    }
    // the largest adjusted values only grow: from some m on they are large enough; up to some m the least are small enough
    const from = findFirst(known.length, mMax, highFits)
    const to = findFirst(known.length, mMax, (m) => !lowFits(m)) - 1
    return from <= to ? [{ procedure, from, to }] : []
  })
}

function tryEach<P extends CatalogueProcedure>(
  procedures: readonly P[],
  known: readonly Known[],
  mMax: number,
  alpha: number,
): { procedure: P; m: number }[] {
  if (known.length === 0) return []
  const low = known.map(({ raw }) => raw.low)
  const high = known.map(({ raw }) => raw.high)
  const sizes = Array.from(
    { length: Math.max(mMax, known.length) - known.length + 1 },
    (_, i) => known.length + i,
  )
  return procedures.flatMap((procedure) =>
    sizes.flatMap((m) => {
      const bounds = adjustBounds(procedure, low, high, { m, alpha })
      const all = known.every(({ print }, i) =>
        meet(print, { low: bounds.low[i] ?? NaN, high: bounds.high[i] ?? NaN }),
      )
      return all ? [{ procedure, m }] : []
    }),
  )
}

const isUnknown = ({ low, high }: Interval) => Number.isNaN(low) || Number.isNaN(high)
