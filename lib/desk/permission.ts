import type { Reader } from '@/db/client'
import { getStanding } from '@/db/queries/standing'
import { may, type Permission, type Standing } from '@/lib/rules/permissions'
import { refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'

/** Refuses as not-found, so that nothing is told about what the actor may not see. */
export function requirePermission(actor: Actor, permission: Permission): void {
  if (!may(actor, permission)) throw refuseUnknown()
}

/** The same for one manuscript; returns the standing for what depends on it further. */
export function requireOnManuscript(
  db: Reader,
  actor: Actor,
  permission: Permission,
  manuscriptId: string,
): Standing {
  const standing = getStanding(db, actor, manuscriptId)
  if (!may(actor, permission, standing)) {
    throw refuseUnknown()
  }
  return standing
}
