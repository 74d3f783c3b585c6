import { eq } from 'drizzle-orm'
import { newId } from '@/db/ids'
import { assignments, conflicts, manuscripts } from '@/db/schema'
import { type Actor } from '@/lib/rules/roles'
import { getRoundId, morning, type World } from './world'

export const RELATIONS = ['own', 'offered', 'assigned', 'none', 'conflicted'] as const
export type Relation = (typeof RELATIONS)[number]

/**
 * Makes a person stand to a manuscript in one way, whatever its state: to have handed it in; to have its review
 * offered; to have accepted it; nothing; or to have accepted it and a conflict since.
 */
export function relate({ db, editor }: World, person: Actor, manuscriptId: string, relation: Relation): void {
  if (relation === 'none') return
  if (relation === 'own') {
    db.update(manuscripts).set({ submitterId: person.id }).where(eq(manuscripts.id, manuscriptId)).run()
    return
  }
  db.delete(assignments).where(eq(assignments.manuscriptId, manuscriptId)).run()
  db.insert(assignments)
    .values({
      id: newId('assignment'),
      manuscriptId,
      roundId: getRoundId(db, manuscriptId),
      reviewerId: person.id,
      assignedBy: editor.id,
      status: relation === 'offered' ? 'offered' : 'accepted',
      dueAt: morning,
      createdAt: morning,
    })
    .run()
  if (relation === 'conflicted') declare({ db }, person, manuscriptId)
}

/** An open conflict of the person, as a row; gives its id. */
export function declare({ db }: Pick<World, 'db'>, person: Actor, manuscriptId: string): string {
  const id = newId('conflict')
  const reason = 'Worked in the same laboratory.'
  db.insert(conflicts)
    .values({ id, manuscriptId, personId: person.id, declaredBy: person.id, reason, createdAt: morning })
    .run()
  return id
}
