import { expect, test } from 'vitest'
import { draftForm, toDraftChange, toDraftForm, type DraftForm } from '@/components/hand-in/draft-form'
import { formatBytes } from '@/components/files/format-bytes'

const filled: DraftForm = {
  title: 'Kelp attachment under four flow regimes',
  correspondingAuthor: 'Ruth Calloway',
  correspondingEmail: 'ruth@ternharbour.example',
  alpha: '0.05',
  correction: '',
  primaryOutcome: '',
  note: '',
}

test('title, author and address are needed to hand in; the rest may stay empty', () => {
  expect(draftForm.safeParse({ ...filled, alpha: '' }).success).toBe(true)
  const empty = draftForm.safeParse({
    ...filled,
    title: ' ',
    correspondingAuthor: '',
    correspondingEmail: '',
  })
  expect(empty.error?.issues.map((issue) => issue.path[0])).toEqual([
    'title',
    'correspondingAuthor',
    'correspondingEmail',
  ])
})

test.each(['0', '1', '5', 'five', '-0.05'])('%s is no significance level', (alpha) => {
  expect(draftForm.safeParse({ ...filled, alpha }).success).toBe(false)
})

test('a comma is a decimal point, and an empty field takes the level away', () => {
  expect(toDraftChange({ ...filled, alpha: '0,01' }, ['alpha'])).toEqual({ alpha: 0.01 })
  expect(toDraftChange({ ...filled, alpha: '' }, ['alpha'])).toEqual({ alpha: null })
})

test('a draft is saved field by field, and what is half typed waits', () => {
  const typing = { ...filled, title: 'Kelp ', correspondingEmail: 'ruth@', alpha: '0.' }
  expect(toDraftChange(typing, ['title', 'correspondingEmail', 'alpha'])).toEqual({ title: 'Kelp' })
})

test('what is stored fills the fields, and unchanged it makes the same change', () => {
  const stored = {
    title: 'Kelp',
    correspondingAuthor: null,
    correspondingEmail: null,
    alpha: 0.01,
    correction: 'Holm',
    primaryOutcome: '',
    note: '',
  }
  const form = toDraftForm(stored)
  expect(form).toMatchObject({ correspondingAuthor: '', alpha: '0.01', correction: 'Holm' })
  expect(toDraftChange(form, ['alpha', 'correction'])).toEqual({ alpha: 0.01, correction: 'Holm' })
})

test('sizes of files are told in decimal units', () => {
  expect([812, 4096, 12_600_000, 9_950_000].map(formatBytes)).toEqual([
    '812 bytes',
    '4.1 kB',
    '13 MB',
    '9.9 MB',
  ])
})
