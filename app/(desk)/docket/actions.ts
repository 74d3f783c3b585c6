'use server'

import { answerAssignment, answerAssignmentInput } from '@/lib/desk/answer-assignment'
import { offerAssignment, offerAssignmentInput } from '@/lib/desk/offer-assignment'
import { action } from '@/lib/web/action'

export const offerAssignmentAction = action(offerAssignmentInput, offerAssignment)
export const answerAssignmentAction = action(answerAssignmentInput, answerAssignment)
