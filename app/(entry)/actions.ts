'use server'

import { acceptInvitation, acceptInvitationInput } from '@/lib/desk/accept-invitation'
import { askPasswordReset, askPasswordResetInput } from '@/lib/desk/ask-password-reset'
import { setPassword, setPasswordInput } from '@/lib/desk/set-password'
import { publicAction } from '@/lib/web/action'

export const askPasswordResetAction = publicAction(askPasswordResetInput, askPasswordReset)
export const setPasswordAction = publicAction(setPasswordInput, setPassword)
export const acceptInvitationAction = publicAction(acceptInvitationInput, acceptInvitation)
