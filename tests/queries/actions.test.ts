import { expect, test } from 'vitest'
import { getAudit } from '@/db/queries/audit'
import { getAuditProgress } from '@/db/queries/audit-progress'
import { getLetter } from '@/db/queries/letter'
import { getManuscript } from '@/db/queries/manuscript'
import { addPoint } from '@/lib/desk/add-point'
import { addFile } from '@/lib/desk/add-file'
import { answerAssignment } from '@/lib/desk/answer-assignment'
import { changeDraft } from '@/lib/desk/change-draft'
import { closeManuscript } from '@/lib/desk/close-manuscript'
import { declareConflict } from '@/lib/desk/declare-conflict'
import { discardDraft } from '@/lib/desk/discard-draft'
import { draftVerdict } from '@/lib/desk/draft-verdict'
import { endAssignment } from '@/lib/desk/end-assignment'
import { handIn } from '@/lib/desk/hand-in'
import { handInAgain } from '@/lib/desk/hand-in-again'
import { nameColumns } from '@/lib/desk/name-columns'
import { offerAssignment } from '@/lib/desk/offer-assignment'
import { openRound } from '@/lib/desk/open-round'
import { releaseVerdict } from '@/lib/desk/release-verdict'
import { runAuditAgain } from '@/lib/desk/run-audit-again'
import { sendVerdictBack } from '@/lib/desk/send-verdict-back'
import { withdrawManuscript } from '@/lib/desk/withdraw-manuscript'
import { writeComment } from '@/lib/desk/write-comment'
import type { Action } from '@/lib/rules/actions'
import { isRefusal } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { STATES } from '@/lib/rules/states'
import {
  addManuscriptFile,
  addTableRow,
  makeManuscript,
  makePerson,
  makeWorld,
  rehearse,
  type World,
} from '../support/world'

type Try = (world: World, actor: Actor, manuscriptId: string) => unknown

const attempts: Partial<Record<Action, Try>> = {
  changeDraft: ({ db, now }, actor, manuscriptId) =>
    changeDraft(db, actor, { manuscriptId, note: 'N' }, now()),
  discardDraft: ({ db, now }, actor, manuscriptId) => discardDraft(db, actor, { manuscriptId }, now()),
  addFile: ({ db, now }, actor, manuscriptId) =>
    addFile(
      db,
      actor,
      {
        manuscriptId,
        kind: 'table',
        name: 'r.csv',
        mediaType: 'text/csv',
        sha256: 'd'.repeat(64),
        bytes: 9,
      },
      now(),
    ),
  nameColumns: ({ db, now }, actor, manuscriptId) =>
    nameColumns(
      db,
      actor,
      {
        fileId: addTableRow(db, manuscriptId),
        revision: 0,
        columns: [{ sheet: 0, row: 0, column: 1, role: 'p' }],
      },
      now(),
    ),
  handIn: ({ db, now }, actor, manuscriptId) => handIn(db, actor, { manuscriptId }, now()),
  handInAgain: ({ db, now }, actor, manuscriptId) => handInAgain(db, actor, { manuscriptId }, now()),
  withdrawManuscript: ({ db, now }, actor, manuscriptId) =>
    withdrawManuscript(db, actor, { manuscriptId, reason: '' }, now()),
  runAuditAgain: ({ db, now }, actor, manuscriptId) => runAuditAgain(db, actor, { manuscriptId }, now()),
  offerAssignment: ({ db, now }, actor, manuscriptId) =>
    offerAssignment(db, actor, { manuscriptIds: [manuscriptId], reviewerId: reserve.id }, now()),
  answerAssignment: ({ db, now }, actor, manuscriptId) =>
    answerAssignment(db, actor, { manuscriptId, accept: true, reason: '', conflict: false }, now()),
  endAssignment: ({ db, now }, actor, manuscriptId) =>
    endAssignment(db, actor, { manuscriptId, reason: 'Late.' }, now()),
  declareConflict: ({ db, now }, actor, manuscriptId) =>
    declareConflict(db, actor, { manuscriptId, reason: 'Kin.' }, now()),
  addPoint: ({ db, now }, actor, manuscriptId) =>
    addPoint(
      db,
      actor,
      { manuscriptId, severity: 'note', says: '', asks: 'A', familyLabel: '', quote: '' },
      now(),
    ),
  writeComment: ({ db, now }, actor, manuscriptId) =>
    writeComment(
      db,
      actor,
      { manuscriptId, audience: 'editor', target: 'whole', targetLabel: '', boxes: [], body: 'B' },
      now(),
    ),
  draftVerdict: ({ db, now }, actor, manuscriptId) =>
    draftVerdict(db, actor, { manuscriptId, verdict: 'sound', remark: '', body: 'C' }, now()),
  sendVerdictBack: ({ db, now }, actor, manuscriptId) =>
    sendVerdictBack(db, actor, { manuscriptId, reason: 'D' }, now()),
  releaseVerdict: ({ db, now }, actor, manuscriptId) => releaseVerdict(db, actor, { manuscriptId }, now()),
  openRound: ({ db, now }, actor, manuscriptId) => openRound(db, actor, { manuscriptId }, now()),
  closeManuscript: ({ db, now }, actor, manuscriptId) => closeManuscript(db, actor, { manuscriptId }, now()),
  followAudit: ({ db }, actor, manuscriptId) => required(getAuditProgress(db, actor, manuscriptId)),
  readAudit: ({ db }, actor, manuscriptId) => required(getAudit(db, actor, manuscriptId)),
  readLetter: ({ db }, actor, manuscriptId) => required(getLetter(db, actor, manuscriptId)),
}

const nothing = Symbol('nothing')
function required(value: unknown): unknown {
  if (value === null) throw nothing
  return value
}

let reserve: Actor

function works(world: World, attempt: Try, actor: Actor, id: string): boolean {
  return rehearse(world.db, () => {
    try {
      attempt(world, actor, id)
      return true
    } catch (error) {
      if (error !== nothing && !isRefusal(error)) throw error
      return false
    }
  })
}

test.each([true, false])(
  'what is said to be possible works, and nothing else (two-person release: %s)',
  (two) => {
    const world = makeWorld({ twoPersonRelease: two, submitterSeesAudit: two })
    reserve = makePerson(world.db, ['reviewer'], 'Sefa Nock')
    const both = makePerson(world.db, ['reviewer', 'editor'], 'Bo Ferry')
    const byBoth = makeManuscript({ ...world, reviewer: both }, 'verdict drafted')
    const begun = makeManuscript(world, 'returned')
    openRound(world.db, world.submitter, { manuscriptId: begun }, world.now())
    addManuscriptFile(world, world.submitter, begun)
    const ids = [...STATES.map((state) => makeManuscript(world, state)), begun, byBoth]
    const actors = [world.submitter, world.reviewer, world.editor, world.administrator, both, reserve]
    let possible = 0
    for (const id of ids) {
      for (const actor of actors) {
        const view = getManuscript(world.db, actor, id)
        for (const [action, attempt] of Object.entries(attempts)) {
          const said = view?.actions.some((one) => one === action) ?? false
          const label = `${actor.name}: ${action} while ${view?.state ?? 'unseen'}`
          expect(works(world, attempt, actor, id), label).toBe(said)
          if (said) possible += 1
        }
      }
    }
    expect(possible).toBeGreaterThan(100)
  },
)
