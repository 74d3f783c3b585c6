import { z } from 'zod'
import type { Reader } from '@/db/client'
import { getRulesOf } from '@/db/queries/rules-in-force'
import { listLetterComments, listLetterPoints } from '@/db/queries/letter-points'
import { bibliography } from '@/lib/checks/bibliography'
import { composeLetter } from '@/lib/letters/compose-letter'
import type { Actor } from '@/lib/rules/roles'
import { VERDICTS } from '@/lib/rules/words'
import { getSettings } from '@/lib/settings'
import { getRoundRow, loadManuscript } from './load-manuscript'

export const composeLetterBodyInput = z.object({ manuscriptId: z.string(), verdict: z.enum(VERDICTS) })

export type ComposeLetterBodyResult = { body: string }

/** The letter as it follows from the points that are kept and the comments for the authors; Markdown. Writes nothing. */
export function composeLetterBody(
  db: Reader,
  actor: Actor,
  input: z.infer<typeof composeLetterBodyInput>,
): ComposeLetterBodyResult {
  const manuscript = loadManuscript(db, actor, 'verdict.read', input.manuscriptId)
  const round = getRoundRow(db, manuscript)
  const { greeting, closing, answerDays } = getRulesOf(db, round.houseRulesVersion)
  return {
    body: composeLetter({
      house: getSettings().house,
      reference: manuscript.reference,
      title: manuscript.title,
      round: round.number,
      verdict: input.verdict,
      greeting,
      closing,
      answerDays,
      points: listLetterPoints(db, round.id),
      comments: listLetterComments(db, round.id),
      cite: (key) => bibliography.get(key)?.text ?? null,
    }),
  }
}
