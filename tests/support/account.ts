import type { Db } from '@/db/client'
import { newId } from '@/db/ids'
import { people, personRoles } from '@/db/schema'
import { openSession } from '@/lib/desk/open-session'
import { hashPassword } from '@/lib/desk/password'
import type { Actor, PersonStatus, Role } from '@/lib/rules/roles'

export const knownPassword = 'eelgrass and driftwood'
let knownHash: Promise<string> | undefined

type Given = { email?: string; roles?: Role[]; status?: PersonStatus; name?: string }

/** A person who can sign in with `knownPassword`, and the actor they are. */
export async function makeAccount(db: Db, given: Given = {}): Promise<Actor> {
  const { email = 'a.keel@ternharbour.example', roles = ['submitter'], name = 'Ada Keel' } = given
  const id = newId('person')
  const passwordHash = await (knownHash ??= hashPassword(knownPassword))
  db.insert(people)
    .values({ id, email, name, status: given.status ?? 'active', passwordHash, createdAt: 0 })
    .run()
  for (const role of roles) db.insert(personRoles).values({ personId: id, role }).run()
  return { kind: 'person', id, name, email, roles, sessionId: openSession(db, id, 'test', Date.now()) }
}
