import type { ManuscriptView } from '@/db/queries/manuscript'
import { ButtonLink } from '../ui/button'
import { Notice } from '../ui/notice'
import { Time } from '../ui/time'

/** The newest verdict that the authors were sent. */
export function ReleasedVerdict({ manuscript }: { manuscript: ManuscriptView }) {
  const { verdict } = manuscript
  if (!verdict) return null
  return (
    <Notice
      title={`Verdict: ${verdict.verdict}`}
      action={
        manuscript.actions.includes('readLetter') ? (
          <ButtonLink size="small" href={`/manuscripts/${manuscript.id}/answer`}>
            Read the letter
          </ButtonLink>
        ) : undefined
      }
    >
      Round {verdict.round}, released <Time at={verdict.releasedAt} show="date" />.
    </Notice>
  )
}
