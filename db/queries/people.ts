import { and, asc, eq, inArray, or, type SQL } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { people, personRoles } from '@/db/schema'
import { may } from '@/lib/rules/permissions'
import { ROLES, type Actor, type PersonStatus, type Role } from '@/lib/rules/roles'
import { contains } from './contains'

export type PersonRow = {
  id: string
  name: string
  email: string
  affiliation: string
  expertise: string
  status: PersonStatus
  roles: Role[]
  createdAt: number
}

export type PeopleFilter = { search?: string; role?: Role; status?: PersonStatus }

/** By name. */
export function listPeople(db: Reader, actor: Actor, filter: PeopleFilter = {}): PersonRow[] {
  if (!may(actor, 'people.list')) return []
  const { search = '', role, status } = filter
  const inRole =
    role &&
    inArray(
      people.id,
      db.select({ id: personRoles.personId }).from(personRoles).where(eq(personRoles.role, role)),
    )
  const found =
    search.trim() === ''
      ? undefined
      : or(
          contains(people.name, search),
          contains(people.email, search),
          contains(people.affiliation, search),
          contains(people.expertise, search),
        )
  return readPeople(db, and(found, inRole, status && eq(people.status, status)))
}

/** Oneself, or whom one may list. */
export function getPerson(db: Reader, actor: Actor, personId: string): PersonRow | null {
  if (personId !== actor.id && !may(actor, 'people.list')) return null
  return readPeople(db, eq(people.id, personId))[0] ?? null
}

function readPeople(db: Reader, where: SQL | undefined): PersonRow[] {
  const rows = db
    .select({
      id: people.id,
      name: people.name,
      email: people.email,
      affiliation: people.affiliation,
      expertise: people.expertise,
      status: people.status,
      createdAt: people.createdAt,
      role: personRoles.role,
    })
    .from(people)
    .leftJoin(personRoles, eq(personRoles.personId, people.id))
    .where(where)
    .orderBy(asc(people.name), asc(people.id))
    .all()
  const byId = new Map<string, PersonRow>()
  for (const { role, ...person } of rows) {
    const row = byId.get(person.id) ?? { ...person, roles: [] }
    if (role !== null) row.roles.push(role)
    byId.set(person.id, row)
  }
  for (const row of byId.values()) row.roles.sort((a, b) => ROLES.indexOf(a) - ROLES.indexOf(b))
  return [...byId.values()]
}
