import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { newId } from '@/db/ids'
import { answers, points, rounds } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { refuseUnknown } from '@/lib/rules/refusal'
import { getRoundRow, loadManuscript, refuseState } from './load-manuscript'

export const writeAnswerInput = z.object({
  pointId: z.string(),
  body: z.string().trim().min(1, 'Please write your answer.').max(10_000),
})

export type WriteAnswerResult = { answerId: string }

/** The authors' answer to one point of the letter; it can be changed until the revision is handed in. */
export function writeAnswer(
  db: Db,
  actor: Actor,
  input: z.infer<typeof writeAnswerInput>,
  now: number,
): WriteAnswerResult {
  return transact(db, (tx) => {
    const { pointId, body } = input
    const point = tx
      .select({ roundId: points.roundId, status: points.status, manuscriptId: rounds.manuscriptId })
      .from(points)
      .innerJoin(rounds, eq(rounds.id, points.roundId))
      .where(eq(points.id, pointId))
      .get()
    if (!point) throw refuseUnknown()
    const manuscript = loadManuscript(tx, actor, 'answer.write', point.manuscriptId)
    // A point that is not in the letter is not there for the authors.
    if (point.status !== 'kept') throw refuseUnknown()
    if (manuscript.state !== 'returned' || getRoundRow(tx, manuscript).id !== point.roundId) {
      throw refuseState(manuscript.state)
    }
    const there = tx.select({ id: answers.id }).from(answers).where(eq(answers.pointId, pointId)).get()
    const answerId = there?.id ?? newId('answer')
    if (there) {
      tx.update(answers)
        .set({ body, authorId: actor.id, changedAt: now })
        .where(eq(answers.id, answerId))
        .run()
    } else {
      tx.insert(answers).values({ id: answerId, pointId, authorId: actor.id, body, createdAt: now }).run()
    }
    recordEvent(tx, actor, 'answer written', now, { manuscriptId: manuscript.id, subject: pointId })
    return { answerId }
  })
}
