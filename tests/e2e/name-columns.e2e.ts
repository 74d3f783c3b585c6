import { expect, test } from '@playwright/test'
import { enterAs, statusOf } from './support/desk'
import { pairs, pdf } from './support/manuscript'

// The column of p-values is misnamed: its head says nothing of what it holds.
const csv = () =>
  [
    'Comparison,t,df,score',
    ...pairs.map((pair) => `${pair.a} vs ${pair.b},${pair.t.toFixed(3)},${pair.df},${pair.raw.toFixed(5)}`),
  ].join('\n')

test('a misnamed column of p-values is put right at hand-in, and the audit follows it', async ({
  browser,
}) => {
  test.setTimeout(240_000)
  const submitter = await enterAs(browser, 'submitter')
  await submitter.goto('/hand-in')
  await submitter.getByRole('button', { name: 'Begin a manuscript' }).first().click()
  await submitter.waitForURL(/\/hand-in\/ms_/)
  const id = new URL(submitter.url()).pathname.split('/').at(-1) ?? ''
  const choice = submitter.getByRole('combobox', { name: /Column D, “score”/ })
  await test.step('the table is shown with what each column was taken for', async () => {
    await submitter
      .getByLabel('Manuscript: choose a file')
      .setInputFiles({ name: 'flow.pdf', mimeType: 'application/pdf', buffer: await pdf() })
    await expect(submitter.getByText('flow.pdf').first()).toBeVisible()
    await submitter
      .getByLabel('Results table: choose a file')
      .setInputFiles({ name: 'flow.csv', mimeType: 'text/csv', buffer: Buffer.from(csv()) })
    await expect(choice).toHaveValue('unused')
    await expect(submitter.getByText(/no p-values and 6 test statistics/)).toBeVisible()
  })

  await test.step('by keyboard the column is named, and what is read changes at once', async () => {
    await choice.focus()
    await choice.press('p')
    await choice.selectOption('p-unadjusted')
    await expect(submitter.getByText(/6 p-values and 6 test statistics/)).toBeVisible()
    await expect(submitter.getByText('What you named is saved.')).toBeVisible()
    await submitter.reload()
    await expect(choice).toHaveValue('p-unadjusted')
  })

  await test.step('the audit reads it so', async () => {
    await submitter.getByLabel('Title').fill('Flow and fan worms, with a table')
    await submitter.getByLabel('Corresponding author').fill('Sela Dorrimere')
    await submitter.getByLabel(/e-mail/i).fill('sela.dorrimere@ternharbour.example')
    await expect(submitter.getByText('Everything is saved.')).toBeVisible()
    await submitter.getByRole('button', { name: 'Hand in', exact: true }).click()
    await submitter.waitForURL(new RegExp(`/manuscripts/${id}`))
    await expect(submitter.getByText('ready', { exact: true }).first()).toBeVisible({ timeout: 90_000 })
  })

  const editor = await enterAs(browser, 'editor')
  const countInTable = async () => {
    const answer = await editor.request.get(`/api/manuscripts/${id}/audit`)
    const kept = (await answer.json()) as {
      audit: { reports: { scale: string; place: { source: string } }[] }
    }
    return kept.audit.reports
      .filter(({ place }) => place.source === 'results-table')
      .map(({ scale }) => scale)
  }
  expect(await countInTable()).toEqual(new Array(6).fill('raw'))

  await test.step('it can be looked at afterwards, and not changed by its submitter', async () => {
    await submitter.getByRole('link', { name: 'How it is read' }).click()
    await expect(submitter.getByRole('heading', { name: 'How the results table is read' })).toBeVisible()
    await expect(submitter.getByText('p-value, unadjusted')).toBeVisible()
    await expect(submitter.getByRole('combobox')).toHaveCount(0)
  })

  await test.step('an editor names it otherwise: the round is audited again', async () => {
    await editor.goto(`/manuscripts/${id}`)
    await editor.getByRole('link', { name: 'How it is read' }).click()
    await editor.getByRole('combobox', { name: /Column D/ }).selectOption('unused')
    await expect(editor.getByText('not saved yet')).toBeVisible()
    await editor.getByRole('button', { name: 'Save and audit again' }).click()
    await expect(editor.getByText(/The audit of this round runs again/)).toBeVisible()
    await expect.poll(countInTable, { timeout: 90_000 }).toEqual([])
  })

  await test.step('for whom the manuscript is not, neither is the screen', async () => {
    const other = await enterAs(browser, 'secondSubmitter')
    expect(await statusOf(other, `/manuscripts/${id}/table`)).toBe(404)
  })
})
