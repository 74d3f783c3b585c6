import { and, eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db, type Tx } from '@/db/client'
import { people, personRoles } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import { listOf } from '@/lib/rules/list-of'
import { refuse, refuseUnknown } from '@/lib/rules/refusal'
import { ROLES, type Actor, type Role } from '@/lib/rules/roles'
import { requirePermission } from './permission'
import { endSessions } from './revoke-all-sessions'

export const changePersonInput = z.object({
  personId: z.string(),
  name: z.string().trim().min(1, 'Please give a name.').max(200).optional(),
  affiliation: z.string().trim().max(300).optional(),
  expertise: z.string().trim().max(1000).optional(),
  roles: listOf(z.enum(ROLES))
    .pipe(z.array(z.enum(ROLES)).min(1, 'Please choose a role.'))
    .optional(),
  status: z.enum(['active', 'disabled']).optional(),
})

export type ChangePersonResult = { personId: string }

/** Changes an account. Disabling signs the person out everywhere; one active administrator always remains. */
export function changePerson(
  db: Db,
  actor: Actor,
  input: z.infer<typeof changePersonInput>,
  now: number,
): ChangePersonResult {
  return transact(db, (tx) => {
    requirePermission(actor, 'people.change')
    const { personId, name, affiliation, expertise, status } = input
    const person = tx.select({ status: people.status }).from(people).where(eq(people.id, personId)).get()
    if (!person) throw refuseUnknown()
    if (status === 'active' && person.status === 'invited') {
      throw refuse('conflict', 'This person has not accepted the invitation yet.')
    }
    const changes = { name, affiliation, expertise, status }
    if (Object.values(changes).some((value) => value !== undefined)) {
      tx.update(people).set(changes).where(eq(people.id, personId)).run()
    }
    const roles = input.roles && [...new Set(input.roles)]
    if (roles) setRoles(tx, personId, roles)
    if (status === 'disabled') endSessions(tx, personId, now)
    requireAdministrator(tx)
    recordEvent(tx, actor, 'person changed', now, {
      subject: personId,
      detail: { ...(status && { status }), ...(roles && { roles: roles.join(', ') }) },
    })
    return { personId }
  })
}

function setRoles(tx: Tx, personId: string, roles: readonly Role[]): void {
  tx.delete(personRoles).where(eq(personRoles.personId, personId)).run()
  tx.insert(personRoles)
    .values(roles.map((role) => ({ personId, role })))
    .run()
}

function requireAdministrator(tx: Tx): void {
  const left = tx
    .select({ id: people.id })
    .from(people)
    .innerJoin(personRoles, eq(personRoles.personId, people.id))
    .where(and(eq(personRoles.role, 'administrator'), eq(people.status, 'active')))
    .limit(1)
    .get()
  if (!left) throw refuse('conflict', 'Somebody has to stay administrator.')
}
