import { expect, type Browser, type Page } from '@playwright/test'
import { people, type PersonKey } from '@/scripts/demo/people'

/** The end-to-end server seeds the demonstration's people with this password; it opens nothing else. */
export const password = 'end-to-end-only'

export function personOf(key: PersonKey) {
  const person = people.find((one) => one.key === key)
  if (!person) throw new Error(`There is no ${key} among the people.`)
  return person
}

/** Signs a person in through the form, in a browser context of their own. */
export async function enterAs(browser: Browser, key: PersonKey): Promise<Page> {
  const context = await browser.newContext()
  const page = await context.newPage()
  await page.goto('/sign-in')
  await page.getByLabel('E-mail address').fill(personOf(key).email)
  await page.getByLabel('Password').fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await expect(page.getByRole('navigation', { name: 'Screens' }).first()).toBeAttached()
  return page
}

/** Opens an address and tells the status that the server answered with. */
export async function statusOf(page: Page, address: string): Promise<number> {
  const answer = await page.goto(address)
  return answer?.status() ?? 0
}
