import { isSignificant } from '../families/decide'
import { roundingInterval } from '../numbers/printed-interval'
import { adjustBounds } from '../procedures/adjust-bounds'
import { procedureTable } from '../procedures/table'
import type { CatalogueProcedure } from '../vocabulary'
import { intervalOf, keepTaken, type CalculateOptions } from './calculate'
import type { Entry } from './entry'

/** A value with one more digit than printed, and what it would decide: null where it would stay open. */
export type NextDigit = { value: number; decimals: number; significant: boolean | null }

/** Printed values with more digits than this are not refined further. */
const MOST_DECIMALS = 15

/**
 * What one more digit of an entry would decide, the others being as they are printed: every value with one digit more
 * that rounds to what is printed, in ascending order, with the decision that it would bring by `procedure`. Empty for
 * entries printed with a relation or more than 15 digits, and for an exact reading.
 * Throws RangeError as `adjustBounds` does and for an index outside the list.
 */
export function findDecidingDigit(
  entries: readonly Entry[],
  index: number,
  procedure: CatalogueProcedure,
  { alpha, reading, family = {} }: Omit<CalculateOptions, 'procedures'>,
): NextDigit[] {
  const entry = entries[index]
  if (entry === undefined) throw new RangeError(`there is no entry ${index}`)
  if (reading === 'exact' || entry.relation !== '=' || entry.decimals >= MOST_DECIMALS) return []
  const low = entries.map((one) => intervalOf(one, reading).low)
  const high = entries.map((one) => intervalOf(one, reading).high)
  const { takes, heldAgainst } = procedureTable[procedure]
  const level = heldAgainst(alpha)
  const options = keepTaken(takes, { ...family, alpha })
  const decimals = Math.max(1, entry.decimals + 1)
  const scale = 10 ** decimals
  const first = Math.ceil(entry.low * scale - 1e-6)
  const last = Math.floor(entry.high * scale + 1e-6)
  const found: NextDigit[] = []
  for (let units = first; units <= Math.min(last, first + 20); units++) {
    const value = units / scale
    const box = roundingInterval(value, decimals)
    low[index] = Math.max(entry.low, box.low)
    high[index] = Math.max(low[index] ?? 0, Math.min(entry.high, box.high))
    const bounds = adjustBounds(procedure, low, high, options)
    const one = { low: bounds.low[index] ?? NaN, high: bounds.high[index] ?? NaN }
    found.push({ value, decimals, significant: isSignificant(one, level) })
  }
  return found
}
