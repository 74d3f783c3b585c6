import type { Interval } from './printed-interval'

const PIECES = 24
const ROUNDS = 60
const GOLDEN = (Math.sqrt(5) - 1) / 2

/**
 * The smallest and the largest value of a smooth function on [low, high], by a grid of 25 points and golden sections
 * around the best of them: right to about 1e-12 of its scale for a function with one turning point, as the tail of F
 * is in its degrees of freedom. NaN values are not looked at.
 */
export function searchRange(f: (x: number) => number, low: number, high: number): Interval {
  if (low === high) return { low: f(low), high: f(low) }
  const at = (j: number) => (j === PIECES ? high : low + ((high - low) * j) / PIECES)
  const values = Array.from({ length: PIECES + 1 }, (_, j) => f(at(j)))
  const largest = values.indexOf(Math.max(...values))
  const smallest = values.indexOf(Math.min(...values))
  const around = (j: number): [number, number] => [at(Math.max(0, j - 1)), at(Math.min(PIECES, j + 1))]
  return {
    low: Math.min(values[smallest] ?? NaN, -climb((x) => -f(x), ...around(smallest))),
    high: Math.max(values[largest] ?? NaN, climb(f, ...around(largest))),
  }
}

function climb(f: (x: number) => number, from: number, to: number): number {
  let [a, b] = [from, to]
  let left = b - GOLDEN * (b - a)
  let right = a + GOLDEN * (b - a)
  let [atLeft, atRight] = [f(left), f(right)]
  for (let round = 0; round < ROUNDS && b - a > 1e-9 * Math.max(Math.abs(a), Math.abs(b)); round++) {
    if (atLeft > atRight) {
      b = right
      ;[right, atRight] = [left, atLeft]
      left = b - GOLDEN * (b - a)
      atLeft = f(left)
    } else {
      a = left
      ;[left, atLeft] = [right, atRight]
      right = a + GOLDEN * (b - a)
      atRight = f(right)
    }
  }
  return Math.max(atLeft, atRight)
}
