import { expect, test } from 'vitest'
import { setAsMail } from '@/lib/letters/set-as-mail'

test('a mail is a whole page around the letter, and its subject cannot break out of the title', () => {
  const page = setAsMail('Verdict </title><script>', '<p>Dear authors,</p>')
  expect(page).toMatch(/^<!doctype html>/)
  expect(page).toContain('<main><p>Dear authors,</p></main>')
  expect(page).not.toContain('<script>')
})

test('a mail loads nothing from anywhere', () => {
  expect(setAsMail('Verdict', '<p>x</p>')).not.toMatch(/url\(|<img|<link|@import|https?:/)
})
