'use client'

import { useState } from 'react'
import type { CommentRow } from '@/db/queries/comments'
import { Button } from '../ui/button'
import { classes } from '../ui/classes'
import { Time } from '../ui/time'
import { toast } from '../ui/toast'
import { AudienceMark } from './audience-mark'
import { CommentForm } from './comment-form'
import type { Thread } from './threads'
import { useChangeComment, useWriteComment } from './use-comments'

type CommentThreadProps = {
  manuscriptId: string
  thread: Thread
  mayWrite: boolean
  /** Leads to what it is about, where that can be shown. */
  onShow?: () => void
}

/** A comment, its replies, and what one can do with it. */
export function CommentThread({ manuscriptId, thread, mayWrite, onShow }: CommentThreadProps) {
  const { first, replies } = thread
  const [replying, setReplying] = useState(false)
  const write = useWriteComment(manuscriptId)
  const change = useChangeComment(manuscriptId)
  const resolved = first.resolvedAt !== null
  return (
    <li className={classes('margin-rule py-3 pl-4', resolved && 'text-ink-soft')}>
      <p className="mb-1 flex flex-wrap items-center gap-x-2 gap-y-1 text-xs">
        <AudienceMark audience={first.audience} />
        {onShow ? (
          <button type="button" onClick={onShow} className="text-tide hover:underline">
            {subjectWords(first)}
          </button>
        ) : (
          <span className="text-ink-soft">{subjectWords(first)}</span>
        )}
        {resolved && <span>resolved{first.resolvedBy ? ` by ${first.resolvedBy.name}` : ''}</span>}
      </p>
      <CommentBody manuscriptId={manuscriptId} comment={first} mayWrite={mayWrite} />
      {replies.map((reply) => (
        <div key={reply.id} className="mt-2 border-l border-rule pl-3">
          <CommentBody manuscriptId={manuscriptId} comment={reply} mayWrite={mayWrite} />
        </div>
      ))}
      {replying ? (
        <div className="mt-3">
          <CommentForm
            label="Your reply"
            submit="Reply"
            fixedAudience={first.audience}
            busy={write.isPending}
            error={write.error?.message}
            onCancel={() => setReplying(false)}
            onSubmit={({ body, audience }) =>
              write.mutate(
                {
                  target: first.target,
                  targetKey: first.targetKey,
                  targetLabel: first.targetLabel,
                  page: first.page,
                  boxes: first.boxes,
                  parentId: first.id,
                  audience,
                  body,
                },
                { onSuccess: () => setReplying(false) },
              )
            }
          />
        </div>
      ) : (
        mayWrite && (
          <div className="mt-1 -ml-2 flex gap-1 print:hidden">
            <Button size="small" variant="quiet" onClick={() => setReplying(true)}>
              Reply
            </Button>
            <Button
              size="small"
              variant="quiet"
              busy={change.isPending && 'Saving…'}
              onClick={() =>
                change.mutate(
                  { commentId: first.id, resolved: !resolved },
                  { onError: (error) => toast.error(error.message) },
                )
              }
            >
              {resolved ? 'Open again' : 'Resolve'}
            </Button>
          </div>
        )
      )}
    </li>
  )
}

function CommentBody(props: { manuscriptId: string; comment: CommentRow; mayWrite: boolean }) {
  const { manuscriptId, comment, mayWrite } = props
  const [editing, setEditing] = useState(false)
  const change = useChangeComment(manuscriptId)
  if (editing) {
    return (
      <CommentForm
        label="Your comment"
        submit="Save"
        initial={comment}
        {...(comment.parentId === null ? {} : { fixedAudience: comment.audience })}
        busy={change.isPending}
        error={change.error?.message}
        onCancel={() => setEditing(false)}
        onSubmit={(changed) =>
          change.mutate({ commentId: comment.id, ...changed }, { onSuccess: () => setEditing(false) })
        }
      />
    )
  }
  return (
    <>
      <p className="text-xs text-ink-soft">
        <span className="font-medium text-ink">{comment.own ? 'You' : comment.author.name}</span>,{' '}
        <Time at={comment.createdAt} show="moment" />
        {comment.changedAt !== null && ', changed'}
      </p>
      <p className="max-w-prose whitespace-pre-wrap">{comment.body}</p>
      {comment.own && mayWrite && (
        <Button size="small" variant="quiet" className="-ml-2 print:hidden" onClick={() => setEditing(true)}>
          Edit
        </Button>
      )}
    </>
  )
}

export function subjectWords(comment: Pick<CommentRow, 'target' | 'targetLabel' | 'page'>): string {
  const page = comment.page === null ? '' : `, page ${comment.page}`
  if (comment.target === 'whole') return 'on the whole manuscript'
  if (comment.targetLabel) return `on “${comment.targetLabel}”${page}`
  return `on a ${comment.target}${page}`
}
