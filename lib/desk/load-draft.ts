import type { Reader } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'
import { findBegunRound, loadManuscript, refuseState } from './load-manuscript'

/** What the submitter still prepares: a draft, or the next round of a manuscript that was returned. */
export function loadDraft(tx: Reader, actor: Actor, manuscriptId: string) {
  const manuscript = loadManuscript(tx, actor, 'draft.change', manuscriptId)
  const round = findBegunRound(tx, manuscriptId)
  if (!round || (manuscript.state !== 'draft' && manuscript.state !== 'returned')) {
    throw refuseState(manuscript.state)
  }
  return { manuscript, round }
}
