import { may, type Permission, type Standing } from './permissions'
import type { Actor } from './roles'
import { canMove, type State } from './states'

/** What a person can do next with a manuscript: names of commands, and of what they can open to read. */
export const ACTIONS = [
  'changeDraft',
  'discardDraft',
  'addFile',
  'removeFile',
  'nameColumns',
  'handIn',
  'handInAgain',
  'withdrawManuscript',
  'runAuditAgain',
  'offerAssignment',
  'answerAssignment',
  'endAssignment',
  'declareConflict',
  'liftConflict',
  'decidePoint',
  'addPoint',
  'movePoint',
  'writeComment',
  'draftVerdict',
  'sendVerdictBack',
  'releaseVerdict',
  'openRound',
  'writeAnswer',
  'closeManuscript',
  'followAudit',
  'readAudit',
  'readFiles',
  'readComments',
  'readVerdict',
  'readLetter',
  'readAnswers',
  'readRecord',
] as const
export type Action = (typeof ACTIONS)[number]

/** What the answer depends on beside the person. */
export type Situation = {
  readonly state: State
  /** A round that is begun and not yet handed in (the draft's own, or the revision's). */
  readonly roundBegun: boolean
  /** The actor's accepted assignment in the current round is open. */
  readonly reviewing: boolean
  /** The actor wrote the verdict of the current round. */
  readonly ownVerdict: boolean
  readonly twoPersonRelease: boolean
  readonly submitterSeesAudit: boolean
  /** A letter of any round has been sent. */
  readonly letterSent: boolean
  /** An audit of the current round is finished. */
  readonly audited: boolean
  readonly openConflicts: boolean
}

/** States in which an audit of the round may be made again without taking a verdict's ground away. */
export const NAMING_STATES: readonly State[] = ['received', 'stuck', 'ready', 'assigned', 'in review']

/** The submitter while the files are theirs to change, a reviewer at work, an editor until a verdict is drafted. */
function mayNameColumns(
  can: (permission: Permission) => boolean,
  begun: boolean,
  atWork: boolean,
  state: State,
): boolean {
  if (can('manuscript.replace-file')) return begun || state === 'stuck'
  return atWork || (can('assignment.offer') && NAMING_STATES.includes(state))
}

export function listActions(actor: Actor, standing: Standing, at: Situation): Action[] {
  const can = (permission: Permission) => may(actor, permission, standing)
  const begun = at.state === 'draft' || (at.state === 'returned' && at.roundBegun)
  const atWork = at.reviewing && at.state === 'in review'
  const allowed: Record<Action, boolean> = {
    changeDraft: begun && can('draft.change'),
    discardDraft: begun && can('draft.change'),
    addFile: (begun && can('draft.change')) || (at.state === 'stuck' && can('manuscript.replace-file')),
    removeFile: (begun && can('draft.change')) || (at.state === 'stuck' && can('manuscript.replace-file')),
    nameColumns: can('table.name-columns') && mayNameColumns(can, begun, atWork, at.state),
    handIn:
      (at.state === 'draft' && can('manuscript.hand-in')) ||
      (at.state === 'returned' && at.roundBegun && can('manuscript.open-round')),
    handInAgain: canMove('replace a file', at.state) && can('manuscript.replace-file'),
    withdrawManuscript: canMove('withdraw', at.state) && can('manuscript.withdraw'),
    runAuditAgain: canMove('run the audit again', at.state) && can('audit.run-again'),
    offerAssignment: canMove('assign', at.state) && can('assignment.offer'),
    answerAssignment: canMove('accept', at.state) && can('assignment.answer'),
    endAssignment: canMove('end the assignment', at.state) && can('assignment.end'),
    declareConflict: can('conflict.declare'),
    liftConflict: at.openConflicts && can('conflict.lift'),
    decidePoint: atWork && can('point.decide'),
    addPoint: atWork && can('point.decide'),
    movePoint: atWork && can('point.decide'),
    writeComment: at.state !== 'withdrawn' && at.state !== 'closed' && can('comment.write'),
    draftVerdict:
      at.reviewing && (atWork || (at.state === 'verdict drafted' && at.ownVerdict)) && can('verdict.draft'),
    sendVerdictBack: canMove('send the verdict back', at.state) && can('verdict.send-back'),
    releaseVerdict:
      canMove('release the verdict', at.state) &&
      ((can('verdict.release') && !(at.ownVerdict && at.twoPersonRelease)) ||
        (can('verdict.release-own') && at.ownVerdict && !at.twoPersonRelease)),
    openRound: at.state === 'returned' && !at.roundBegun && can('manuscript.open-round'),
    writeAnswer: at.state === 'returned' && can('answer.write'),
    closeManuscript: canMove('close', at.state) && can('manuscript.close'),
    followAudit: at.state !== 'draft' && can('audit.follow'),
    readAudit: at.audited && (can('audit.read') || (at.submitterSeesAudit && can('audit.read-as-submitter'))),
    readFiles: can('file.read'),
    readComments: at.state !== 'draft' && can('comment.read'),
    readVerdict: at.audited && can('verdict.read'),
    readLetter: at.letterSent && can('letter.read'),
    readAnswers: at.letterSent && can('answer.read'),
    readRecord: can('manuscript.record'),
  }
  return ACTIONS.filter((action) => allowed[action])
}
