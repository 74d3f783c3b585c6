import { expect, test } from 'vitest'
import { isProblem, readProblem } from '@/components/shell/fetch-json'

test("a refusal is told in the server's own sentence, with its fields", () => {
  const problem = readProblem(
    422,
    JSON.stringify({
      type: 'invalid',
      detail: 'Please check the marked fields.',
      fields: { title: 'Missing.', n: 3 },
    }),
  )
  expect(isProblem(problem)).toBe(true)
  expect(problem).toMatchObject({
    status: 422,
    message: 'Please check the marked fields.',
    fields: { title: 'Missing.' },
  })
})

test('a page of a proxy in between is not shown as a sentence', () => {
  const problem = readProblem(502, '<html><body>Bad gateway</body></html>')
  expect(problem.message).toBe('The server answered with an error (502); please try again.')
  expect(problem.fields).toEqual({})
})

test('JSON that is no problem document tells the status alone', () => {
  expect(readProblem(500, '["odd"]').message).toContain('500')
  expect(readProblem(500, 'null').message).toContain('500')
})
