'use client'

import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import type { DocketRow } from '@/db/queries/docket'
import type { ReviewerRow } from '@/db/queries/reviewers'
import { Failed } from '../shell/failed'
import { fetchJson } from '../shell/fetch-json'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { EmptyState } from '../ui/empty-state'
import { Field, Input } from '../ui/field'
import { fromDateField, toDateField } from '../ui/format-time'
import { Notice } from '../ui/notice'
import { Skeleton } from '../ui/skeleton'
import { toast } from '../ui/toast'
import { ReviewerChoice } from './reviewer-choice'

export type AssignInput = { manuscriptIds: string[]; reviewerId: string; dueAt: number }

type AssignDialogProps = {
  manuscripts: readonly Pick<DocketRow, 'id' | 'reference' | 'title'>[]
  reviewDays: number
  offer: (input: AssignInput) => Promise<Answer<unknown>>
  onClose: () => void
  onDone: () => void
}

const day = 86_400_000

/** Offers one or several manuscripts to a reviewer, with a due date. */
export function AssignDialog({ manuscripts, reviewDays, offer, onClose, onDone }: AssignDialogProps) {
  const ids = manuscripts.map((manuscript) => manuscript.id)
  const zone = Intl.DateTimeFormat().resolvedOptions().timeZone
  const [reviewerId, setReviewerId] = useState<string | null>(null)
  const [due, setDue] = useState(() => toDateField(Date.now() + reviewDays * day, zone))
  const [today] = useState(() => toDateField(Date.now(), zone))
  const dueAt = fromDateField(due)
  const reviewers = useQuery({
    queryKey: ['reviewers', ids],
    queryFn: ({ signal }) =>
      fetchJson<ReviewerRow[]>(
        `/api/reviewers?${new URLSearchParams(ids.map((id) => ['manuscriptIds', id]))}`,
        { signal },
      ),
  })
  const { run, pending, message, fields } = useAction(offer, () => {
    toast.success(ids.length === 1 ? 'The review is offered.' : `${ids.length} reviews are offered.`)
    onDone()
    onClose()
  })
  return (
    <Dialog
      open
      wide
      onOpenChange={(open) => !open && onClose()}
      title={ids.length === 1 ? 'Assign a reviewer' : `Assign a reviewer to ${ids.length} manuscripts`}
      description={manuscripts.map((manuscript) => manuscript.reference ?? manuscript.title).join(', ')}
      footer={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button
            variant="primary"
            disabled={reviewerId === null || dueAt === null}
            busy={pending && 'Assigning…'}
            onClick={() => reviewerId && dueAt !== null && run({ manuscriptIds: ids, reviewerId, dueAt })}
          >
            Assign
          </Button>
        </>
      }
    >
      <div className="flex flex-col gap-4">
        {message ? <Notice tone="trouble">{message}</Notice> : null}
        {reviewers.isError ? (
          <Failed error={reviewers.error} onRetry={() => void reviewers.refetch()} />
        ) : reviewers.isPending ? (
          <Skeleton rows={4} label="Loading the reviewers" />
        ) : reviewers.data.length === 0 ? (
          <EmptyState>There is no active reviewer; an administrator can invite one under People.</EmptyState>
        ) : (
          <ReviewerChoice reviewers={reviewers.data} value={reviewerId} onChange={setReviewerId} />
        )}
        <Field
          label="Due"
          hint={`The house rules give ${reviewDays} days.`}
          error={fields.dueAt ?? (dueAt === null ? 'Please choose a day.' : undefined)}
          className="max-w-48"
        >
          <Input type="date" min={today} value={due} onChange={(event) => setDue(event.target.value)} />
        </Field>
      </div>
    </Dialog>
  )
}
