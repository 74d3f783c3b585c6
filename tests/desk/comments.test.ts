import { expect, test } from 'vitest'
import { listComments } from '@/db/queries/comments'
import { changeComment } from '@/lib/desk/change-comment'
import { composeLetterBody } from '@/lib/desk/compose-letter-body'
import { releaseVerdict } from '@/lib/desk/release-verdict'
import { resolveComment } from '@/lib/desk/resolve-comment'
import { writeComment } from '@/lib/desk/write-comment'
import type { Actor } from '@/lib/rules/roles'
import type { Audience } from '@/lib/rules/words'
import { makeManuscript, makePerson, makeWorld, type World } from '../support/world'

function say(
  { db, now }: World,
  actor: Actor,
  manuscriptId: string,
  audience: Audience,
  body: string,
  parentId?: string,
) {
  return writeComment(
    db,
    actor,
    {
      manuscriptId,
      audience,
      target: 'family',
      targetKey: 'f1',
      targetLabel: 'attachment strength',
      page: 5,
      boxes: [[72, 500, 140, 512]],
      parentId,
      body,
    },
    now(),
  ).commentId
}

const bodies = (world: World, actor: Actor, id: string) =>
  listComments(world.db, actor, id).map((c) => c.body)

test('private is for one, “editor” for the editors and whom they answer, “authors” for all in their time', () => {
  const world = makeWorld()
  const { db, reviewer, editor, submitter, now } = world
  const second = makePerson(db, ['editor'], 'Mo Strand')
  const id = makeManuscript(world, 'verdict drafted')
  say(world, reviewer, id, 'private', 'R to self')
  const asked = say(world, reviewer, id, 'editor', 'R to editor')
  say(world, editor, id, 'editor', 'E answers R', asked)
  say(world, editor, id, 'editor', 'E to editors')
  say(world, editor, id, 'private', 'E to self')
  say(world, reviewer, id, 'authors', 'R to authors')
  expect(bodies(world, reviewer, id)).toEqual(['R to self', 'R to editor', 'E answers R', 'R to authors'])
  expect(bodies(world, editor, id)).toEqual([
    'R to editor',
    'E answers R',
    'E to editors',
    'E to self',
    'R to authors',
  ])
  expect(bodies(world, second, id)).toEqual(['R to editor', 'E answers R', 'E to editors', 'R to authors'])
  expect(bodies(world, submitter, id)).toEqual([])
  releaseVerdict(db, editor, { manuscriptId: id }, now())
  expect(bodies(world, submitter, id)).toEqual(['R to authors'])
  expect(listComments(db, submitter, id)[0]).toMatchObject({
    author: { id: null, name: 'Reviewer 1' },
    own: false,
    target: 'family',
    targetLabel: 'attachment strength',
    page: 5,
    boxes: [[72, 500, 140, 512]],
  })
})

test('another’s private comment is not there to be answered, settled or changed', () => {
  const world = makeWorld()
  const { db, reviewer, editor, now } = world
  const id = makeManuscript(world, 'in review')
  const hidden = say(world, reviewer, id, 'private', 'R to self')
  expect(() => say(world, editor, id, 'authors', 'What?', hidden)).toThrow('nothing here')
  expect(() => resolveComment(db, editor, { commentId: hidden, resolved: true }, now())).toThrow(
    'nothing here',
  )
  const open = say(world, reviewer, id, 'authors', 'R to authors')
  expect(() => changeComment(db, editor, { commentId: open, body: 'Else.' }, now())).toThrow('Only who wrote')
  const ofEditors = say(world, editor, id, 'editor', 'E to editors')
  expect(() => resolveComment(db, reviewer, { commentId: ofEditors, resolved: true }, now())).toThrow(
    'nothing here',
  )
})

test('what the authors were sent is not changed any more', () => {
  const world = makeWorld()
  const { db, reviewer, editor, now } = world
  const id = makeManuscript(world, 'verdict drafted')
  const commentId = say(world, reviewer, id, 'authors', 'R to authors')
  changeComment(db, reviewer, { commentId, body: 'Better said.' }, now())
  releaseVerdict(db, editor, { manuscriptId: id }, now())
  expect(() => changeComment(db, reviewer, { commentId, body: 'Taken back.' }, now())).toThrow('been sent')
  expect(bodies(world, editor, id)).toEqual(['Better said.'])
})

test('the letter takes the comments for the authors that are not settled', () => {
  const world = makeWorld()
  const { db, reviewer, now } = world
  const id = makeManuscript(world, 'in review')
  say(world, reviewer, id, 'authors', 'Clearly described.\n\nThank you.')
  const settled = say(world, reviewer, id, 'authors', 'Settled by now.')
  resolveComment(db, reviewer, { commentId: settled, resolved: true }, now())
  say(world, reviewer, id, 'editor', 'For the editor only.')
  say(world, reviewer, id, 'private', 'For me only.')
  const { body } = composeLetterBody(db, reviewer, { manuscriptId: id, verdict: 'sound' })
  expect(body).toContain('- (attachment strength, page 5) Clearly described.\n\n  Thank you.')
  expect(body).not.toMatch(/Settled|editor only|me only/)
})

test('a closed or withdrawn manuscript takes no more comments', () => {
  const world = makeWorld()
  for (const state of ['closed', 'withdrawn'] as const) {
    const id = makeManuscript(world, state)
    expect(() => say(world, world.editor, id, 'editor', 'Late.')).toThrow(`“${state}”`)
  }
})
