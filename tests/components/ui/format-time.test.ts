import { expect, test } from 'vitest'
import { formatTime, fromDateField, toDateField } from '@/components/ui/format-time'

// 1 December 2026 is a Tuesday: 1 January 2026 is a Thursday, 334 days before, and 334 = 47 × 7 + 5.
const at = Date.UTC(2026, 11, 1, 23, 30)

test('a date is told as the house writes it', () => {
  expect(formatTime(at, 'date', 'UTC')).toBe('1 December 2026')
  expect(formatTime(at, 'due', 'UTC')).toBe('Tuesday 1 December 2026')
  expect(formatTime(at, 'moment', 'UTC')).toBe('1 December 2026, 23:30')
  expect(formatTime(at, 'short', 'UTC')).toBe('1 Dec 2026')
  expect(formatTime(at, 'due-short', 'UTC')).toBe('Tue 1 Dec 2026')
})

test("the viewer's zone decides which day it is", () => {
  expect(formatTime(at, 'due', 'Asia/Tokyo')).toBe('Wednesday 2 December 2026')
  expect(formatTime(at, 'moment', 'America/New_York')).toBe('1 December 2026, 18:30')
})

test('midnight is 00:00', () => {
  expect(formatTime(Date.UTC(2026, 11, 1), 'moment', 'UTC')).toBe('1 December 2026, 00:00')
})

test('a date field holds the day in the zone', () => {
  expect(toDateField(at, 'UTC')).toBe('2026-12-01')
  expect(toDateField(at, 'Asia/Tokyo')).toBe('2026-12-02')
})

test('a day named in a date field lasts to its last second', () => {
  const end = fromDateField('2026-12-01')
  expect(end).toBe(new Date(2026, 11, 1, 23, 59, 59).getTime())
})

test('a date field that is empty or half filled in names no day', () => {
  expect(fromDateField('')).toBeNull()
  expect(fromDateField('2026-12')).toBeNull()
  expect(fromDateField('2026-13-45')).toBeNull()
})
