import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { getLetter } from '@/db/queries/letter'
import { getManuscript } from '@/db/queries/manuscript'
import { listPoints } from '@/db/queries/points'
import { getVerdict } from '@/db/queries/verdict'
import { files, mails, manuscripts } from '@/db/schema'
import { addFile } from '@/lib/desk/add-file'
import { changeHouseRules } from '@/lib/desk/change-house-rules'
import { composeLetterBody } from '@/lib/desk/compose-letter-body'
import { decidePoint } from '@/lib/desk/decide-point'
import { discardDraft } from '@/lib/desk/discard-draft'
import { draftVerdict } from '@/lib/desk/draft-verdict'
import { handIn } from '@/lib/desk/hand-in'
import { handInAgain } from '@/lib/desk/hand-in-again'
import { movePoint } from '@/lib/desk/move-point'
import { openRound } from '@/lib/desk/open-round'
import { releaseVerdict } from '@/lib/desk/release-verdict'
import { removeFile } from '@/lib/desk/remove-file'
import { sendVerdictBack } from '@/lib/desk/send-verdict-back'
import { writeAnswer } from '@/lib/desk/write-answer'
import { defaultFullHouseRules } from '@/lib/rules/house-rules'
import {
  addManuscriptFile,
  day,
  finishAudit,
  listPointIds,
  makeDraft,
  makeManuscript,
  makePerson,
  makeWorld,
} from '../support/world'

test('under two-person release neither the reviewer nor an editor who reviewed releases the verdict', () => {
  const world = makeWorld({ twoPersonRelease: true })
  const both = makePerson(world.db, ['reviewer', 'editor'], 'Bo Ferry')
  const id = makeManuscript({ ...world, reviewer: both }, 'verdict drafted')
  const release = (who = both) => releaseVerdict(world.db, who, { manuscriptId: id }, world.now())
  expect(() => release()).toThrow('two people')
  expect(getManuscript(world.db, both, id)?.actions).not.toContain('releaseVerdict')
  expect(release(world.editor).version).toBe(1)

  const other = makeManuscript(world, 'verdict drafted')
  expect(() => releaseVerdict(world.db, world.reviewer, { manuscriptId: other }, world.now())).toThrow(
    'two people',
  )
})

test('where one person is enough the reviewer releases their own verdict', () => {
  const world = makeWorld({ twoPersonRelease: false })
  const id = makeManuscript(world, 'verdict drafted')
  releaseVerdict(world.db, world.reviewer, { manuscriptId: id }, world.now())
  expect(getManuscript(world.db, world.submitter, id)?.state).toBe('returned')
})

test('a released verdict is a letter as it was sent, a closed review, and nothing left to decide', () => {
  const world = makeWorld({ answerDays: 30 })
  const { db, editor, reviewer, submitter, now } = world
  const id = makeManuscript(world, 'returned')
  const letter = getLetter(db, submitter, id)
  expect(letter).toMatchObject({
    version: 1,
    subject: 'Tern Harbour Core: verdict on THC-2026-0001',
    body: 'Dear authors,\n\nplease see **point 1**.',
    html: '<p>Dear authors,</p>\n<p>please see <strong>point 1</strong>.</p>\n',
    text: 'Dear authors,\n\nplease see point 1.\n',
  })
  expect((letter?.answerBy ?? 0) - (letter?.sentAt ?? 0)).toBe(30 * day)
  const view = getManuscript(db, editor, id)
  expect(view).toMatchObject({
    dueAt: null,
    assignment: { status: 'done' },
    verdict: { verdict: 'sound after changes', round: 1 },
  })
  const pointId = listPointIds(db, id)[0] ?? ''
  expect(() => decidePoint(db, reviewer, { pointId, status: 'dropped' }, now())).toThrow('“returned”')
})

test('one mail goes out where the corresponding author handed it in, whatever the case of the address', () => {
  const world = makeWorld()
  const id = makeManuscript(world, 'verdict drafted')
  world.db
    .update(manuscripts)
    .set({ correspondingEmail: 'Isla.Inglis@TernHarbour.example' })
    .where(eq(manuscripts.id, id))
    .run()
  releaseVerdict(world.db, world.editor, { manuscriptId: id }, world.now())
  expect(world.db.select().from(mails).where(eq(mails.template, 'verdict')).all()).toHaveLength(1)
})

test('a verdict that was sent back is changed and drafted again as the same one', () => {
  const world = makeWorld()
  const { db, editor, reviewer, submitter, now } = world
  const id = makeManuscript(world, 'verdict drafted')
  const first = getVerdict(db, editor, id)
  expect(first).toMatchObject({ kept: 2, undecided: 2, remark: 'Between us: a careful paper.' })
  sendVerdictBack(db, editor, { manuscriptId: id, reason: 'Please soften point 1.' }, now())
  expect(getVerdict(db, reviewer, id)).toMatchObject({
    status: 'sent back',
    sentBackReason: 'Please soften point 1.',
  })
  const again = draftVerdict(
    db,
    reviewer,
    { manuscriptId: id, verdict: 'not supported', remark: '', body: 'Dear authors,' },
    now(),
  )
  expect(again.verdictId).toBe(first?.id)
  expect(getVerdict(db, editor, id)).toMatchObject({ status: 'drafted', verdict: 'not supported' })
  expect(getVerdict(db, submitter, id)).toBeNull()
  expect(getLetter(db, submitter, id)).toBeNull()
  // While it waits for its release the reviewer still changes it.
  draftVerdict(
    db,
    reviewer,
    { manuscriptId: id, verdict: 'sound', remark: '', body: 'Dear authors, sound.' },
    now(),
  )
  expect(getVerdict(db, editor, id)).toMatchObject({ verdict: 'sound', body: 'Dear authors, sound.' })
})

test('points are moved among each other, and the letter is composed of those that are kept', () => {
  const world = makeWorld()
  const { db, reviewer, now } = world
  const id = makeManuscript(world, 'in review')
  const [note = '', major = '', minor = '', question = ''] = listPointIds(db, id)
  movePoint(db, reviewer, { pointId: question, position: 0 }, now())
  movePoint(db, reviewer, { pointId: note, position: 99 }, now())
  expect(listPointIds(db, id)).toEqual([question, major, minor, note])
  decidePoint(db, reviewer, { pointId: minor, status: 'kept', severity: 'major' }, now())
  decidePoint(db, reviewer, { pointId: major, status: 'kept' }, now())
  decidePoint(db, reviewer, { pointId: note, status: 'dropped', reason: 'Not needed.' }, now())
  const { body } = composeLetterBody(db, reviewer, { manuscriptId: id, verdict: 'sound after changes' })
  expect(body.match(/^### .*$/gm)).toEqual([
    '### Point 1: attachment strength, all pairs of rocks, page 5',
    '### Point 2: blade length, results table, sheet strength, row 4',
  ])
})

test('a revision is begun, answered, handed in, and audited as the next round under the rules of its day', () => {
  const world = makeWorld({ blinding: 'open' })
  const { db, submitter, editor, reviewer, now } = world
  const id = makeManuscript(world, 'returned')
  const kept = listPoints(db, submitter, id)
  expect(kept.map(({ severity, reason, decidedBy }) => ({ severity, reason, decidedBy }))).toEqual([
    { severity: 'major', reason: '', decidedBy: null },
    { severity: 'note', reason: '', decidedBy: null },
  ])
  const pointId = kept[0]?.id ?? ''
  writeAnswer(db, submitter, { pointId, body: 'We planned three.' }, now())
  writeAnswer(db, submitter, { pointId, body: 'We planned three of the six.' }, now())
  expect(listPoints(db, editor, id)[1]?.answer?.body).toBe('We planned three of the six.')
  const dropped = listPointIds(db, id)[2] ?? ''
  expect(() => writeAnswer(db, submitter, { pointId: dropped, body: 'Which?' }, now())).toThrow(
    'nothing here',
  )

  expect(openRound(db, submitter, { manuscriptId: id }, now()).round).toBe(2)
  expect(() => openRound(db, submitter, { manuscriptId: id }, now())).toThrow('begun already')
  expect(() => handIn(db, submitter, { manuscriptId: id }, now())).toThrow('as a PDF')
  addManuscriptFile(world, submitter, id)
  // Nobody else sees what is not handed in.
  expect(getManuscript(db, editor, id)?.rounds).toHaveLength(1)
  expect(getManuscript(db, submitter, id)?.rounds).toHaveLength(2)
  changeHouseRules(db, editor, { ...defaultFullHouseRules, reviewDays: 5 }, now())
  expect(handIn(db, submitter, { manuscriptId: id }, now())).toMatchObject({
    reference: 'THC-2026-0001',
    round: 2,
  })
  finishAudit(world, id)
  const view = getManuscript(db, editor, id)
  expect(view).toMatchObject({ state: 'ready', round: 2, rules: { reviewDays: 5 } })
  expect(view?.rounds.map((round) => round.verdict?.verdict ?? null)).toEqual(['sound after changes', null])
  expect(() => writeAnswer(db, submitter, { pointId, body: 'Late.' }, now())).toThrow('“ready”')
  // Who reviewed the first round reads on, and decides nothing unless it is offered to them again.
  expect(getManuscript(db, reviewer, id)?.actions).not.toContain('decidePoint')
  expect(listPoints(db, reviewer, id, 1)[1]?.answer?.body).toBe('We planned three of the six.')
})

test('a revision that was begun can be thrown away, and the manuscript stays returned', () => {
  const world = makeWorld()
  const { db, submitter, now } = world
  const id = makeManuscript(world, 'returned')
  openRound(db, submitter, { manuscriptId: id }, now())
  discardDraft(db, submitter, { manuscriptId: id }, now())
  expect(getManuscript(db, submitter, id)).toMatchObject({ state: 'returned', round: 1 })
  expect(getManuscript(db, submitter, id)?.rounds).toHaveLength(1)
})

test('a draft that lacks something says what, and a discarded one is gone', () => {
  const world = makeWorld()
  const { db, submitter, now } = world
  const id = makeDraft(world)
  const fileId = db.select({ id: files.id }).from(files).get()?.id ?? ''
  removeFile(db, submitter, { fileId }, now())
  expect(() => handIn(db, submitter, { manuscriptId: id }, now())).toThrow('add the manuscript as a PDF')
  discardDraft(db, submitter, { manuscriptId: id }, now())
  expect(getManuscript(db, submitter, id)).toBeNull()
  expect(db.select().from(files).all()).toEqual([])
})

test('after a replaced file a stuck manuscript is handed in again; the old file is kept', () => {
  const world = makeWorld()
  const { db, submitter, now } = world
  const id = makeManuscript(world, 'stuck')
  const { replaced } = addFile(
    db,
    submitter,
    {
      manuscriptId: id,
      kind: 'manuscript',
      name: 'v8.pdf',
      mediaType: 'application/pdf',
      sha256: 'e'.repeat(64),
      bytes: 10,
    },
    now(),
  )
  expect(replaced).not.toBeNull()
  handInAgain(db, submitter, { manuscriptId: id }, now())
  const view = getManuscript(db, submitter, id)
  expect(view?.state).toBe('received')
  expect(view?.rounds[0]?.files.map(({ name, replacedAt }) => [name, replacedAt === null])).toEqual([
    ['Inglis kelp v7.pdf', false],
    ['v8.pdf', true],
  ])
})
