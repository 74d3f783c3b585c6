import AxeBuilder from '@axe-core/playwright'
import { expect, test, type Page } from '@playwright/test'
import { encodeInput } from '@/components/calculator/calculator-input'
import { kelpGroups, kelpValues } from '@/components/calculator/examples'
import type { PersonKey } from '@/scripts/demo/people'
import { enterAs } from './support/desk'

const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice']

/** Each theme is looked at by axe once, at one of the two widths; both widths are looked at for sideways scroll. */
const views = [
  { colorScheme: 'light', width: 1440 },
  { colorScheme: 'dark', width: 390 },
] as const

/** Walks addresses in both themes and two widths; every violation is listed with its screen. */
async function walk(page: Page, addresses: readonly string[]): Promise<string[]> {
  const faults: string[] = []
  for (const { colorScheme, width } of views) {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' })
    await page.setViewportSize({ width, height: 900 })
    for (const address of addresses) {
      await page.goto(address)
      await page.waitForLoadState('networkidle')
      const { violations } = await new AxeBuilder({ page }).withTags(tags).analyze()
      for (const v of violations)
        faults.push(`${address} ${colorScheme} ${width}: ${v.id} ${v.nodes.map((n) => n.target).join(' ')}`)
      const wide = await page.evaluate(() => document.documentElement.scrollWidth > window.innerWidth + 1)
      if (wide) faults.push(`${address} ${width}: scrolls sideways`)
    }
  }
  return faults
}

const screens: Partial<Record<PersonKey, readonly string[]>> = {
  submitter: ['/docket', '/hand-in', '/calculator', '/account'],
  reviewer: ['/docket', '/house-rules'],
  editor: ['/docket', '/people', '/house-rules', '/record', '/figures'],
  administrator: ['/people', '/record', '/mailbox', '/mailbox/outbox'],
}

test('axe finds nothing on the screens before sign-in', async ({ page }) => {
  expect(await walk(page, ['/sign-in', '/forgot', '/nowhere'])).toEqual([])
})

for (const [key, addresses] of Object.entries(screens) as [PersonKey, readonly string[]][]) {
  test(`axe finds nothing on the screens of the ${key}`, async ({ browser }) => {
    test.setTimeout(240_000)
    const page = await enterAs(browser, key)
    expect(await walk(page, addresses)).toEqual([])
  })
}

test('axe finds nothing on a filled calculator', async ({ browser }) => {
  test.setTimeout(240_000)
  const page = await enterAs(browser, 'reviewer')
  const addresses = [kelpValues, kelpGroups].map((input) => `/calculator#${encodeInput(input)}`)
  expect(await walk(page, addresses)).toEqual([])
})

test('axe finds nothing on the screens of a manuscript', async ({ browser }) => {
  test.setTimeout(240_000)
  const reviewer = await enterAs(browser, 'reviewer')
  await reviewer.goto('/docket')
  const link = reviewer.getByRole('link', { name: 'Organic carbon in sediment' })
  const home = (await link.getAttribute('href')) ?? ''
  expect(home).toMatch(/^\/manuscripts\/ms_/)
  expect(await walk(reviewer, [home, `${home}/bench`, `${home}/verdict`])).toEqual([])
})

test('axe finds nothing on a letter and its answers', async ({ browser }) => {
  test.setTimeout(240_000)
  const submitter = await enterAs(browser, 'secondSubmitter')
  await submitter.goto('/docket')
  const link = submitter.getByRole('link', { name: /Light in the hatchery/ })
  const home = (await link.getAttribute('href')) ?? ''
  expect(await walk(submitter, [home, `${home}/answer`])).toEqual([])
})

test('axe finds nothing where the columns of a results table are named', async ({ browser }) => {
  test.setTimeout(240_000)
  const editor = await enterAs(browser, 'editor')
  await editor.goto('/docket')
  const home = (await editor.getByRole('link', { name: /Fouling on four hull/ }).getAttribute('href')) ?? ''
  await editor.goto(`${home}/table`)
  await expect(editor.getByRole('combobox').first()).toBeVisible()
  expect(await walk(editor, [`${home}/table`])).toEqual([])
  const submitter = await enterAs(browser, 'secondSubmitter')
  await submitter.goto('/hand-in')
  const draft =
    (await submitter.getByRole('link', { name: /Twelve traits of barnacles/ }).getAttribute('href')) ?? ''
  await submitter.goto(draft)
  await expect(submitter.getByRole('combobox').first()).toBeVisible()
  expect(await walk(submitter, [draft])).toEqual([])
})
