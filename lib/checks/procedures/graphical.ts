import type { AdjustInOrder } from './in-order'
import { levelInTurn, readWeights } from './weights'

const SLACK = 1e-9

/**
 * Graphical procedure: each hypothesis holds a share w_i of the level (`weights`, default 1 / m each), and once it is
 * rejected passes it on along the rows of `transitions` (g_ij of H_i's share to H_j; rows sum to at most 1, the
 * diagonal is 0); the graph is then updated. Adjusted p: in each step the smallest p_j / w_j among those that are left,
 * and not less than in the steps before; a hypothesis
 * without a share is not tested until it receives one. Holm, fixed sequence, fallback and many gatekeeping procedures are such graphs.
 * Controls the family-wise error rate under any dependence where the graph was fixed beforehand. O(n³).
 * Throws RangeError for a missing or ill-formed graph.
 * Source: Bretz, Maurer, Brannath and Posch (2009), Stat Med 28, 586–604, algorithms 1 and 2.
 */
export const graphical: AdjustInOrder = (p, { m, weights, transitions }) => {
  const graph = createGraph(p.length, readWeights(weights, p.length, m), transitions)
  const adjusted = new Float64Array(p.length)
  const left = new Set(p.keys())
  let largest = 0
  while (left.size > 0) {
    let next = -1
    let least = Infinity
    for (const i of left) {
      const level = levelInTurn(p[i] ?? 1, graph.weight(i))
      if (next < 0 || level < least) {
        next = i
        least = level
      }
    }
    left.delete(next)
    largest = Math.min(1, Math.max(largest, least))
    adjusted[next] = largest
    graph.remove(next, left)
  }
  return adjusted
}

/**
 * A weighted graph of `size` hypotheses; `weight(i)` is the share that H_i holds, `remove(j, left)` passes on what H_j
 * held to those that are `left`. Throws RangeError where `transitions` is no size × size matrix of numbers in [0, 1]
 * with rows that sum to at most 1 and a zero diagonal.
 */
function createGraph(
  size: number,
  weights: Float64Array,
  transitions: readonly (readonly number[])[] | undefined,
) {
  checkTransitions(size, transitions)
  const w = Float64Array.from(weights)
  const g = Float64Array.from(transitions?.flat() ?? [])
  const at = (i: number, j: number) => g[i * size + j] ?? 0
  return {
    weight: (i: number) => w[i] ?? 0,
    remove(j: number, left: Iterable<number>) {
      const rest = [...left]
      for (const l of rest) w[l] = Math.min(1, (w[l] ?? 0) + (w[j] ?? 0) * at(j, l))
      for (const l of rest) {
        const back = at(l, j) * at(j, l)
        for (const k of rest) {
          if (k === l) continue
          g[l * size + k] = back < 1 ? (at(l, k) + at(l, j) * at(j, k)) / (1 - back) : 0
        }
      }
    },
  }
}

function checkTransitions(size: number, transitions: readonly (readonly number[])[] | undefined) {
  if (transitions === undefined)
    throw new RangeError('a graph takes its transitions: one row for each p-value')
  if (transitions.length !== size || transitions.some((row) => row.length !== size)) {
    throw new RangeError(`the transitions of ${size} p-values are ${size} rows of ${size} numbers`)
  }
  transitions.forEach((row, i) => {
    if (!row.every((share) => share >= 0 && share <= 1)) {
      throw new RangeError(`row ${i} of the transitions holds a number outside [0, 1]`)
    }
    if (row[i] !== 0) throw new RangeError(`hypothesis ${i} passes weight to itself: the diagonal is 0`)
    const sum = row.reduce((total, share) => total + share, 0)
    if (sum > 1 + SLACK)
      throw new RangeError(`row ${i} of the transitions adds up to ${sum}, which is more than 1`)
  })
}
