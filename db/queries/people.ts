import type { Reader } from '@/db/client'
import type { Actor, PersonStatus, Role } from '@/lib/rules/roles'

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
export function listPeople(_db: Reader, _actor: Actor, _filter: PeopleFilter = {}): PersonRow[] {
  throw new Error('not yet')
}

export function getPerson(_db: Reader, _actor: Actor, _personId: string): PersonRow | null {
  throw new Error('not yet')
}
