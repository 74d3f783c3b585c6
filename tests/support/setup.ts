import { afterEach, beforeEach, expect, vi } from 'vitest'

// A message on console.error is a fault that nobody looked at: it fails the test that caused it.
beforeEach(() => {
  vi.spyOn(console, 'error')
})
afterEach(() => {
  expect(vi.mocked(console.error).mock.calls).toEqual([])
  vi.restoreAllMocks()
})
