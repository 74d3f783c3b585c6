import { expect, test } from '@playwright/test'
import { enterAs, personOf, statusOf } from './support/desk'
import { pdf, title, xlsx } from './support/manuscript'

test('a manuscript goes from hand-in to the letter that its submitter reads', async ({ browser }) => {
  test.setTimeout(240_000)
  const submitter = await enterAs(browser, 'submitter')
  await submitter.goto('/hand-in')
  await submitter.getByRole('button', { name: 'Begin a manuscript' }).first().click()
  await submitter.waitForURL(/\/hand-in\/ms_/)
  const id = new URL(submitter.url()).pathname.split('/').at(-1) ?? ''

  await test.step('a wrong file gets one sentence, and nothing else is lost', async () => {
    await submitter.getByLabel('Title').fill(title)
    await submitter.getByLabel('Manuscript: choose a file').setInputFiles({
      name: 'manuscript.pdf',
      mimeType: 'application/pdf',
      buffer: Buffer.from('<html><body>not a manuscript</body></html>'),
    })
    await expect(submitter.getByText(/not a PDF/)).toBeVisible()
    await expect(submitter.getByLabel('Title')).toHaveValue(title)
  })

  await test.step('the submitter hands in a PDF and an XLSX', async () => {
    await submitter
      .getByLabel('Manuscript: choose a file')
      .setInputFiles({ name: 'flow.pdf', mimeType: 'application/pdf', buffer: await pdf() })
    await expect(submitter.getByText('flow.pdf').first()).toBeVisible()
    await submitter.getByLabel('Results table: choose a file').setInputFiles({
      name: 'flow.xlsx',
      mimeType: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
      buffer: xlsx(),
    })
    await expect(submitter.getByText('flow.xlsx').first()).toBeVisible()
    await submitter.getByLabel('Corresponding author').fill('Sela Dorrimere')
    await submitter.getByLabel(/e-mail/i).fill('sela.dorrimere@ternharbour.example')
    await expect(submitter.getByText('Everything is saved.')).toBeVisible()
    await submitter.reload()
    await expect(submitter.getByLabel('Title')).toHaveValue(title)
    await submitter.getByRole('button', { name: 'Hand in', exact: true }).click()
    await submitter.waitForURL(new RegExp(`/manuscripts/${id}`))
  })

  await test.step('the worker audits it and the page shows that it is ready', async () => {
    await expect(submitter.getByText('ready', { exact: true }).first()).toBeVisible({ timeout: 90_000 })
  })

  let reference = ''
  const editor = await enterAs(browser, 'editor')
  await test.step('the editor finds it on the docket and assigns it', async () => {
    await editor.goto('/docket')
    await editor.getByRole('link', { name: title }).click()
    reference =
      (
        await editor
          .getByText(/THC-\d{4}-\d{4}/)
          .first()
          .textContent()
      )?.match(/THC-\d{4}-\d{4}/)?.[0] ?? ''
    expect(reference).not.toBe('')
    await editor.getByRole('button', { name: 'Assign', exact: true }).click()
    const dialog = editor.getByRole('dialog')
    await dialog.getByRole('radio', { name: personOf('reviewer').name }).check()
    await dialog.getByRole('button', { name: 'Assign', exact: true }).click()
    await expect(editor.getByText('assigned', { exact: true }).first()).toBeVisible()
  })

  const reviewer = await enterAs(browser, 'reviewer')
  await test.step('an offer shows no file before it is accepted', async () => {
    expect(await statusOf(reviewer, `/manuscripts/${id}/bench`)).toBe(404)
  })

  await test.step('the reviewer accepts, keeps points and comments', async () => {
    await reviewer.goto(`/manuscripts/${id}`)
    await reviewer.getByRole('button', { name: 'Accept the review' }).click()
    await reviewer.getByRole('dialog').getByRole('button', { name: 'Accept', exact: true }).click()
    await expect(reviewer.getByText('in review', { exact: true }).first()).toBeVisible()
    await reviewer.goto(`/manuscripts/${id}/bench`)
    await expect(reviewer.getByText(/fails/).first()).toBeVisible()
    await expect(reviewer.locator('canvas').first()).toBeVisible()
    await reviewer.getByRole('tab', { name: /Findings/ }).click()
    const keep = reviewer.getByRole('button', { name: 'Keep', exact: true })
    await expect(keep.first()).toBeVisible()
    for (let i = 0; i < (await keep.count()); i++) {
      await keep.nth(i).click()
      await expect(keep.nth(i)).toHaveAttribute('aria-pressed', 'true')
    }
    await reviewer.getByRole('tab', { name: /Comments/ }).click()
    await reviewer.getByRole('button', { name: 'Comment on the manuscript' }).click()
    await reviewer.getByLabel(/New comment/).fill('The films are a fine idea.')
    await reviewer.getByRole('radio', { name: /authors/i }).check()
    await reviewer.getByRole('button', { name: 'Save the comment' }).click()
    await expect(reviewer.getByText('The films are a fine idea.')).toBeVisible()
  })

  await test.step('the reviewer drafts the verdict from the kept points', async () => {
    await reviewer.goto(`/manuscripts/${id}/verdict`)
    await reviewer.getByRole('radio', { name: /^not supported/ }).check()
    await reviewer.getByRole('button', { name: 'Compose from kept points' }).click()
    await expect(reviewer.getByLabel('Text', { exact: true })).toHaveValue(/six|6/)
    await reviewer.getByLabel('Effort in minutes').fill('40')
    await reviewer.getByRole('button', { name: 'Save the draft' }).click()
    await expect(reviewer.getByText('verdict drafted', { exact: true }).first()).toBeVisible()
  })

  await test.step('the submitter does not read the letter before its release', async () => {
    expect(await statusOf(submitter, `/manuscripts/${id}/answer`)).toBe(404)
    await submitter.goto(`/manuscripts/${id}`)
    await expect(submitter.getByText(personOf('reviewer').name)).toHaveCount(0)
    await expect(submitter.getByText('The films are a fine idea.')).toHaveCount(0)
  })

  await test.step('the editor releases it', async () => {
    await editor.goto(`/manuscripts/${id}/verdict`)
    await editor.getByRole('button', { name: 'Release verdict' }).click()
    await editor.getByRole('dialog').getByRole('button', { name: 'Release verdict' }).click()
    await expect(editor.getByText('returned', { exact: true }).first()).toBeVisible()
  })

  await test.step('the mail arrives at the SMTP server', async () => {
    const administrator = await enterAs(browser, 'administrator')
    const mail = administrator.getByRole('link', { name: new RegExp(`verdict on ${reference}`) }).first()
    await expect(async () => {
      await administrator.goto('/mailbox')
      await expect(mail).toBeVisible({ timeout: 2000 })
    }).toPass({ timeout: 60_000 })
    await mail.click()
    await administrator.waitForURL(/\/mailbox\/.+/)
    await expect(administrator.getByText(personOf('submitter').email)).toBeVisible()
    await administrator.getByRole('tab', { name: 'Text' }).click()
    await expect(administrator.getByText(/Verdict: Not supported/)).toBeVisible()
    expect(await statusOf(administrator, `/manuscripts/${id}`)).toBe(404)
  })

  await test.step('the submitter reads it', async () => {
    await submitter.goto(`/manuscripts/${id}`)
    await submitter
      .getByRole('link', { name: /letter/i })
      .first()
      .click()
    await expect(submitter.getByRole('heading', { name: /Verdict: not supported/ })).toBeVisible()
    await expect(submitter.getByText('The films are a fine idea.').first()).toBeVisible()
    await expect(submitter.getByText(personOf('reviewer').name)).toHaveCount(0)
  })
})
