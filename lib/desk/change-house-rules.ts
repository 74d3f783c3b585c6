import type { z } from 'zod'
import type { Db } from '@/db/client'
import { houseRulesSchema } from '@/lib/rules/house-rules'
import type { Actor } from '@/lib/rules/roles'

export const changeHouseRulesInput = houseRulesSchema

export type ChangeHouseRulesResult = { version: number }

export function changeHouseRules(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof changeHouseRulesInput>,
  _now: number,
): ChangeHouseRulesResult {
  throw new Error('not yet')
}
