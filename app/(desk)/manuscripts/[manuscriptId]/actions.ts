'use server'

import { z } from 'zod'
import { answerAssignment, answerAssignmentInput } from '@/lib/desk/answer-assignment'
import { closeManuscript, closeManuscriptInput } from '@/lib/desk/close-manuscript'
import { composeLetterBody, composeLetterBodyInput } from '@/lib/desk/compose-letter-body'
import { declareConflict, declareConflictInput } from '@/lib/desk/declare-conflict'
import { draftVerdict, draftVerdictInput } from '@/lib/desk/draft-verdict'
import { endAssignment, endAssignmentInput } from '@/lib/desk/end-assignment'
import { handInAgain, handInAgainInput } from '@/lib/desk/hand-in-again'
import { liftConflict, liftConflictInput } from '@/lib/desk/lift-conflict'
import { offerAssignment, offerAssignmentInput } from '@/lib/desk/offer-assignment'
import { openRound, openRoundInput } from '@/lib/desk/open-round'
import { releaseVerdict, releaseVerdictInput } from '@/lib/desk/release-verdict'
import { runAuditAgain, runAuditAgainInput } from '@/lib/desk/run-audit-again'
import { sendVerdictBack, sendVerdictBackInput } from '@/lib/desk/send-verdict-back'
import { withdrawManuscript, withdrawManuscriptInput } from '@/lib/desk/withdraw-manuscript'
import { writeAnswer, writeAnswerInput } from '@/lib/desk/write-answer'
import { renderLetter } from '@/lib/letters/render-letter'
import { action } from '@/lib/web/action'

export const offerAction = action(offerAssignmentInput, offerAssignment)
export const answerAction = action(answerAssignmentInput, answerAssignment)
export const endAssignmentAction = action(endAssignmentInput, endAssignment)
export const declareConflictAction = action(declareConflictInput, declareConflict)
export const liftConflictAction = action(liftConflictInput, liftConflict)
export const withdrawAction = action(withdrawManuscriptInput, withdrawManuscript)
export const closeAction = action(closeManuscriptInput, closeManuscript)
export const runAuditAgainAction = action(runAuditAgainInput, runAuditAgain)
export const handInAgainAction = action(handInAgainInput, handInAgain)

export const previewLetterAction = action(
  z.object({ body: z.string().max(200_000) }),
  (_db, _actor, { body }) => ({
    html: renderLetter(body).html,
  }),
)
export const composeLetterAction = action(composeLetterBodyInput, composeLetterBody)
export const draftVerdictAction = action(draftVerdictInput, draftVerdict)
export const sendVerdictBackAction = action(sendVerdictBackInput, sendVerdictBack)
export const releaseVerdictAction = action(releaseVerdictInput, releaseVerdict)

export const writeAnswerAction = action(writeAnswerInput, writeAnswer)
export const openRoundAction = action(openRoundInput, openRound)
