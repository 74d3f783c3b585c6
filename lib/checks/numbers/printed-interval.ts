import type { Relation } from '../vocabulary'

/** A closed interval. */
export type Interval = { low: number; high: number }

/**
 * What a number printed with `decimals` digits after the point stands for: half a unit of its last digit to either
 * side, ends included. `decimals` may be negative (1.5e3 has −2). Example: 2.05 with 2 gives [2.045, 2.055].
 */
export function roundingInterval(value: number, decimals: number): Interval {
  const scale = 10 ** decimals
  const units = Math.round(value * scale)
  // A value that carries more digits than it says keeps them.
  if (Math.abs(value * scale - units) > 1e-6 * Math.max(1, Math.abs(units))) {
    return { low: value - 0.5 / scale, high: value + 0.5 / scale }
  }
  return { low: (2 * units - 1) / (2 * scale), high: (2 * units + 1) / (2 * scale) }
}

/**
 * What a number of at least 0 stands for whose further digits were cut off instead of rounded: from itself to one unit
 * of its last digit above, ends included. Example: 0.04 with 2 decimals gives [0.04, 0.05].
 */
export function truncationInterval(value: number, decimals: number): Interval {
  const scale = 10 ** decimals
  return { low: value, high: (Math.round(value * scale) + 1) / scale }
}

/**
 * The interval that a printed p-value stands for. '=': its rounding interval, cut to [0, 1]; '<' and '<=': [0, value];
 * '>' and '>=': [value, 1]. A value outside [0, 1] cannot be a p-value: its interval is left uncut around it.
 * Example: p = .030 (3 decimals) is [0.0295, 0.0305]; p = .00 is [0, 0.005]; p < .001 is [0, 0.001].
 */
export function printedInterval(value: number, decimals: number, relation: Relation = '='): Interval {
  if (relation === '<' || relation === '<=') return { low: Math.min(0, value), high: value }
  if (relation === '>' || relation === '>=') return { low: value, high: Math.max(1, value) }
  const { low, high } = roundingInterval(value, decimals)
  if (value < 0 || value > 1) return { low, high }
  return { low: Math.max(0, low), high: Math.min(1, high) }
}
