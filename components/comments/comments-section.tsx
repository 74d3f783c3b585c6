'use client'

import { useState } from 'react'
import type { CommentRow } from '@/db/queries/comments'
import { Failed } from '../shell/failed'
import { Button } from '../ui/button'
import { EmptyState } from '../ui/empty-state'
import { Skeleton } from '../ui/skeleton'
import { CommentForm } from './comment-form'
import { CommentThread, subjectWords } from './comment-thread'
import { makeThreads } from './threads'
import { useComments, useWriteComment, wholeManuscript, type CommentSubject } from './use-comments'

type CommentsSectionProps = {
  manuscriptId: string
  mayWrite: boolean
  /** What a new comment is about; null while none is being written. */
  subject: CommentSubject | null
  onSubject: (subject: CommentSubject | null) => void
  /** What is chosen on the screen, offered as a subject beside the whole. */
  offered?: CommentSubject | null
  /** Shows what a comment is about; absent where there is nothing to show it on. */
  onShow?: (comment: CommentRow) => void
}

/** All comments that the viewer may read, as threads, and a form for a new one. */
export function CommentsSection({
  manuscriptId,
  mayWrite,
  subject,
  onSubject,
  onShow,
  offered,
}: CommentsSectionProps) {
  const comments = useComments(manuscriptId)
  const write = useWriteComment(manuscriptId)
  const [resolvedToo, setResolvedToo] = useState(false)
  if (comments.isPending) return <Skeleton rows={3} label="Loading the comments" />
  if (comments.error) return <Failed error={comments.error} onRetry={() => void comments.refetch()} />
  const threads = makeThreads(comments.data)
  const open = threads.filter((thread) => thread.first.resolvedAt === null)
  const shown = resolvedToo ? threads : open
  const begin = (
    <div className="flex flex-wrap gap-2 print:hidden">
      <Button size="small" onClick={() => onSubject(wholeManuscript)}>
        Comment on the manuscript
      </Button>
      {offered && (
        <Button size="small" className="max-w-full" onClick={() => onSubject(offered)}>
          <span className="truncate">Comment {subjectWords(offered)}</span>
        </Button>
      )}
    </div>
  )
  return (
    <div className="flex flex-col gap-4">
      {subject && mayWrite ? (
        <div className="border border-rule bg-sheet p-4">
          <CommentForm
            key={`${subject.target}-${subject.targetKey}`}
            label={`New comment ${subjectWords(subject)}`}
            submit="Save the comment"
            busy={write.isPending}
            error={write.error?.message}
            onCancel={() => onSubject(null)}
            onSubmit={(comment) =>
              write.mutate({ ...subject, ...comment, parentId: null }, { onSuccess: () => onSubject(null) })
            }
          />
        </div>
      ) : (
        mayWrite && threads.length > 0 && begin
      )}
      {threads.length === 0 && !subject && (
        <EmptyState action={mayWrite ? begin : undefined}>
          {mayWrite ? 'Nobody has commented yet.' : 'There are no comments for you.'}
        </EmptyState>
      )}
      <ol className="flex flex-col gap-2">
        {shown.map((thread) => (
          <CommentThread
            key={thread.first.id}
            manuscriptId={manuscriptId}
            thread={thread}
            mayWrite={mayWrite}
            {...(onShow && thread.first.target !== 'whole' ? { onShow: () => onShow(thread.first) } : {})}
          />
        ))}
      </ol>
      {threads.length > open.length && (
        <Button
          size="small"
          variant="quiet"
          className="self-start print:hidden"
          onClick={() => setResolvedToo(!resolvedToo)}
        >
          {resolvedToo ? 'Hide resolved ones' : `Show ${threads.length - open.length} resolved`}
        </Button>
      )}
    </div>
  )
}
