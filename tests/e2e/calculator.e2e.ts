import AxeBuilder from '@axe-core/playwright'
import { readFile } from 'node:fs/promises'
import { expect, test, type Page } from '@playwright/test'
import { enterAs } from './support/desk'

const list = 'A – B 0.001\nA – C 0.008\nA – D 0.012\nB – C 0.021\nB – D 0.039\nC – D 0.200'

async function openCalculator(page: Page): Promise<void> {
  await page.goto('/calculator')
  await expect(page.getByRole('textbox', { name: 'p-values' })).toBeVisible()
}

async function download(page: Page, button: string): Promise<string> {
  const [file] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: button, exact: true }).click(),
  ])
  return readFile(await file.path(), 'utf8')
}

test('a pasted list is corrected as it is typed, shared by its address, and taken away as CSV and R', async ({
  browser,
}) => {
  const page = await enterAs(browser, 'submitter')
  const sent: string[] = []
  page.on('request', (request) => sent.push(`${request.url()} ${request.postData() ?? ''}`))
  await page.getByRole('link', { name: 'Calculator' }).first().click()
  await page.getByRole('textbox', { name: 'p-values' }).fill(list)
  await page.getByRole('radio', { name: /exact/ }).check()
  const table = page.getByRole('table', { name: 'The tests with their adjusted values' })

  await test.step('the adjusted values are those of R', async () => {
    // R 4.2.2, p.adjust(c(.001, .008, .012, .021, .039, .2), c('holm', 'bonferroni', 'BH'))
    await expect(table.getByRole('row', { name: /A – C/ })).toContainText(/0\.0400.*0\.0480.*0\.0240/)
    await expect(page.getByText(/keeps 3 of 6 tests/)).toBeVisible()
  })

  await test.step('a larger family is corrected harder', async () => {
    await page.getByLabel('Family size m').fill('10')
    await expect(table.getByRole('row', { name: /A – B/ })).toContainText(/0\.0100.*0\.0100.*0\.0100/)
    await expect(page.getByText(/keeps 1 of 6 tests/)).toBeVisible()
    await page.getByLabel('Family size m').fill('3')
    await expect(page.getByText('A whole number of at least 6.')).toBeVisible()
    await page.getByLabel('Family size m').fill('10')
  })

  await test.step('what cannot be read is listed', async () => {
    await page.getByRole('textbox', { name: 'p-values' }).fill(`${list}\nE – F 1.7`)
    await expect(page.getByText(/6 values read; 1 piece not read/)).toBeVisible()
    await expect(page.getByRole('list', { name: 'What was not read' })).toContainText('Line 7')
    await page.getByRole('textbox', { name: 'p-values' }).fill(list)
  })

  await test.step('the address restores it, and it was sent to no server', async () => {
    await expect(page).toHaveURL(/#.*m=10/)
    // the address follows after a pause: the line that could not be read is gone from it
    await expect(page).not.toHaveURL(/1\.7/)
    const address = page.url()
    await page.goto('about:blank')
    await page.goto(address)
    await expect(page.getByLabel('Family size m')).toHaveValue('10')
    await expect(page.getByRole('textbox', { name: 'p-values' })).toHaveValue(list)
    await expect(page.getByText(/keeps 1 of 6 tests/)).toBeVisible()
    expect(sent.length).toBeGreaterThan(0)
    expect(sent.filter((request) => /0\.039|0%2E039/.test(request))).toEqual([])
  })

  await test.step('CSV and R script hold the numbers', async () => {
    const csv = await download(page, 'CSV')
    expect(csv.split('\r\n')).toHaveLength(8)
    expect(csv).toContain('A – C')
    const script = await download(page, 'R script')
    expect(script).toContain('check("raw p, low ends"')
  })
})

test('the rounding leaves a value open, and the digit that decides is told', async ({ browser }) => {
  const page = await enterAs(browser, 'reviewer')
  await openCalculator(page)
  await page.getByRole('button', { name: 'Show an example' }).click()
  await expect(page.getByText(/1 cannot be decided at the printed precision/)).toBeVisible()
  const detail = page.getByRole('region', { name: 'About granite – concrete' })
  await expect(detail).toContainText(
    'One more digit would decide: .005 to .012 is significant, .013 to .015 is not',
  )
  await page.getByRole('button', { name: 'slate – oyster shell', exact: true }).click()
  await expect(page.getByRole('region', { name: 'About slate – oyster shell' })).toContainText(
    '.002 stands for 0.0015 to 0.0025',
  )
})

test('printed adjusted values tell what was done', async ({ browser }) => {
  const page = await enterAs(browser, 'editor')
  await openCalculator(page)
  await page.getByRole('textbox', { name: 'p-values' }).fill(list)
  await page.getByLabel(/Printed adjusted p/).fill('.006 .048 .072 .126 .234 1.000')
  await expect(page.getByText('One procedure gives all printed values from the raw ones:')).toBeVisible()
  await expect(page.getByText('Bonferroni, m = 6').first()).toBeVisible()
})

test('groups are compared from their means, with and without a control', async ({ browser }) => {
  const page = await enterAs(browser, 'administrator')
  await openCalculator(page)
  await page.getByRole('tab', { name: 'From group summaries' }).click()
  await page.getByRole('button', { name: 'Show an example' }).click()
  await expect(page.getByText(/Tukey at α = 0.05 keeps/)).toBeVisible()
  await page.getByLabel('Control').selectOption('granite')
  await expect(page.getByText(/Dunnett at α = 0.05 keeps/)).toBeVisible()
  expect(await download(page, 'CSV')).toContain('dunnett_p')
})

test('twenty thousand values stay usable', async ({ browser }) => {
  const page = await enterAs(browser, 'editor')
  await openCalculator(page)
  const values = Array.from(
    { length: 20_000 },
    (_, i) => `gene ${i} ${(((i * 7919) % 20_011) / 20_011).toFixed(5)}`,
  )
  await page.context().grantPermissions(['clipboard-read', 'clipboard-write'])
  await page.evaluate((text) => navigator.clipboard.writeText(text), values.join('\n'))
  await page.getByRole('textbox', { name: 'p-values' }).focus()
  await page.keyboard.press('ControlOrMeta+V')
  await expect(page.getByText('20,000 values read.')).toBeVisible({ timeout: 30_000 })
  await expect(page.getByText(/of 20,000 tests/)).toBeVisible({ timeout: 30_000 })
  expect(await page.getByRole('row').count()).toBeLessThan(200)
  await page.getByRole('button', { name: 'Copy link' }).click()
  await expect(page.getByText(/too long for a link/)).toBeVisible()
  await expect(page).toHaveURL(/\/calculator$/)
})

test('everything is reached by the keyboard', async ({ browser }) => {
  const page = await enterAs(browser, 'reviewer')
  await openCalculator(page)
  await page.getByRole('textbox', { name: 'p-values' }).focus()
  await page.keyboard.type('A .01\nB .04')
  const reached: string[] = []
  for (let i = 0; i < 40; i++) {
    await page.keyboard.press('Tab')
    const name = await page.evaluate(() => {
      const at = document.activeElement
      return at?.getAttribute('aria-label') ?? at?.textContent?.slice(0, 40) ?? at?.tagName ?? ''
    })
    reached.push(name)
  }
  for (const wanted of ['Copy link', 'CSV', 'R script', 'A', 'B']) expect(reached).toContain(wanted)
})

test('on the bench a family opens in the calculator and stays as it is', async ({ browser }) => {
  const page = await enterAs(browser, 'reviewer')
  await page.goto('/docket')
  await page.getByRole('link', { name: 'Organic carbon in sediment' }).click()
  await page.waitForURL(/\/manuscripts\/ms_/)
  await page.goto(`${new URL(page.url()).pathname}/bench`)
  const open = page.getByRole('button', { name: 'Open in the calculator' }).first()
  await open.click()
  const panel = page.getByRole('dialog', { name: /What if/ })
  await expect(panel.getByRole('textbox', { name: 'p-values' })).not.toHaveValue('')
  await panel.getByLabel('Family size m').fill('50')
  await expect(panel.getByText(/m = 50/).first()).toBeVisible()
  const { violations } = await new AxeBuilder({ page }).analyze()
  expect(violations.map((one) => one.id)).toEqual([])
  await page.keyboard.press('Escape')
  await expect(panel).toHaveCount(0)
  await expect(open).toBeFocused()
})
