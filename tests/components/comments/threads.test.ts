import { expect, test } from 'vitest'
import { makeThreads } from '@/components/comments/threads'
import type { CommentRow } from '@/db/queries/comments'

const makeComment = (id: string, parentId: string | null = null): CommentRow => ({
  id,
  round: 1,
  author: { id: 'pe_1', name: 'Rune Spar' },
  own: false,
  audience: 'editor',
  target: 'whole',
  targetKey: null,
  targetLabel: '',
  page: null,
  boxes: [],
  parentId,
  body: 'x',
  createdAt: 0,
  changedAt: null,
  resolvedAt: null,
  resolvedBy: null,
})

test('replies stand under what they reply to, in their order', () => {
  const threads = makeThreads([
    makeComment('a'),
    makeComment('b'),
    makeComment('c', 'a'),
    makeComment('d', 'a'),
  ])
  expect(threads.map(({ first, replies }) => [first.id, replies.map((reply) => reply.id)])).toEqual([
    ['a', ['c', 'd']],
    ['b', []],
  ])
})

test('a reply to a comment that the viewer may not see is not lost', () => {
  expect(makeThreads([makeComment('c', 'hidden')]).map(({ first }) => first.id)).toEqual(['c'])
})
