'use server'

import { changePerson, changePersonInput } from '@/lib/desk/change-person'
import { invitePerson, invitePersonInput } from '@/lib/desk/invite-person'
import { action } from '@/lib/web/action'

export const invitePersonAction = action(invitePersonInput, invitePerson)
export const changePersonAction = action(changePersonInput, changePerson)
