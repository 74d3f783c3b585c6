import type { Decision, Family } from '@/lib/checks/types'
import type { Outcome } from '@/lib/checks/vocabulary'

/** How one call stands against the recomputation; null where the manuscript makes no call. */
export function outcomeOfDecision(decision: Decision, family: Pick<Family, 'outcome'>): Outcome | null {
  if (decision.called === null) return null
  if (decision.significant === null) return 'undecidable'
  if (decision.called === decision.significant) return 'holds'
  return family.outcome === 'uncorrected' ? 'uncorrected' : 'fails'
}
