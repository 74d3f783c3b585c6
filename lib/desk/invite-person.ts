import { z } from 'zod'
import type { Db } from '@/db/client'
import { ROLES } from '@/lib/rules/roles'
import type { Actor } from '@/lib/rules/roles'

export const invitePersonInput = z.object({
  email: z.email().transform((email) => email.toLowerCase()),
  name: z.string().trim().min(1).max(200),
  affiliation: z.string().trim().max(300).default(''),
  expertise: z.string().trim().max(1000).default(''),
  roles: z.array(z.enum(ROLES)).min(1),
})

export type InvitePersonResult = { personId: string }

export function invitePerson(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof invitePersonInput>,
  _now: number,
): InvitePersonResult {
  throw new Error('not yet')
}
