import { desc, eq } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { letters, verdicts } from '@/db/schema'
import type { Actor } from '@/lib/rules/roles'
import type { Verdict } from '@/lib/rules/words'
import { findReleasedRound } from './released-round'
import { getRulesOf } from './rules-in-force'
import { findViewing } from './viewing'

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

const day = 24 * 3_600_000

/** The newest letter that was sent for a round (the newest released one unless told). */
export function getLetter(db: Reader, actor: Actor, manuscriptId: string, round?: number): LetterView | null {
  if (!findViewing(db, actor, manuscriptId, 'letter.read')) return null
  const released = findReleasedRound(db, manuscriptId, round)
  if (!released) return null
  const row = db
    .select({
      id: letters.id,
      version: letters.version,
      verdict: letters.verdict,
      subject: letters.subject,
      body: letters.body,
      html: letters.html,
      text: letters.text,
      sentAt: letters.sentAt,
    })
    .from(letters)
    .innerJoin(verdicts, eq(verdicts.id, letters.verdictId))
    .where(eq(verdicts.roundId, released.id))
    .orderBy(desc(letters.version))
    .limit(1)
    .get()
  if (!row) return null
  const { answerDays } = getRulesOf(db, released.houseRulesVersion)
  return { ...row, round: released.number, answerBy: row.sentAt + answerDays * day }
}
