import type { Reader } from '@/db/client'
import type { Box } from '@/lib/checks/types'
import type { Actor } from '@/lib/rules/roles'
import type { PersonRef } from '@/lib/rules/sight'
import type { Audience, CommentTarget } from '@/lib/rules/words'

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

/** Oldest first. The submitter gets those for the authors, of rounds whose verdict is released. */
export function listComments(
  _db: Reader,
  _actor: Actor,
  _manuscriptId: string,
  _round?: number,
): CommentRow[] {
  throw new Error('not yet')
}
