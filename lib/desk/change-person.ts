import { z } from 'zod'
import type { Db } from '@/db/client'
import { ROLES } from '@/lib/rules/roles'
import type { Actor } from '@/lib/rules/roles'

export const changePersonInput = z.object({
  personId: z.string(),
  name: z.string().trim().min(1).max(200).optional(),
  affiliation: z.string().trim().max(300).optional(),
  expertise: z.string().trim().max(1000).optional(),
  roles: z.array(z.enum(ROLES)).min(1).optional(),
  status: z.enum(['active', 'disabled']).optional(),
})

export type ChangePersonResult = { personId: string }

export function changePerson(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof changePersonInput>,
  _now: number,
): ChangePersonResult {
  throw new Error('not yet')
}
