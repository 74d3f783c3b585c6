import { expect, test } from 'vitest'
import type { Db } from '@/db/client'
import { getAudit } from '@/db/queries/audit'
import { getAuditProgress } from '@/db/queries/audit-progress'
import { listComments } from '@/db/queries/comments'
import { getDocketFacets, listDocket } from '@/db/queries/docket'
import { getFile } from '@/db/queries/file'
import { getHouseRules, listHouseRules } from '@/db/queries/house-rules'
import { getLetter } from '@/db/queries/letter'
import { listMails } from '@/db/queries/mails'
import { getManuscript } from '@/db/queries/manuscript'
import { getPerson, listPeople } from '@/db/queries/people'
import { listPoints } from '@/db/queries/points'
import { listRecord } from '@/db/queries/record'
import { listReviewers } from '@/db/queries/reviewers'
import { getVerdict } from '@/db/queries/verdict'
import { files } from '@/db/schema'
import { addFile } from '@/lib/desk/add-file'
import { changeHouseRules } from '@/lib/desk/change-house-rules'
import { answerAssignment } from '@/lib/desk/answer-assignment'
import { endAssignment } from '@/lib/desk/end-assignment'
import { handIn } from '@/lib/desk/hand-in'
import { offerAssignment } from '@/lib/desk/offer-assignment'
import { openRound } from '@/lib/desk/open-round'
import { releaseVerdict } from '@/lib/desk/release-verdict'
import { resolveComment } from '@/lib/desk/resolve-comment'
import { stopAudit } from '@/lib/desk/stop-audit'
import { writeComment } from '@/lib/desk/write-comment'
import { docketFilter } from '@/lib/rules/docket'
import { defaultFullHouseRules } from '@/lib/rules/house-rules'
import { systemActor, type Actor } from '@/lib/rules/roles'
import type { Blinding } from '@/lib/rules/words'
import { declare } from '../support/relate'
import {
  addManuscriptFile,
  finishAudit,
  makeManuscript,
  makePerson,
  makeWorld,
  morning,
  type World,
} from '../support/world'

const everything = docketFilter.parse({})

/** All that a person can read of a manuscript and around it, as one text. */
function readAll(db: Db, actor: Actor, id: string): string {
  const now = morning
  const view = getManuscript(db, actor, id)
  const rounds = view?.rounds.map((round) => round.number) ?? [1]
  return JSON.stringify([
    view,
    rounds.map((round) => [
      getAudit(db, actor, id, round),
      listPoints(db, actor, id, round),
      listComments(db, actor, id, round),
      getVerdict(db, actor, id, round),
      getLetter(db, actor, id, round),
    ]),
    db
      .select({ id: files.id })
      .from(files)
      .all()
      .map((file) => getFile(db, actor, file.id)),
    getAuditProgress(db, actor, id),
    listDocket(db, actor, everything, now),
    listDocket(db, actor, docketFilter.parse({ sort: 'reviewer', direction: 'asc' }), now),
    getDocketFacets(db, actor, {}, now),
    listRecord(db, actor),
    listRecord(db, actor, { manuscriptId: id }),
    listReviewers(db, actor, [id], now),
    listPeople(db, actor),
    listMails(db, actor),
    getHouseRules(db, actor),
    listHouseRules(db, actor),
    [getPerson(db, actor, actor.id)].map((person) => person?.id),
  ])
}

/** A manuscript whose first round is released and whose second is under review, with comments by everybody. */
function makeTalkative(world: World): string {
  const { db, submitter, reviewer, editor, now } = world
  const manuscriptId = makeManuscript(world, 'verdict drafted')
  const about = { manuscriptId, target: 'whole' as const, targetLabel: '', boxes: [] }
  const { commentId: parentId } = writeComment(
    db,
    reviewer,
    { ...about, audience: 'authors', body: 'Well described.' },
    now(),
  )
  writeComment(db, editor, { ...about, audience: 'authors', body: 'Indeed.', parentId }, now())
  resolveComment(db, reviewer, { commentId: parentId, resolved: true }, now())
  writeComment(db, reviewer, { ...about, audience: 'editor', body: 'For the editor only.' }, now())
  writeComment(db, reviewer, { ...about, audience: 'private', body: 'For me only.' }, now())
  releaseVerdict(db, editor, { manuscriptId }, now())
  openRound(db, submitter, { manuscriptId }, now())
  addManuscriptFile(world, submitter, manuscriptId)
  addFile(
    db,
    submitter,
    {
      manuscriptId,
      kind: 'table',
      name: 'Inglis results final.csv',
      mediaType: 'text/csv',
      sha256: 'f'.repeat(64),
      bytes: 20,
    },
    now(),
  )
  handIn(db, submitter, { manuscriptId }, now())
  finishAudit(world, manuscriptId)
  offerAssignment(db, editor, { manuscriptIds: [manuscriptId], reviewerId: reviewer.id }, now())
  answerAssignment(db, reviewer, { manuscriptId, accept: true, reason: '', conflict: false }, now())
  return manuscriptId
}

const ofReviewer = (reviewer: Actor) => ['Rurik', 'Tane', 'rurik.tane', reviewer.id]
const ofAuthors = (submitter: Actor) => ['Inglis', 'inglis', 'Isla', 'kelpbay', submitter.id]

function tellsAny(text: string, words: string[]): string[] {
  return words.filter((word) => text.includes(word))
}

test.each<[Blinding, boolean]>([
  ['single', false],
  ['double', false],
  ['open', true],
])('under “%s” it is %s that the submitter learns who the reviewer is', (blinding, told) => {
  const world = makeWorld({ blinding, submitterSeesAudit: true })
  const id = makeTalkative(world)
  const text = readAll(world.db, world.submitter, id)
  expect(text).toContain('Well described.')
  expect(tellsAny(text, ['Tane'])).toEqual(told ? ['Tane'] : [])
  if (!told) expect(tellsAny(text, ofReviewer(world.reviewer))).toEqual([])
  expect(text.includes('Reviewer 1')).toBe(!told)
  expect(tellsAny(text, ['For the editor only.', 'For me only.', 'Between us'])).toEqual([])
})

test.each<[Blinding, boolean]>([
  ['single', true],
  ['double', false],
  ['open', true],
])('under “%s” it is %s that the reviewer learns who the authors are', (blinding, told) => {
  const world = makeWorld({ blinding })
  const id = makeTalkative(world)
  const text = readAll(world.db, world.reviewer, id)
  expect(text).toContain('Kelp holdfasts under tow')
  expect(tellsAny(text, ['Inglis'])).toEqual(told ? ['Inglis'] : [])
  if (!told) {
    expect(tellsAny(text, ofAuthors(world.submitter))).toEqual([])
    expect(text).toContain('manuscript.pdf')
    expect(text).toContain('table.csv')
  }
})

test('an editor sees both, under every blinding', () => {
  const world = makeWorld({ blinding: 'double' })
  const text = readAll(world.db, world.editor, makeTalkative(world))
  expect(tellsAny(text, ['Inglis', 'Tane', 'For the editor only.', 'For me only.'])).toEqual([
    'Inglis',
    'Tane',
    'For the editor only.',
  ])
})

test('names that one round has hidden stay hidden when the house opens up later', () => {
  const world = makeWorld({ blinding: 'double' })
  const { db, editor, submitter, reviewer, now } = world
  const id = makeManuscript(world, 'returned')
  changeHouseRules(db, editor, { ...defaultFullHouseRules, blinding: 'open' }, now())
  openRound(db, submitter, { manuscriptId: id }, now())
  addManuscriptFile(world, submitter, id)
  handIn(db, submitter, { manuscriptId: id }, now())
  finishAudit(world, id)
  offerAssignment(db, editor, { manuscriptIds: [id], reviewerId: reviewer.id }, now())
  answerAssignment(db, reviewer, { manuscriptId: id, accept: true, reason: '', conflict: false }, now())
  expect(tellsAny(readAll(db, submitter, id), ofReviewer(reviewer))).toEqual([])
  expect(tellsAny(readAll(db, reviewer, id), ofAuthors(submitter))).toEqual([])
})

test('a second reviewer is another number, and the first one keeps theirs', () => {
  const world = makeWorld()
  const { db, editor, submitter, now } = world
  const id = makeManuscript(world, 'in review')
  endAssignment(db, editor, { manuscriptId: id, reason: 'Ill.' }, now())
  const second = makePerson(db, ['reviewer'], 'Sefa Nock')
  offerAssignment(db, editor, { manuscriptIds: [id], reviewerId: second.id }, now())
  // Nobody is named to the submitter before they accept.
  expect(getManuscript(db, submitter, id)?.assignment).toBeNull()
  expect(listDocket(db, submitter, everything, morning).rows[0]?.reviewer).toBeNull()
  answerAssignment(db, second, { manuscriptId: id, accept: true, reason: '', conflict: false }, now())
  expect(getManuscript(db, submitter, id)?.assignment?.reviewer).toEqual({ id: null, name: 'Reviewer 2' })
  expect(listDocket(db, submitter, everything, morning).rows[0]?.reviewer).toEqual({
    id: null,
    name: 'Reviewer 2',
  })
})

test('what a file is called does not show in why an audit stopped', () => {
  const world = makeWorld({ blinding: 'double' })
  const { db, submitter, reviewer, now } = world
  const id = makeManuscript(world, 'returned')
  openRound(db, submitter, { manuscriptId: id }, now())
  addManuscriptFile(world, submitter, id)
  const { auditId } = handIn(db, submitter, { manuscriptId: id }, now())
  stopAudit(db, systemActor, { auditId, trouble: 'Inglis kelp v7.pdf is encrypted.' }, now())
  expect(getAuditProgress(db, reviewer, id)?.trouble).toBe('manuscript.pdf is encrypted.')
  expect(getAuditProgress(db, submitter, id)?.trouble).toBe('Inglis kelp v7.pdf is encrypted.')
})

test('a search finds nobody by a name that is hidden from who searches', () => {
  const world = makeWorld({ blinding: 'double' })
  const { db, submitter, reviewer, editor } = world
  makeTalkative(world)
  const found = (actor: Actor, search: string) =>
    listDocket(db, actor, docketFilter.parse({ search }), morning).total
  expect([found(reviewer, 'Isla'), found(submitter, 'Rurik')]).toEqual([0, 0])
  expect([found(editor, 'isla'), found(editor, 'RURIK'), found(submitter, 'Isla')]).toEqual([1, 1, 1])
  expect([found(editor, '%'), found(editor, '_'), found(reviewer, 'kelp HOLD')]).toEqual([0, 0, 1])
})

test('an administrator learns nothing of a manuscript, and of their own not who reviews it', () => {
  const world = makeWorld()
  const id = makeTalkative(world)
  const text = readAll(world.db, world.administrator, id)
  expect(tellsAny(text, ['Kelp', 'granite', 'described', 'Dear authors', id])).toEqual([])
  expect(getManuscript(world.db, world.administrator, id)).toBeNull()
  expect(listRecord(world.db, world.administrator).rows.length).toBeGreaterThan(10)

  const both = makePerson(world.db, ['submitter', 'administrator'], 'Bo Ferry')
  const own = makeManuscript(world, 'in review', both)
  const { rows } = listMails(world.db, both, { pageSize: 500 })
  expect(rows.some((row) => row.recipient === world.reviewer.email && row.subject.includes('-0002'))).toBe(
    false,
  )
  const lines = listRecord(world.db, both, { pageSize: 500 }).rows
  expect(lines.filter((line) => line.manuscriptId !== null)).toEqual([])
  expect(lines.some((line) => line.at >= (getManuscript(world.db, both, own)?.createdAt ?? 0))).toBe(false)
})

test('strangers, whoever they are, get nothing at all', () => {
  const world = makeWorld()
  const id = makeTalkative(world)
  for (const role of ['submitter', 'reviewer'] as const) {
    const text = readAll(world.db, makePerson(world.db, [role], `Other ${role}`), id)
    expect(tellsAny(text, [id, 'Kelp', 'Inglis', 'Tane', 'THC-2026', 'granite', 'described'])).toEqual([])
  }
})

test('an editor with a conflict, or with a manuscript of their own, sees nothing of it as an editor', () => {
  const world = makeWorld()
  const id = makeTalkative(world)
  declare(world, world.editor, id)
  const text = readAll(world.db, world.editor, id)
  // The house's people are listed to editors; the manuscript and all of its record are not.
  expect(tellsAny(text, [id, 'Kelp', 'THC-2026', 'granite', 'described'])).toEqual([])

  const both = makePerson(world.db, ['submitter', 'editor'], 'Bo Ferry')
  const own = makeManuscript(world, 'verdict drafted', both)
  expect(getManuscript(world.db, both, own)).toMatchObject({
    sight: 'submitter',
    assignment: { reviewer: { id: null, name: 'Reviewer 1' } },
  })
  expect(getVerdict(world.db, both, own)).toBeNull()
  expect(getManuscript(world.db, both, own)?.actions).not.toContain('releaseVerdict')
  expect(listRecord(world.db, both, { manuscriptId: own }).rows).toEqual([])
})

test('a reviewer who has not accepted sees what it is about, and neither files nor audit', () => {
  const world = makeWorld()
  const { db, reviewer } = world
  const id = makeManuscript(world, 'assigned')
  const view = getManuscript(db, reviewer, id)
  expect(view).toMatchObject({ title: 'Kelp holdfasts under tow', sight: 'reviewer', progress: null })
  expect(view?.rounds[0]?.files).toEqual([])
  expect(view?.actions).toEqual(['answerAssignment', 'declareConflict'])
  const fileId = db.select({ id: files.id }).from(files).get()?.id ?? ''
  expect(getFile(db, reviewer, fileId)).toBeNull()
  expect(getAudit(db, reviewer, id)).toBeNull()
  expect(listPoints(db, reviewer, id)).toEqual([])
  expect(listDocket(db, reviewer, everything, morning).rows[0]).toMatchObject({
    outcomes: null,
    openPoints: null,
  })
})
