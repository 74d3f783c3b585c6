import { expect, test } from '@playwright/test'
import type { PersonKey } from '@/scripts/demo/people'
import { enterAs, statusOf } from './support/desk'

/** What each role may open, written out by hand from the roles' table of the product. */
const doors: Record<string, readonly PersonKey[]> = {
  '/docket': ['submitter', 'reviewer', 'editor'],
  '/hand-in': ['submitter'],
  '/calculator': ['submitter', 'reviewer', 'editor', 'administrator'],
  '/house-rules': ['reviewer', 'editor'],
  '/people': ['editor', 'administrator'],
  '/record': ['editor', 'administrator'],
  '/mailbox': ['administrator'],
  '/figures': ['editor'],
  '/account': ['submitter', 'reviewer', 'editor', 'administrator'],
}

for (const key of ['submitter', 'reviewer', 'editor', 'administrator'] as const) {
  test(`the ${key}'s closed doors answer 404`, async ({ browser }) => {
    const page = await enterAs(browser, key)
    for (const [door, open] of Object.entries(doors)) {
      expect(await statusOf(page, door), door).toBe(open.includes(key) ? 200 : 404)
    }
  })
}

test('without a session every screen leads to sign-in and every route answers 404 or 401', async ({
  page,
  request,
}) => {
  for (const door of Object.keys(doors)) {
    await page.goto(door)
    await expect(page, door).toHaveURL(/\/sign-in/)
  }
  for (const route of ['/api/docket', '/api/reviewers', '/api/manuscripts/ms_0/audit', '/api/files/fi_0']) {
    expect([401, 404], route).toContain((await request.get(route)).status())
  }
})

test("another's draft does not exist for anyone else", async ({ browser }) => {
  const submitter = await enterAs(browser, 'thirdSubmitter')
  await submitter.goto('/hand-in')
  await submitter.getByRole('button', { name: 'Begin a manuscript' }).first().click()
  await submitter.waitForURL(/\/hand-in\/ms_/)
  const draft = new URL(submitter.url()).pathname
  const id = draft.split('/').at(-1) ?? ''
  expect(await statusOf(submitter, draft)).toBe(200)
  for (const key of ['secondSubmitter', 'reviewer', 'administrator'] as const) {
    const page = await enterAs(browser, key)
    for (const path of [
      draft,
      `/manuscripts/${id}`,
      `/manuscripts/${id}/bench`,
      `/manuscripts/${id}/table`,
      `/manuscripts/${id}/verdict`,
      `/manuscripts/${id}/answer`,
      `/manuscripts/${id}/record`,
      `/api/manuscripts/${id}`,
      `/api/manuscripts/${id}/audit`,
      `/api/manuscripts/${id}/progress`,
      `/api/manuscripts/${id}/points`,
      `/api/manuscripts/${id}/comments`,
      `/api/manuscripts/${id}/verdict`,
      `/api/manuscripts/${id}/letter`,
    ]) {
      expect(await statusOf(page, path), `${key} ${path}`).toBe(404)
    }
  }
})

test('signing out everywhere ends the other sessions at once', async ({ browser }) => {
  const here = await enterAs(browser, 'secondReviewer')
  const there = await enterAs(browser, 'secondReviewer')
  await here.goto('/account')
  await here.getByRole('button', { name: /sign out everywhere/i }).click()
  const confirm = here.getByRole('dialog').getByRole('button', { name: /sign out/i })
  if (await confirm.isVisible()) await confirm.click()
  await expect(async () => {
    await there.goto('/docket')
    await expect(there).toHaveURL(/\/sign-in/, { timeout: 1000 })
  }).toPass()
})
