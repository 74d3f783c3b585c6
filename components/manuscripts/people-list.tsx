import type { ReactNode } from 'react'
import type { ConflictView, ManuscriptView } from '@/db/queries/manuscript'
import { DueTime } from '../docket/due-time'
import { Time } from '../ui/time'

type PeopleListProps = {
  manuscript: ManuscriptView
  /** What can be done about a conflict, such as lifting it. */
  conflictAction?: (conflict: ConflictView) => ReactNode
}

/** Who has the manuscript, as far as the house rules let the viewer know. */
export function PeopleList({ manuscript, conflictAction }: PeopleListProps) {
  const { submitter, correspondingAuthor, correspondingEmail, assignment, conflicts } = manuscript
  return (
    <dl className="grid grid-cols-[max-content_minmax(0,1fr)] gap-x-5 gap-y-2">
      <dt className="text-ink-soft">Handed in by</dt>
      <dd>
        {submitter ? (
          <>
            {submitter.name}
            {submitter.affiliation && (
              <span className="block text-xs text-ink-soft">{submitter.affiliation}</span>
            )}
          </>
        ) : (
          <span className="text-ink-soft">not shown under the house rules</span>
        )}
      </dd>
      {correspondingAuthor && (
        <>
          <dt className="text-ink-soft">Corresponding author</dt>
          <dd>
            {correspondingAuthor}
            {correspondingEmail && (
              <a href={`mailto:${correspondingEmail}`} className="block text-xs text-tide hover:underline">
                {correspondingEmail}
              </a>
            )}
          </dd>
        </>
      )}
      <dt className="text-ink-soft">Reviewer</dt>
      <dd>
        {assignment ? (
          <>
            {assignment.reviewer.name}
            <span className="text-ink-soft">, {assignmentWords[assignment.status]}</span>
            {(assignment.status === 'offered' || assignment.status === 'accepted') && (
              <span className="block text-xs">
                due <DueTime at={assignment.dueAt} />
              </span>
            )}
          </>
        ) : (
          <span className="text-ink-soft">nobody yet</span>
        )}
      </dd>
      {conflicts.length > 0 && (
        <>
          <dt className="text-ink-soft">Conflicts</dt>
          <dd>
            <ul className="flex flex-col gap-1">
              {conflicts.map((conflict) => (
                <li key={conflict.id}>
                  {conflict.person.name}: {conflict.reason}{' '}
                  <span className="text-xs text-ink-soft">
                    (<Time at={conflict.createdAt} show="short" />)
                  </span>{' '}
                  {conflictAction?.(conflict)}
                </li>
              ))}
            </ul>
          </dd>
        </>
      )}
    </dl>
  )
}

const assignmentWords = {
  offered: 'asked, not yet answered',
  accepted: 'has accepted',
  declined: 'has declined',
  ended: 'ended',
  done: 'has reported',
} as const
