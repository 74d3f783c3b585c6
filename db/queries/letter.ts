import type { Reader } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'
import type { Verdict } from '@/lib/rules/words'

export type LetterView = {
  id: string
  round: number
  version: number
  verdict: Verdict
  subject: string
  /** Markdown, and as it was sent. */
  body: string
  html: string
  text: string
  sentAt: number
  /** Until when the house hopes for an answer. */
  answerBy: number
}

/** The newest letter that was sent for a round (the newest released one unless told). */
export function getLetter(
  _db: Reader,
  _actor: Actor,
  _manuscriptId: string,
  _round?: number,
): LetterView | null {
  throw new Error('not yet')
}
