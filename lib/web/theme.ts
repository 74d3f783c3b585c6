import { cookies } from 'next/headers'

export const THEMES = ['light', 'dark'] as const
export type Theme = (typeof THEMES)[number]

export const themeCookie = 'assize-theme'

/** The theme that the person chose in this browser; undefined leaves it to the system. */
export async function getTheme(): Promise<Theme | undefined> {
  const chosen = (await cookies()).get(themeCookie)?.value
  return THEMES.find((theme) => theme === chosen)
}
