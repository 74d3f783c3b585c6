import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { newId } from '@/db/ids'
import { manuscripts, rounds } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { holdHouseRules } from './hold-house-rules'
import { requirePermission } from './permission'

export const createDraftInput = z.object({
  title: z.string().trim().max(500).default(''),
})

export type CreateDraftResult = { manuscriptId: string }

/** Begins a manuscript: a draft with its first round, seen by nobody else. */
export function createDraft(
  db: Db,
  actor: Actor,
  input: z.infer<typeof createDraftInput>,
  now: number,
): CreateDraftResult {
  return transact(db, (tx) => {
    requirePermission(actor, 'draft.create')
    const manuscriptId = newId('manuscript')
    tx.insert(manuscripts)
      .values({
        id: manuscriptId,
        submitterId: actor.id,
        title: input.title,
        state: 'draft',
        stateSince: now,
        createdAt: now,
      })
      .run()
    tx.insert(rounds)
      .values({
        id: newId('round'),
        manuscriptId,
        number: 1,
        houseRulesVersion: holdHouseRules(tx, now),
        openedAt: now,
      })
      .run()
    recordEvent(tx, actor, 'draft begun', now, { manuscriptId })
    return { manuscriptId }
  })
}
