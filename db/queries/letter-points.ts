import { and, asc, eq, isNull } from 'drizzle-orm'
import { z } from 'zod'
import type { Reader } from '@/db/client'
import { comments, points } from '@/db/schema'

export const citesSchema = z.array(z.string())

/** What of a round enters its letter: the points that are kept, in the reviewer's order. */
export function listLetterPoints(db: Reader, roundId: string) {
  return db
    .select({
      severity: points.severity,
      familyLabel: points.familyLabel,
      says: points.says,
      asks: points.asks,
      quote: points.quote,
      page: points.page,
      row: points.row,
      sheet: points.sheet,
      cites: points.cites,
    })
    .from(points)
    .where(and(eq(points.roundId, roundId), eq(points.status, 'kept')))
    .orderBy(asc(points.position), asc(points.id))
    .all()
    .map((point) => ({ ...point, cites: citesSchema.parse(point.cites) }))
}

/** And the comments for the authors that are not settled. */
export function listLetterComments(db: Reader, roundId: string) {
  return db
    .select({ body: comments.body, targetLabel: comments.targetLabel, page: comments.page })
    .from(comments)
    .where(and(eq(comments.roundId, roundId), eq(comments.audience, 'authors'), isNull(comments.resolvedAt)))
    .orderBy(asc(comments.createdAt), asc(comments.id))
    .all()
}
