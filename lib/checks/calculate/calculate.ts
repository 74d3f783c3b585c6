import { isSignificant } from '../families/decide'
import type { Interval } from '../numbers/printed-interval'
import { adjustBounds } from '../procedures/adjust-bounds'
import type { AdjustOptions } from '../procedures/adjust'
import { survivesUpTo, survivesUpToByBh, survivesUpToByHolm } from '../sensitivity/survives-up-to'
import { procedureTable } from '../procedures/table'
import { CATALOGUE, type CatalogueProcedure } from '../vocabulary'
import type { Entry } from './entry'

/** 'printed': every number is the interval of its rounding; 'exact': the number itself ('<' and '>' stay intervals). */
export const READINGS = ['printed', 'exact'] as const
export type Reading = (typeof READINGS)[number]

/** `family`: what the procedures take beside the p-values (m, weights, transitions, groups); alpha stands apart. */
export type CalculateOptions = {
  alpha: number
  reading: Reading
  procedures: readonly CatalogueProcedure[]
  family?: Omit<AdjustOptions, 'alpha'>
}

/**
 * By one procedure: the adjusted value of every entry, in input order, as closed intervals, and whether it is
 * significant: true and false for certain, null where the rounding leaves it open. `level`: what the adjusted values
 * are held against. `refused`: why the procedure cannot be computed, in a sentence; the lists are empty then.
 */
export type Adjusted = {
  procedure: CatalogueProcedure
  level: number
  adjusted: Interval[]
  significant: (boolean | null)[]
  refused: string | null
}

/** The largest family that an entry's significance survives: for certain, and at best. */
export type Survives = { certain: number; possible: number }

export type Calculation = {
  raw: Interval[]
  m: number
  results: Adjusted[]
  survives: { bonferroni: Survives[]; holm: Survives[]; bh: Survives[] }
}

/** The interval of an entry under a reading. */
export function intervalOf(entry: Entry, reading: Reading): Interval {
  if (reading === 'printed' || entry.relation !== '=') return { low: entry.low, high: entry.high }
  return { low: entry.value, high: entry.value }
}

/**
 * Adjusts a list of entries by several procedures at once, over the rounding of every value (`adjustBounds`), and
 * tells how far each significance holds. A procedure that cannot be computed from what is given is refused with its
 * reason, and the others are computed. m defaults to the number of entries.
 * Throws RangeError for alpha outside (0, 1).
 */
export function calculate(entries: readonly Entry[], options: CalculateOptions): Calculation {
  const { alpha, reading, procedures, family = {} } = options
  if (!(alpha > 0 && alpha < 1)) throw new RangeError(`alpha lies between 0 and 1, not at ${alpha}`)
  const raw = entries.map((entry) => intervalOf(entry, reading))
  const low = raw.map((one) => one.low)
  const high = raw.map((one) => one.high)
  const pair = (certain: readonly number[], possible: readonly number[]): Survives[] =>
    certain.map((value, i) => ({ certain: value, possible: possible[i] ?? value }))
  return {
    raw,
    m: family.m ?? entries.length,
    results: procedures.map((procedure) => adjustBy(procedure, low, high, { ...family, alpha })),
    survives: {
      bonferroni: pair(
        high.map((p) => survivesUpTo(p, alpha)),
        low.map((p) => survivesUpTo(p, alpha)),
      ),
      holm: pair(survivesUpToByHolm(high, alpha), survivesUpToByHolm(low, alpha)),
      bh: pair(survivesUpToByBh(high, alpha), survivesUpToByBh(low, alpha)),
    },
  }
}

function adjustBy(
  procedure: CatalogueProcedure,
  low: readonly number[],
  high: readonly number[],
  options: AdjustOptions & { alpha: number },
): Adjusted {
  const { takes, heldAgainst } = procedureTable[procedure]
  const level = heldAgainst(options.alpha)
  const nothing = { procedure, level, adjusted: [], significant: [] }
  if (low.length === 0) return { ...nothing, refused: null }
  try {
    const bounds = adjustBounds(procedure, low, high, keepTaken(takes, options))
    const adjusted = bounds.low.map((value, i) => ({ low: value, high: bounds.high[i] ?? NaN }))
    return {
      procedure,
      level,
      adjusted,
      significant: adjusted.map((one) => isSignificant(one, level)),
      refused: null,
    }
  } catch (error) {
    // What the user typed may not suit a procedure: that is an answer, not a fault.
    if (error instanceof RangeError) return { ...nothing, refused: error.message }
    throw error
  }
}

/** The options that a procedure takes: weights and the like are typed once for all that are computed side by side. */
export function keepTaken<O extends AdjustOptions>(
  takes: readonly ('weights' | 'transitions' | 'groups')[],
  { weights, transitions, groups, ...rest }: O,
): AdjustOptions {
  return {
    ...rest,
    ...(takes.includes('weights') && weights ? { weights } : {}),
    ...(takes.includes('transitions') && transitions ? { transitions } : {}),
    ...(takes.includes('groups') && groups !== undefined ? { groups } : {}),
  }
}

/** The procedures that can be computed from p-values and what may be typed beside them, in the table's order. */
export function listComputable(): CatalogueProcedure[] {
  return CATALOGUE.filter((procedure) => {
    const { adjust, adjustInOrder } = procedureTable[procedure]
    return adjust !== null || adjustInOrder !== null
  })
}
