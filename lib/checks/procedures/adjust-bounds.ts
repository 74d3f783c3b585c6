import type { CatalogueProcedure } from '../vocabulary'
import { adjust, findRow, type AdjustOptions } from './adjust'

export type Bounds = { low: number[]; high: number[] }

/**
 * `unprinted`: how many further members of the family have a p-value of which nothing is printed, so that it may lie
 * anywhere in [0, 1]; they count in `m`, whose default is then all members. Default 0: members beyond those given act
 * as p = 1. For procedures on the set of p-values only.
 */
export type BoundOptions = AdjustOptions & { unprinted?: number }

/**
 * Procedures by closed testing whose every local test rejects where a member has p = 0: members at 0 then leave the
 * others as they would be without them.
 */
const CLOSED: readonly CatalogueProcedure[] = ['holm', 'holm-sidak', 'hochberg', 'hommel']

/**
 * The exact bounds of each adjusted p-value when every p[i] ranges over [low[i], high[i]] on its own. Shapes,
 * ranges and errors as in `adjust`; RangeError also where `low` and `high` differ in length, in what is NaN, or in
 * order. Every procedure but the two-stage ones is monotone in each p-value, so that the ends of the box give the
 * bounds. For the two-stage ones ('bky', 'bky-unscaled', 'tsbh') a lower bound may be an infimum that is not attained
 * (the last p just above the level of the first stage); it is then right to 1e-13.
 */
export function adjustBounds(
  procedure: CatalogueProcedure,
  low: readonly number[],
  high: readonly number[],
  { unprinted = 0, ...options }: BoundOptions = {},
): Bounds {
  checkBox(low, high)
  if (unprinted !== 0) return boundWithUnprinted(procedure, low, high, unprinted, options)
  const { firstStage } = findRow(procedure)
  const run = (p: readonly number[]) => adjust(procedure, p, options)
  if (firstStage === null) return { low: run(low), high: run(high) }
  return boundTwoStage(low, high, firstStage(options.alpha ?? 0.05), run)
}

function boundWithUnprinted(
  procedure: CatalogueProcedure,
  low: readonly number[],
  high: readonly number[],
  unprinted: number,
  options: AdjustOptions,
): Bounds {
  const { adjust: bySet, adjustEach, firstStage } = findRow(procedure)
  if (bySet === null) throw new RangeError(`${procedure} needs to know which member is not printed`)
  const known = low.filter((p) => !Number.isNaN(p)).length
  const m = options.m ?? known + unprinted
  if (!Number.isSafeInteger(unprinted) || unprinted < 0 || m < known + unprinted) {
    throw new RangeError(`m = ${m} leaves no room for ${unprinted} members beside the ${known} given`)
  }
  const whole = { ...options, m }
  if (adjustEach !== null) return adjustBounds(procedure, low, high, whole)
  const largest = () => adjust(procedure, high, whole)
  if (CLOSED.includes(procedure)) {
    return { low: adjust(procedure, low, { ...options, m: m - unprinted }), high: largest() }
  }
  const zeros = new Array<number>(unprinted).fill(0)
  const cut = (p: readonly number[]) => p.slice(0, low.length)
  if (firstStage === null) return { low: cut(adjust(procedure, [...low, ...zeros], whole)), high: largest() }
  const all = adjustBounds(procedure, [...low, ...zeros], [...high, ...zeros.map(() => 1)], whole)
  return { low: cut(all.low), high: cut(all.high) }
}

function checkBox(low: readonly number[], high: readonly number[]) {
  if (low.length !== high.length) throw new RangeError('low and high differ in length')
  low.forEach((value, i) => {
    const end = high[i] ?? NaN
    const ordered = value <= end || (Number.isNaN(value) && Number.isNaN(end))
    if (!ordered) throw new RangeError(`low[${i}] = ${value} is not at most high[${i}] = ${end}`)
  })
}

/**
 * A two-stage procedure is monotone as long as its first stage rejects all, and as long as it does not; it drops
 * where the largest p passes `level`. The bounds are those over both regimes. Where every low end lies below the
 * level, the second regime begins with one p raised just above it, and raising the largest that can be raised
 * leaves all others lowest; for that one itself the next largest is raised.
 */
function boundTwoStage(
  low: readonly number[],
  high: readonly number[],
  level: number,
  run: (p: readonly number[]) => number[],
): Bounds {
  const above = level * (1 + 1e-14)
  const lows: number[][] = []
  const highs: number[][] = []

  if (low.every((p) => !(p > level))) {
    lows.push(run(low))
    highs.push(run(high.map((p) => Math.min(p, level))))
    const raisable = low.map((_, i) => i).filter((i) => (high[i] ?? NaN) > level)
    const [first, second] = raisable.sort((a, b) => (low[b] ?? 0) - (low[a] ?? 0))
    for (const raised of [first, second]) {
      if (raised !== undefined) lows.push(run(low.map((p, i) => (i === raised ? above : p))))
    }
  } else {
    lows.push(run(low))
  }
  if (high.some((p) => p > level)) highs.push(run(high))

  const over = (vectors: number[][], pick: (...values: number[]) => number) =>
    low.map((_, i) => pick(...vectors.map((vector) => vector[i] ?? NaN)))
  return { low: over(lows, Math.min), high: over(highs, Math.max) }
}
