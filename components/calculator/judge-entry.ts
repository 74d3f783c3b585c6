import { isSignificant } from '@/lib/checks/families/decide'
import type { Interval } from '@/lib/checks/numbers/printed-interval'
import type { Outcome } from '@/lib/checks/vocabulary'

/** How a test stands: alone against alpha, and after the correction; null where the rounding leaves it open. */
export type Standing = { alone: boolean | null; corrected: boolean | null }

export function standOf(raw: Interval, corrected: boolean | null, alpha: number): Standing {
  return { alone: isSignificant(raw, alpha), corrected }
}

/**
 * The outcome of a correction for one test: it holds, it is lost, or the rounding leaves it open. Null where there was
 * nothing to lose: the test is not significant alone.
 */
export function outcomeOf({ alone, corrected }: Standing): Outcome | null {
  if (corrected === true) return 'holds'
  if (corrected === null) return 'undecidable'
  return alone === false ? null : 'fails'
}

export const wordsOf = (standing: Standing): string => {
  const outcome = outcomeOf(standing)
  if (outcome === 'holds') return 'significant'
  if (outcome === 'undecidable') return 'left open by the rounding'
  return outcome === 'fails' ? 'not significant after the correction' : 'not significant'
}
