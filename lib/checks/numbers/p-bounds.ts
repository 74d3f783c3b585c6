import { tail, type TailTest } from '../distributions/tail'
import { roundingInterval, type Interval } from './printed-interval'

/** 2: both tails; 1: the smaller tail; 'greater', 'less': the tail above or below, named before the result was seen. */
export type TailSides = 1 | 2 | 'greater' | 'less'

/**
 * The p-values that a statistic between `low` and `high` can have: two-sided for t, z and r (`sides` 1: the smaller
 * tail, as a one-sided test in the direction of the result; 'greater' and 'less': the tail of that direction, above
 * 1/2 for a result in the wrong one), upper tail for F, χ² and q. The interval may hold 0, where the two-sided p is 1;
 * a correlation is cut at ±1, F, χ² and q at 0. `df` as in `tail`; fractional df stand for their own rounding interval
 * (27.4 for 27.35 … 27.45), at whose ends the p-values are taken as well.
 * Throws RangeError where `low` exceeds `high` and as `tail` does.
 */
export function pBounds(
  test: TailTest,
  low: number,
  high: number,
  df: readonly number[],
  sides: TailSides = 2,
): Interval {
  if (!(low <= high))
    throw new RangeError(`the interval of a statistic runs upwards, not from ${low} to ${high}`)
  const signed = test === 't' || test === 'z' || test === 'r'
  const directed = signed && (sides === 'greater' || sides === 'less')
  // The lower tail is the upper one of the mirrored statistic.
  const [least, most] = directed
    ? getEnds(test, sides === 'less' ? [-high, -low] : [low, high])
    : getSizes(test, low, high)
  const oneSided = directed || (signed && sides === 1) ? 1 : 2
  const lows: number[] = []
  const highs: number[] = []
  for (const corner of listCorners(test, df)) {
    lows.push(tail(test, most, corner, oneSided))
    highs.push(tail(test, least, corner, oneSided))
  }
  return { low: Math.min(...lows), high: Math.max(...highs) }
}

/** The ends themselves, a correlation's cut at ±1. */
function getEnds(test: TailTest, [low, high]: [number, number]): [number, number] {
  return test === 'r' ? [Math.max(-1, low), Math.min(1, high)] : [low, high]
}

/** Smallest and largest size of the statistic, as far as its p-value goes. */
function getSizes(test: TailTest, low: number, high: number): [number, number] {
  if (test === 'F' || test === 'chi2' || test === 'q') return [Math.max(0, low), Math.max(0, high)]
  const limit = test === 'r' ? 1 : Infinity
  const least = low <= 0 && high >= 0 ? 0 : Math.min(Math.abs(low), Math.abs(high))
  return [Math.min(limit, least), Math.min(limit, Math.max(Math.abs(low), Math.abs(high)))]
}

/** The printed df and the corners of the box that fractional ones stand for. */
function listCorners(test: TailTest, df: readonly number[]): number[][] {
  return df.reduce<number[][]>(
    (corners, value, i) => {
      const ends = test === 'q' && i === 0 ? [value] : listEnds(value)
      return corners.flatMap((corner) => ends.map((end) => [...corner, end]))
    },
    [[]],
  )
}

function listEnds(df: number): number[] {
  if (!Number.isFinite(df) || Number.isInteger(df)) return [df]
  const decimals = String(df).split('.')[1]?.length ?? 0
  const { low, high } = roundingInterval(df, decimals)
  return low > 0 ? [low, df, high] : [df, high]
}
