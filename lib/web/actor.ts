import { getServerSession } from 'next-auth'
import { redirect } from 'next/navigation'
import { cache } from 'react'
import { getDb } from '@/db/current'
import { getActorOfSession } from '@/db/queries/actor'
import { noteSessionSeen } from '@/lib/desk/open-session'
import type { Actor } from '@/lib/rules/roles'
import { getAuthOptions } from './auth-options'

/** Who asks, or null; once a request. */
export const getActor = cache(async (): Promise<Actor | null> => {
  const db = getDb()
  const session = await getServerSession(getAuthOptions(db))
  if (!session?.sessionId) return null
  const now = Date.now()
  const actor = getActorOfSession(db, session.sessionId, now)
  if (actor) noteSessionSeen(db, session.sessionId, now)
  return actor
})

/** Who asks; sends whoever is not signed in to the sign-in page. For pages and layouts. */
export async function requireActor(): Promise<Actor> {
  return (await getActor()) ?? redirect('/sign-in')
}
