import { and, eq, gt, isNull } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { people, personRoles, sessions } from '@/db/schema'
import type { Actor } from '@/lib/rules/roles'

/** Who holds this session, with the roles of this moment; null when it ended or the person may not come in. */
export function getActorOfSession(db: Reader, sessionId: string, now: number): Actor | null {
  const person = db
    .select({ id: people.id, name: people.name, email: people.email, seenAt: sessions.seenAt })
    .from(sessions)
    .innerJoin(people, eq(people.id, sessions.personId))
    .where(
      and(
        eq(sessions.id, sessionId),
        isNull(sessions.revokedAt),
        gt(sessions.expiresAt, now),
        eq(people.status, 'active'),
      ),
    )
    .get()
  if (!person) return null
  const roles = db
    .select({ role: personRoles.role })
    .from(personRoles)
    .where(eq(personRoles.personId, person.id))
    .orderBy(personRoles.role)
    .all()
  return {
    kind: 'person',
    id: person.id,
    name: person.name,
    email: person.email,
    roles: roles.map(({ role }) => role),
    sessionId,
  }
}
