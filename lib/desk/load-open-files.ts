import type { Reader } from '@/db/client'
import { getStanding } from '@/db/queries/standing'
import { may } from '@/lib/rules/permissions'
import type { Actor } from '@/lib/rules/roles'
import { loadDraft } from './load-draft'
import { refuseUnknown } from '@/lib/rules/refusal'
import { getManuscriptRow, getRoundRow } from './load-manuscript'

/** The round whose files the submitter can change: a draft's, a begun revision's, or one that is stuck. */
export function loadOpenFiles(tx: Reader, actor: Actor, manuscriptId: string) {
  const standing = getStanding(tx, actor, manuscriptId)
  if (!may(actor, 'manuscript.replace-file', standing)) throw refuseUnknown()
  const manuscript = getManuscriptRow(tx, manuscriptId)
  if (manuscript.state === 'stuck') return { manuscript, round: getRoundRow(tx, manuscript) }
  return loadDraft(tx, actor, manuscriptId)
}
