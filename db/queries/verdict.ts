import type { Reader } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'
import type { Verdict, VerdictStatus } from '@/lib/rules/words'

export type VerdictView = {
  id: string
  round: number
  reviewer: { id: string; name: string }
  verdict: Verdict
  /** To the editor, never to the authors. */
  remark: string
  effortMinutes: number | null
  /** Markdown. */
  body: string
  status: VerdictStatus
  sentBackReason: string
  draftedAt: number
  changedAt: number
  releasedAt: number | null
  /** Points of the round: how many are kept for the letter, and how many nobody has decided. */
  kept: number
  undecided: number
}

/** For its reviewer and the editors; the submitter reads the letter. */
export function getVerdict(
  _db: Reader,
  _actor: Actor,
  _manuscriptId: string,
  _round?: number,
): VerdictView | null {
  throw new Error('not yet')
}
