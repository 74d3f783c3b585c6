'use server'

import { createDraft, createDraftInput } from '@/lib/desk/create-draft'
import { discardDraft, discardDraftInput } from '@/lib/desk/discard-draft'
import { handIn, handInInput } from '@/lib/desk/hand-in'
import { handInAgain, handInAgainInput } from '@/lib/desk/hand-in-again'
import { removeFile, removeFileInput } from '@/lib/desk/remove-file'
import { action } from '@/lib/web/action'

export const createDraftAction = action(createDraftInput, createDraft)
export const discardDraftAction = action(discardDraftInput, discardDraft)
export const removeFileAction = action(removeFileInput, removeFile)
export const handInAction = action(handInInput, handIn)
export const handInAgainAction = action(handInAgainInput, handInAgain)
