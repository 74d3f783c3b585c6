'use server'

import { cookies } from 'next/headers'
import { z } from 'zod'
import { changePassword, changePasswordInput } from '@/lib/desk/change-password'
import { revokeAllSessions, revokeAllSessionsInput } from '@/lib/desk/revoke-all-sessions'
import { revokeSession, revokeSessionInput } from '@/lib/desk/revoke-session'
import { action } from '@/lib/web/action'
import { THEMES, themeCookie } from '@/lib/web/theme'

export const changePasswordAction = action(changePasswordInput, changePassword)
export const revokeSessionAction = action(revokeSessionInput, revokeSession)
export const revokeAllSessionsAction = action(revokeAllSessionsInput, revokeAllSessions)

const themeInput = z.object({ theme: z.enum(['system', ...THEMES]) })
const year = 365 * 24 * 3600

export const chooseThemeAction = action(themeInput, async (_db, _actor, { theme }) => {
  const jar = await cookies()
  if (theme === 'system') jar.delete(themeCookie)
  else jar.set(themeCookie, theme, { maxAge: year, httpOnly: true, sameSite: 'lax' })
})
