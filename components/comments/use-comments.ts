import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import type { CommentRow } from '@/db/queries/comments'
import type { Box } from '@/lib/checks/types'
import type { Audience, CommentTarget } from '@/lib/rules/words'
import { manuscriptKeys, manuscriptUrl } from '../manuscripts/resources'
import { fetchJson } from '../shell/fetch-json'

/** Asked again every twenty seconds while it is looked at, so that two people can talk. */
export function useComments(manuscriptId: string) {
  return useQuery({
    queryKey: manuscriptKeys.comments(manuscriptId),
    queryFn: ({ signal }) => fetchJson<CommentRow[]>(manuscriptUrl(manuscriptId, '/comments'), { signal }),
    refetchInterval: 20_000,
  })
}

export type CommentSubject = {
  target: CommentTarget
  targetKey: string | null
  targetLabel: string
  page: number | null
  boxes: Box[]
}

export const wholeManuscript: CommentSubject = {
  target: 'whole',
  targetKey: null,
  targetLabel: '',
  page: null,
  boxes: [],
}

export type NewComment = CommentSubject & { audience: Audience; body: string; parentId: string | null }
export type CommentChange =
  { commentId: string; body: string; audience?: Audience } | { commentId: string; resolved: boolean }

export function useWriteComment(manuscriptId: string) {
  return useCommentMutation(manuscriptId, (comment: NewComment) =>
    fetchJson(manuscriptUrl(manuscriptId, '/comments'), { method: 'POST', body: comment }),
  )
}

export function useChangeComment(manuscriptId: string) {
  return useCommentMutation(manuscriptId, ({ commentId, ...change }: CommentChange) =>
    fetchJson(manuscriptUrl(manuscriptId, `/comments/${commentId}`), { method: 'PATCH', body: change }),
  )
}

function useCommentMutation<I>(manuscriptId: string, send: (input: I) => Promise<unknown>) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: send,
    onSuccess: () => client.invalidateQueries({ queryKey: manuscriptKeys.comments(manuscriptId) }),
  })
}
