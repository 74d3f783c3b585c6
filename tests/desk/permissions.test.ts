import { eq } from 'drizzle-orm'
import { beforeAll, expect, test } from 'vitest'
import { newId } from '@/db/ids'
import { comments, files, verdicts } from '@/db/schema'
import { addFile } from '@/lib/desk/add-file'
import { addPoint } from '@/lib/desk/add-point'
import { answerAssignment } from '@/lib/desk/answer-assignment'
import { changeComment } from '@/lib/desk/change-comment'
import { changeDraft } from '@/lib/desk/change-draft'
import { changeHouseRules } from '@/lib/desk/change-house-rules'
import { changePerson } from '@/lib/desk/change-person'
import { closeManuscript } from '@/lib/desk/close-manuscript'
import { composeLetterBody } from '@/lib/desk/compose-letter-body'
import { createDraft } from '@/lib/desk/create-draft'
import { decidePoint } from '@/lib/desk/decide-point'
import { declareConflict } from '@/lib/desk/declare-conflict'
import { discardDraft } from '@/lib/desk/discard-draft'
import { draftVerdict } from '@/lib/desk/draft-verdict'
import { endAssignment } from '@/lib/desk/end-assignment'
import { handIn } from '@/lib/desk/hand-in'
import { handInAgain } from '@/lib/desk/hand-in-again'
import { invitePerson } from '@/lib/desk/invite-person'
import { keepAudit } from '@/lib/desk/keep-audit'
import { liftConflict } from '@/lib/desk/lift-conflict'
import { movePoint } from '@/lib/desk/move-point'
import { nameColumns } from '@/lib/desk/name-columns'
import { offerAssignment } from '@/lib/desk/offer-assignment'
import { openRound } from '@/lib/desk/open-round'
import { releaseVerdict } from '@/lib/desk/release-verdict'
import { removeFile } from '@/lib/desk/remove-file'
import { resolveComment } from '@/lib/desk/resolve-comment'
import { runAuditAgain } from '@/lib/desk/run-audit-again'
import { sendVerdictBack } from '@/lib/desk/send-verdict-back'
import { stopAudit } from '@/lib/desk/stop-audit'
import { withdrawManuscript } from '@/lib/desk/withdraw-manuscript'
import { writeAnswer } from '@/lib/desk/write-answer'
import { writeComment } from '@/lib/desk/write-comment'
import { defaultFullHouseRules } from '@/lib/rules/house-rules'
import { isRefusal } from '@/lib/rules/refusal'
import { ROLES, systemActor, type Actor, type Role } from '@/lib/rules/roles'
import type { State } from '@/lib/rules/states'
import { declare, relate, RELATIONS, type Relation } from '../support/relate'
import { makeSmallAudit } from '../support/small-audit'
import {
  addTableRow,
  dump,
  getNewestAudit,
  getRoundId,
  listPointIds,
  makeManuscript,
  makePerson,
  makeWorld,
  rehearse,
  type World,
} from '../support/world'

type Attempt = (world: World, actor: Actor, manuscriptId: string, prepared: string) => unknown
type Row = {
  /** Where the manuscript stands when it is tried. */
  at: State
  /** Who may, by role, and how they stand to the manuscript: written out here, not taken from the code. */
  may: Partial<Record<Role, string>>
  /** What has to be there before, beside the manuscript; gives its id. */
  prepare?: (world: World, actor: Actor, manuscriptId: string) => string
  /** Who is refused otherwise than as if there were nothing, and how. */
  refused?: Record<string, string>
  try: Attempt
}

const everyone = 'own offered assigned none conflicted'
const notBarred = 'offered assigned none'

function fileOf({ db }: World, manuscriptId: string): string {
  const roundId = getRoundId(db, manuscriptId)
  return db.select({ id: files.id }).from(files).where(eq(files.roundId, roundId)).get()?.id ?? ''
}

function commentBy({ db, now }: World, author: Actor, manuscriptId: string): string {
  const id = newId('comment')
  db.insert(comments)
    .values({
      id,
      roundId: getRoundId(db, manuscriptId),
      authorId: author.id,
      audience: 'authors',
      target: 'whole',
      body: 'Well described.',
      createdAt: now(),
    })
    .run()
  return id
}

function nameOneColumn({ db, now }: World, actor: Actor, _manuscriptId: string, fileId: string) {
  const columns = [{ sheet: 0, row: 0, column: 2, role: 'p-unadjusted' as const }]
  return nameColumns(db, actor, { fileId, revision: 0, columns }, now())
}

function makeVerdictOwn({ db }: World, actor: Actor, manuscriptId: string): string {
  const roundId = getRoundId(db, manuscriptId)
  db.update(verdicts).set({ reviewerId: actor.id }).where(eq(verdicts.roundId, roundId)).run()
  return roundId
}

const commands: Record<string, Row> = {
  createDraft: {
    at: 'ready',
    may: { submitter: everyone },
    try: ({ db, now }, actor) => createDraft(db, actor, { title: '' }, now()),
  },
  changeDraft: {
    at: 'draft',
    may: { submitter: 'own' },
    try: ({ db, now }, actor, manuscriptId) => changeDraft(db, actor, { manuscriptId, title: 'New' }, now()),
  },
  discardDraft: {
    at: 'draft',
    may: { submitter: 'own' },
    try: ({ db, now }, actor, manuscriptId) => discardDraft(db, actor, { manuscriptId }, now()),
  },
  addFile: {
    at: 'draft',
    may: { submitter: 'own' },
    try: ({ db, now }, actor, manuscriptId) =>
      addFile(
        db,
        actor,
        {
          manuscriptId,
          kind: 'table',
          name: 'results.csv',
          mediaType: 'text/csv',
          sha256: 'd'.repeat(64),
          bytes: 9,
        },
        now(),
      ),
  },
  removeFile: {
    at: 'draft',
    may: { submitter: 'own' },
    try: (world, actor, manuscriptId) =>
      removeFile(world.db, actor, { fileId: fileOf(world, manuscriptId) }, world.now()),
  },
  'nameColumns of a draft': {
    at: 'draft',
    may: { submitter: 'own' },
    prepare: (world, _, manuscriptId) => addTableRow(world.db, manuscriptId),
    try: nameOneColumn,
  },
  'nameColumns of what is reviewed': {
    at: 'in review',
    may: { reviewer: 'assigned', editor: notBarred },
    refused: { 'submitter own': 'conflict' },
    prepare: (world, _, manuscriptId) => addTableRow(world.db, manuscriptId),
    try: nameOneColumn,
  },
  handIn: {
    at: 'draft',
    may: { submitter: 'own' },
    try: ({ db, now }, actor, manuscriptId) => handIn(db, actor, { manuscriptId }, now()),
  },
  handInAgain: {
    at: 'stuck',
    may: { submitter: 'own' },
    try: ({ db, now }, actor, manuscriptId) => handInAgain(db, actor, { manuscriptId }, now()),
  },
  withdrawManuscript: {
    at: 'in review',
    may: { submitter: 'own' },
    try: ({ db, now }, actor, manuscriptId) =>
      withdrawManuscript(db, actor, { manuscriptId, reason: '' }, now()),
  },
  openRound: {
    at: 'returned',
    may: { submitter: 'own' },
    try: ({ db, now }, actor, manuscriptId) => openRound(db, actor, { manuscriptId }, now()),
  },
  writeAnswer: {
    at: 'returned',
    may: { submitter: 'own' },
    try: ({ db, now }, actor, manuscriptId) =>
      writeAnswer(db, actor, { pointId: listPointIds(db, manuscriptId)[0] ?? '', body: 'We agree.' }, now()),
  },
  runAuditAgain: {
    at: 'stuck',
    may: { reviewer: 'assigned', editor: notBarred },
    try: ({ db, now }, actor, manuscriptId) => runAuditAgain(db, actor, { manuscriptId }, now()),
  },
  keepAudit: {
    at: 'received',
    may: {},
    try: ({ db, now }, actor, manuscriptId) =>
      keepAudit(db, actor, { auditId: getNewestAudit(db, manuscriptId), audit: makeSmallAudit() }, now()),
  },
  stopAudit: {
    at: 'received',
    may: {},
    try: ({ db, now }, actor, manuscriptId) =>
      stopAudit(db, actor, { auditId: getNewestAudit(db, manuscriptId), trouble: 'Encrypted.' }, now()),
  },
  offerAssignment: {
    at: 'ready',
    may: { editor: notBarred },
    try: ({ db, now, reviewer }, actor, manuscriptId) =>
      offerAssignment(db, actor, { manuscriptIds: [manuscriptId], reviewerId: reviewer.id }, now()),
  },
  answerAssignment: {
    at: 'assigned',
    may: { reviewer: 'offered' },
    try: ({ db, now }, actor, manuscriptId) =>
      answerAssignment(db, actor, { manuscriptId, accept: true, reason: '', conflict: false }, now()),
  },
  endAssignment: {
    at: 'in review',
    may: { editor: notBarred },
    try: ({ db, now }, actor, manuscriptId) =>
      endAssignment(db, actor, { manuscriptId, reason: 'Too late.' }, now()),
  },
  declareConflict: {
    at: 'in review',
    may: { reviewer: 'offered assigned', editor: notBarred },
    try: ({ db, now }, actor, manuscriptId) =>
      declareConflict(db, actor, { manuscriptId, reason: 'A co-author.' }, now()),
  },
  'declareConflict of another': {
    at: 'in review',
    may: { editor: notBarred },
    try: ({ db, now, reviewer }, actor, manuscriptId) =>
      declareConflict(db, actor, { manuscriptId, personId: reviewer.id, reason: 'Their co-author.' }, now()),
  },
  liftConflict: {
    at: 'ready',
    may: { editor: notBarred },
    prepare: (world, _, manuscriptId) => declare(world, world.reviewer, manuscriptId),
    try: ({ db, now }, actor, _, conflictId) => liftConflict(db, actor, { conflictId }, now()),
  },
  decidePoint: {
    at: 'in review',
    may: { reviewer: 'assigned' },
    try: ({ db, now }, actor, manuscriptId) =>
      decidePoint(db, actor, { pointId: listPointIds(db, manuscriptId)[0] ?? '', status: 'kept' }, now()),
  },
  movePoint: {
    at: 'in review',
    may: { reviewer: 'assigned' },
    try: ({ db, now }, actor, manuscriptId) =>
      movePoint(db, actor, { pointId: listPointIds(db, manuscriptId)[0] ?? '', position: 2 }, now()),
  },
  addPoint: {
    at: 'in review',
    may: { reviewer: 'assigned' },
    try: ({ db, now }, actor, manuscriptId) =>
      addPoint(
        db,
        actor,
        { manuscriptId, severity: 'minor', says: '', asks: 'Please name it.', familyLabel: '', quote: '' },
        now(),
      ),
  },
  writeComment: {
    at: 'in review',
    may: { reviewer: 'assigned', editor: notBarred },
    try: ({ db, now }, actor, manuscriptId) =>
      writeComment(
        db,
        actor,
        { manuscriptId, audience: 'authors', target: 'whole', targetLabel: '', boxes: [], body: 'Good.' },
        now(),
      ),
  },
  'changeComment of one’s own': {
    at: 'in review',
    may: { reviewer: 'assigned', editor: notBarred },
    prepare: commentBy,
    try: ({ db, now }, actor, _, commentId) =>
      changeComment(db, actor, { commentId, body: 'Better.' }, now()),
  },
  resolveComment: {
    at: 'in review',
    may: { reviewer: 'assigned', editor: notBarred },
    prepare: (world, _, manuscriptId) => commentBy(world, world.editor, manuscriptId),
    try: ({ db, now }, actor, _, commentId) =>
      resolveComment(db, actor, { commentId, resolved: true }, now()),
  },
  composeLetterBody: {
    at: 'in review',
    may: { reviewer: 'assigned', editor: notBarred },
    try: ({ db }, actor, manuscriptId) => composeLetterBody(db, actor, { manuscriptId, verdict: 'sound' }),
  },
  draftVerdict: {
    at: 'in review',
    may: { reviewer: 'assigned' },
    try: ({ db, now }, actor, manuscriptId) =>
      draftVerdict(db, actor, { manuscriptId, verdict: 'sound', remark: '', body: 'Dear authors,' }, now()),
  },
  sendVerdictBack: {
    at: 'verdict drafted',
    may: { editor: notBarred },
    try: ({ db, now }, actor, manuscriptId) =>
      sendVerdictBack(db, actor, { manuscriptId, reason: 'Point 2 is unclear.' }, now()),
  },
  'releaseVerdict of another': {
    at: 'verdict drafted',
    may: { editor: notBarred },
    try: ({ db, now }, actor, manuscriptId) => releaseVerdict(db, actor, { manuscriptId }, now()),
  },
  'releaseVerdict of one’s own, by one person': {
    at: 'verdict drafted',
    may: { reviewer: 'assigned', editor: notBarred },
    prepare: makeVerdictOwn,
    try: ({ db, now }, actor, manuscriptId) => releaseVerdict(db, actor, { manuscriptId }, now()),
  },
  closeManuscript: {
    at: 'returned',
    may: { editor: notBarred },
    try: ({ db, now }, actor, manuscriptId) => closeManuscript(db, actor, { manuscriptId }, now()),
  },
  changeHouseRules: {
    at: 'ready',
    may: { editor: everyone },
    try: ({ db, now }, actor) => changeHouseRules(db, actor, defaultFullHouseRules, now()),
  },
  invitePerson: {
    at: 'ready',
    may: { administrator: everyone },
    try: ({ db, now }, actor) =>
      invitePerson(
        db,
        actor,
        {
          email: 'new@ternharbour.example',
          name: 'Nia Holt',
          affiliation: '',
          expertise: '',
          roles: ['reviewer'],
        },
        now(),
      ),
  },
  changePerson: {
    at: 'ready',
    may: { administrator: everyone },
    try: ({ db, now, reviewer }, actor) =>
      changePerson(db, actor, { personId: reviewer.id, name: 'R. Tane' }, now()),
  },
}

const states = [...new Set(Object.values(commands).map((row) => row.at))]
let world: World
let manuscripts: Record<string, string>
let people: Record<Role, Actor>

beforeAll(() => {
  world = makeWorld({ twoPersonRelease: false })
  manuscripts = Object.fromEntries(states.map((state) => [state, makeManuscript(world, state)]))
  people = Object.fromEntries(
    ROLES.map((role) => [role, makePerson(world.db, [role], `Some ${role}`)]),
  ) as Record<Role, Actor>
})

/** 'done', or the kind of refusal; what was written is taken back. */
function attempt(row: Row, actor: Actor, relation: Relation): string {
  const manuscriptId = manuscripts[row.at] ?? ''
  return rehearse(world.db, () => {
    relate(world, actor, manuscriptId, relation)
    const prepared = row.prepare?.(world, actor, manuscriptId) ?? ''
    const before = dump(world.db)
    try {
      row.try(world, actor, manuscriptId, prepared)
      return 'done'
    } catch (error) {
      if (!isRefusal(error)) throw error
      return dump(world.db) === before ? error.refusal : `${error.refusal}, but something was written`
    }
  })
}

test.each(Object.entries(commands))('%s is done for whom the table names, and for nobody else', (_, row) => {
  const found: Record<string, string> = {}
  const expected: Record<string, string> = {}
  for (const role of ROLES) {
    for (const relation of RELATIONS) {
      const allowed = row.may[role]?.split(' ').includes(relation)
      expected[`${role} ${relation}`] = allowed
        ? 'done'
        : (row.refused?.[`${role} ${relation}`] ?? 'not-found')
      found[`${role} ${relation}`] = attempt(row, people[role], relation)
    }
  }
  expect(found).toEqual(expected)
})

// Every command that writes; the system's two are tried as the system.
const writing = Object.entries(commands).filter(([name]) => name !== 'composeLetterBody')

test.each(writing)('%s leaves nothing behind when its line in the record fails', (_, row) => {
  const role = ROLES.find((candidate) => row.may[candidate] !== undefined)
  const relation = RELATIONS.find((one) => role && row.may[role]?.split(' ').includes(one)) ?? 'none'
  const actor = role ? people[role] : systemActor
  const manuscriptId = manuscripts[row.at] ?? ''
  rehearse(world.db, () => {
    if (role) relate(world, actor, manuscriptId, relation)
    const prepared = row.prepare?.(world, actor, manuscriptId) ?? ''
    world.db.$client.exec(
      `create trigger full before insert on record begin select raise(abort, 'the disk is full'); end`,
    )
    const before = dump(world.db)
    expect(() => row.try(world, actor, manuscriptId, prepared)).toThrow('the disk is full')
    expect(dump(world.db)).toBe(before)
  })
})
