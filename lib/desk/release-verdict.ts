import { eq, max } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db, type Tx } from '@/db/client'
import { newId } from '@/db/ids'
import { getRulesOf } from '@/db/queries/rules-in-force'
import { getStanding } from '@/db/queries/standing'
import { letters, verdicts } from '@/db/schema'
import { composeVerdict } from '@/lib/mail/desk-mails'
import { renderLetter } from '@/lib/letters/render-letter'
import { queueMail } from '@/lib/mail/queue-mail'
import { recordEvent } from '@/lib/record/record-event'
import { may } from '@/lib/rules/permissions'
import { refuse, refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import type { MoveName } from '@/lib/rules/states'
import { getSettings } from '@/lib/settings'
import {
  closeAssignment,
  findOpenAssignment,
  getManuscriptRow,
  getRecipient,
  getRoundRow,
  refuseState,
} from './load-manuscript'
import { findVerdict } from './load-verdict'
import { moveManuscript } from './move-manuscript'

export const releaseVerdictInput = z.object({ manuscriptId: z.string() })

export type ReleaseVerdictResult = { letterId: string; version: number }

/** Sends the letter to the authors. Under two-person release by an editor who is not its reviewer. */
export function releaseVerdict(
  db: Db,
  actor: Actor,
  input: z.infer<typeof releaseVerdictInput>,
  now: number,
): ReleaseVerdictResult {
  return transact(db, (tx) => {
    const standing = getStanding(tx, actor, input.manuscriptId)
    const byEditor = may(actor, 'verdict.release', standing)
    if (!byEditor && !may(actor, 'verdict.release-own', standing)) throw refuseUnknown()
    const manuscript = getManuscriptRow(tx, input.manuscriptId)
    const round = getRoundRow(tx, manuscript)
    const verdict = findVerdict(tx, round.id)
    const assignment = findOpenAssignment(tx, manuscript.id)
    if (!verdict || manuscript.state !== 'verdict drafted' || !assignment) {
      throw refuseState(manuscript.state)
    }
    const move = chooseMove(actor, byEditor, verdict.reviewerId, tx, round.houseRulesVersion)
    moveManuscript(tx, actor, manuscript.id, move, now)
    closeAssignment(tx, assignment, manuscript.id, 'done', '', now)
    tx.update(verdicts)
      .set({ status: 'released', releasedAt: now, releasedBy: actor.id })
      .where(eq(verdicts.id, verdict.id))
      .run()
    const letter = writeLetter(tx, actor, manuscript.reference, verdict, now)
    for (const recipient of listRecipients(tx, manuscript)) {
      queueMail(tx, composeVerdict({ recipient, manuscriptId: manuscript.id, ...letter }), now)
    }
    recordEvent(tx, actor, 'verdict released', now, {
      manuscriptId: manuscript.id,
      subject: letter.id,
      detail: { round: round.number, verdict: verdict.verdict, version: letter.version },
    })
    return { letterId: letter.id, version: letter.version }
  })
}

function chooseMove(
  actor: Actor,
  byEditor: boolean,
  reviewerId: string,
  tx: Tx,
  rulesVersion: number,
): MoveName {
  const own = reviewerId === actor.id
  if (own && getRulesOf(tx, rulesVersion).twoPersonRelease) {
    throw refuse('conflict', 'The house rules ask for two people: an editor other than you releases it.')
  }
  if (byEditor) return 'release the verdict'
  if (!own) throw refuseUnknown()
  return 'release the own verdict'
}

function writeLetter(
  tx: Tx,
  actor: Actor,
  reference: string | null,
  verdict: { id: string; verdict: (typeof verdicts.$inferSelect)['verdict']; body: string },
  now: number,
) {
  const last = tx
    .select({ version: max(letters.version) })
    .from(letters)
    .where(eq(letters.verdictId, verdict.id))
    .get()
  const letter = {
    id: newId('letter'),
    version: (last?.version ?? 0) + 1,
    subject: `${getSettings().house}: verdict on ${reference ?? 'your manuscript'}`,
    ...renderLetter(verdict.body),
  }
  tx.insert(letters)
    .values({
      ...letter,
      verdictId: verdict.id,
      verdict: verdict.verdict,
      body: verdict.body,
      sentAt: now,
      sentBy: actor.id,
    })
    .run()
  return letter
}

/** The corresponding author and who handed it in: one mail where they are the same. */
function listRecipients(tx: Tx, manuscript: { correspondingEmail: string; submitterId: string }): string[] {
  const submitter = getRecipient(tx, manuscript.submitterId).email
  const all = [manuscript.correspondingEmail, submitter].filter((address) => address !== '')
  return [...new Map(all.map((address) => [address.toLowerCase(), address])).values()]
}
