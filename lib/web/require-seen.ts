import type { Reader } from '@/db/client'
import { findViewing } from '@/db/queries/viewing'
import type { Permission } from '@/lib/rules/permissions'
import { refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'

/** Answers 404 where the manuscript is not for the actor, so that an empty list or null always means "none yet". */
export function requireSeen(
  db: Reader,
  actor: Actor,
  manuscriptId: string,
  permission: Permission = 'manuscript.see',
): void {
  if (!findViewing(db, actor, manuscriptId, permission)) {
    throw refuseUnknown()
  }
}
