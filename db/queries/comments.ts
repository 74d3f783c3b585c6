import { and, asc, eq, or } from 'drizzle-orm'
import { alias, type AnySQLiteColumn } from 'drizzle-orm/sqlite-core'
import { z } from 'zod'
import type { Reader } from '@/db/client'
import { comments, people } from '@/db/schema'
import type { Box } from '@/lib/checks/types'
import type { Actor } from '@/lib/rules/roles'
import { seesReviewer, type PersonRef, type Sight } from '@/lib/rules/sight'
import type { Audience, CommentTarget } from '@/lib/rules/words'
import { findReleasedRound, findRound } from './released-round'
import { findViewing, hideReviewer, listPseudonyms } from './viewing'

export type CommentRow = {
  id: string
  round: number
  author: PersonRef
  own: boolean
  audience: Audience
  target: CommentTarget
  targetKey: string | null
  targetLabel: string
  page: number | null
  boxes: Box[]
  parentId: string | null
  body: string
  createdAt: number
  changedAt: number | null
  resolvedAt: number | null
  resolvedBy: PersonRef | null
}

const boxesSchema = z.array(z.tuple([z.number(), z.number(), z.number(), z.number()]))

/**
 * Oldest first, of the current round unless told. Private ones go to who wrote them; those for the editor to
 * editors, to who wrote them and to whose comment they answer; those for the authors to every reviewer and
 * editor, and to the submitter once the verdict of their round is released.
 */
export function listComments(db: Reader, actor: Actor, manuscriptId: string, round?: number): CommentRow[] {
  const viewing = findViewing(db, actor, manuscriptId, 'comment.read')
  if (!viewing) return []
  const { manuscript, sight, blinding } = viewing
  const chosen =
    sight === 'submitter'
      ? findReleasedRound(db, manuscriptId, round)
      : findRound(db, manuscriptId, round ?? manuscript.currentRound)
  if (!chosen) return []
  const resolver = alias(people, 'resolver')
  const parent = alias(comments, 'parent')
  const rows = db
    .select({
      id: comments.id,
      author: { id: people.id, name: people.name },
      audience: comments.audience,
      target: comments.target,
      targetKey: comments.targetKey,
      targetLabel: comments.targetLabel,
      page: comments.page,
      boxes: comments.boxes,
      parentId: comments.parentId,
      body: comments.body,
      createdAt: comments.createdAt,
      changedAt: comments.changedAt,
      resolvedAt: comments.resolvedAt,
      resolvedBy: { id: resolver.id, name: resolver.name },
    })
    .from(comments)
    .innerJoin(people, eq(people.id, comments.authorId))
    .leftJoin(resolver, eq(resolver.id, comments.resolvedBy))
    .leftJoin(parent, eq(parent.id, comments.parentId))
    .where(and(eq(comments.roundId, chosen.id), visibleTo(actor, sight, parent.authorId)))
    .orderBy(asc(comments.createdAt), asc(comments.id))
    .all()
  const names = seesReviewer(sight, blinding)
    ? undefined
    : listPseudonyms(db, [manuscriptId]).get(manuscriptId)
  return rows.map((row) => ({
    ...row,
    round: chosen.number,
    own: row.author.id === actor.id,
    author: hideReviewer(row.author, names),
    resolvedBy: row.resolvedBy && hideReviewer(row.resolvedBy, names),
    boxes: boxesSchema.parse(row.boxes ?? []),
  }))
}

function visibleTo(actor: Actor, sight: Sight, parentAuthor: AnySQLiteColumn) {
  const forAuthors = eq(comments.audience, 'authors')
  if (sight === 'submitter') return forAuthors
  const forEditor = eq(comments.audience, 'editor')
  return or(
    forAuthors,
    eq(comments.authorId, actor.id),
    sight === 'editor' ? forEditor : and(forEditor, eq(parentAuthor, actor.id)),
  )
}
