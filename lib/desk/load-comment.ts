import { eq } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { comments, rounds, verdicts } from '@/db/schema'
import type { Actor } from '@/lib/rules/roles'
import { refuseUnknown } from '@/lib/rules/refusal'
import { loadManuscript, refuseState } from './load-manuscript'

/** A comment that the actor may see and answer; another's private one is not there. */
export function loadComment(tx: Reader, actor: Actor, commentId: string) {
  const comment = tx
    .select({
      id: comments.id,
      roundId: comments.roundId,
      authorId: comments.authorId,
      audience: comments.audience,
      manuscriptId: rounds.manuscriptId,
      verdictStatus: verdicts.status,
    })
    .from(comments)
    .innerJoin(rounds, eq(rounds.id, comments.roundId))
    .leftJoin(verdicts, eq(verdicts.roundId, rounds.id))
    .where(eq(comments.id, commentId))
    .get()
  if (!comment) throw refuseUnknown()
  const manuscript = loadManuscript(tx, actor, 'comment.write', comment.manuscriptId)
  const own = comment.authorId === actor.id
  const editor = actor.roles.includes('editor')
  if (!own && (comment.audience === 'private' || (comment.audience === 'editor' && !editor))) {
    throw refuseUnknown()
  }
  if (manuscript.state === 'closed' || manuscript.state === 'withdrawn') throw refuseState(manuscript.state)
  return { ...comment, own }
}
