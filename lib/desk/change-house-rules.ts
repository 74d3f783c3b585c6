import type { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { houseRulesVersions } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import { houseRulesSchema } from '@/lib/rules/house-rules'
import type { Actor } from '@/lib/rules/roles'
import { requirePermission } from './permission'

export const changeHouseRulesInput = houseRulesSchema

export type ChangeHouseRulesResult = { version: number }

/** A new version; manuscripts handed in before are judged by the version of their day. */
export function changeHouseRules(
  db: Db,
  actor: Actor,
  input: z.infer<typeof changeHouseRulesInput>,
  now: number,
): ChangeHouseRulesResult {
  return transact(db, (tx) => {
    requirePermission(actor, 'house-rules.change')
    const { version } = tx
      .insert(houseRulesVersions)
      .values({ body: input, createdBy: actor.id, createdAt: now })
      .returning({ version: houseRulesVersions.version })
      .get()
    recordEvent(tx, actor, 'house rules changed', now, { subject: String(version), detail: { version } })
    return { version }
  })
}
