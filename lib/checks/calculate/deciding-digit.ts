import { isSignificant } from '../families/decide'
import { roundingInterval, type Interval } from '../numbers/printed-interval'
import { adjustBounds } from '../procedures/adjust-bounds'
import { procedureTable } from '../procedures/table'
import type { CatalogueProcedure } from '../vocabulary'
import { intervalOf, keepTaken, type CalculateOptions } from './calculate'
import type { Entry } from './entry'
import { readStatisticP } from './read-statistic'

/** A printed value with one more digit, and what it would decide: null where it would stay open. */
export type NextDigit = { value: number; decimals: number; significant: boolean | null }

/** Printed values with more digits than this are not refined further. */
const MOST_DECIMALS = 15
const MOST_SHOWN = 21

/**
 * What one more digit of an entry would decide, the others being as they are printed: every value with one digit more
 * that rounds to what is printed, in ascending order, with the decision that it would bring by `procedure`. Of an entry
 * that is printed as a statistic alone these are values of the statistic, else p-values. Empty for entries printed
 * with a relation or more than 15 digits, and for an exact reading.
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
  if (reading === 'exact' || entry.relation !== '=') return []
  const low = entries.map((one) => intervalOf(one, reading).low)
  const high = entries.map((one) => intervalOf(one, reading).high)
  const { takes, heldAgainst } = procedureTable[procedure]
  const level = heldAgainst(alpha)
  const options = keepTaken(takes, { ...family, alpha })
  return listNextDigits(entry).map(({ value, decimals, box }) => {
    low[index] = Math.max(entry.low, Math.min(box.low, entry.high))
    high[index] = Math.min(entry.high, Math.max(box.high, entry.low))
    const bounds = adjustBounds(procedure, low, high, options)
    const one = { low: bounds.low[index] ?? NaN, high: bounds.high[index] ?? NaN }
    return { value, decimals, significant: isSignificant(one, level) }
  })
}

type Refined = { value: number; decimals: number; box: Interval }

/** The values with one digit more, each with the range of p that it would stand for. */
function listNextDigits(entry: Entry): Refined[] {
  const { statistic } = entry
  const ofStatistic = statistic?.alone ? statistic : null
  const printed = ofStatistic ? ofStatistic.decimals : entry.decimals
  if (printed >= MOST_DECIMALS) return []
  const decimals = Math.max(1, printed + 1)
  const scale = 10 ** decimals
  const ends = ofStatistic ? roundingInterval(ofStatistic.value, printed) : entry
  const first = Math.ceil(ends.low * scale - 1e-6)
  const last = Math.floor(ends.high * scale + 1e-6)
  const refined: Refined[] = []
  for (let units = first; units <= last && refined.length < MOST_SHOWN; units++) {
    const value = units / scale
    const box = ofStatistic
      ? readStatisticP({ ...ofStatistic, value, decimals, relation: '=' }, ofStatistic.sides)
      : roundingInterval(value, decimals)
    if (box) refined.push({ value, decimals, box })
  }
  return refined
}
