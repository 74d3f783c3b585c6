import { tail } from '../distributions/tail'
import type { Interval } from '../numbers/printed-interval'
import { welchDf } from './pairs'
import { getSizes } from './rounding-box'

/** A rectangle of the two squared standard errors. */
type Piece = { a: Interval; b: Interval }

/** `n1`, `n2`: group sizes; `a`, `b`: what s² / n of either can be. */
export type WelchBox = Piece & { n1: number; n2: number; difference: Interval }

/** How much wider than what is attained a bound may be, relative. */
const PRECISION = 1e-6
const MOST_PIECES = 4000

/** Welch's df over the rectangle: 1 / df is convex in the first group's share, so one turning point at most. */
export function boundWelchDf({ n1, n2 }: WelchBox, { a, b }: Piece): Interval {
  const low = share(a.low, b.high)
  const high = share(a.high, b.low)
  const best = Math.min(high, Math.max(low, (n1 - 1) / (n1 + n2 - 2)))
  return {
    low: Math.min(welchDf(low, n1, n2), welchDf(high, n1, n2)),
    high: welchDf(best, n1, n2),
  }
}

const share = (a: number, b: number) => (a === 0 ? 0 : a / (a + b))

/**
 * What the p-value of Welch's test can be with the difference and both squared standard errors in their intervals:
 * a bound that holds for certain and exceeds what is attained by 1e-6 relative at most. At a given share of the two
 * errors p grows with their sum, so that both ends lie on edges of the rectangle; along an edge p need not be
 * monotone, as df changes too. The edge is cut until the bounds of its pieces, t and df each at its worst, close in.
 */
export function boundWelchP(box: WelchBox): Interval {
  const { least, most } = getSizes(box.difference)
  const { a, b } = box
  const top = (end: Interval): Interval => ({ low: end.high, high: end.high })
  const bottom = (end: Interval): Interval => ({ low: end.low, high: end.low })
  return {
    low: -closeIn(
      [
        { a: bottom(a), b },
        { a, b: bottom(b) },
      ],
      (piece) => -getP(most, piece.a.low + piece.b.low, boundWelchDf(box, piece).high),
    ),
    high: closeIn(
      [
        { a: top(a), b },
        { a, b: top(b) },
      ],
      (piece) => getP(least, piece.a.high + piece.b.high, boundWelchDf(box, piece).low),
    ),
  }
}

const getP = (size: number, squaredError: number, df: number) =>
  size === 0 ? 1 : tail('t', size / Math.sqrt(squaredError), [df])

/**
 * The largest value on the pieces of a function of which `bound` is an upper bound on a piece and the value at a
 * point; from above, within PRECISION.
 */
function closeIn(pieces: readonly Piece[], bound: (piece: Piece) => number): number {
  const open = [...pieces]
  let attained = -Infinity
  let largest = -Infinity
  for (let count = 0; ; count++) {
    const piece = open.pop()
    if (piece === undefined) return Math.max(attained, largest)
    const most = bound(piece)
    const middle: Piece = { a: toPoint(piece.a), b: toPoint(piece.b) }
    attained = Math.max(attained, bound(middle))
    if (most <= attained + PRECISION * Math.abs(attained) || count > MOST_PIECES) {
      largest = Math.max(largest, most)
    } else {
      open.push({ a: half(piece.a, 0), b: half(piece.b, 0) }, { a: half(piece.a, 1), b: half(piece.b, 1) })
    }
  }
}

const toPoint = ({ low, high }: Interval): Interval => {
  const middle = 0.5 * (low + high)
  return { low: middle, high: middle }
}

const half = ({ low, high }: Interval, second: 0 | 1): Interval =>
  second ? { low: 0.5 * (low + high), high } : { low, high: 0.5 * (low + high) }
