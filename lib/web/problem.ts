import { randomBytes } from 'node:crypto'
import { log } from '@/lib/log'
import { isRefusal, type RefusalKind, nothingHere } from '@/lib/rules/refusal'

export type Problem = {
  type: string
  title: string
  status: number
  detail: string
  fields: Record<string, string>
}

const statuses: Record<RefusalKind, number> = {
  invalid: 422,
  // What an actor may not do must not tell that it exists.
  forbidden: 404,
  'not-found': 404,
  conflict: 409,
  'too-large': 413,
  unreadable: 422,
  'too-many': 429,
}

const titles: Record<number, string> = {
  401: 'Not signed in',
  403: 'Refused',
  404: 'Not found',
  409: 'Changed meanwhile',
  413: 'Too large',
  422: 'Please check what was given',
  429: 'Too many tries',
  500: 'Something went wrong',
}

export function toProblem(error: unknown): Problem {
  if (!isRefusal(error)) return makeProblem('unknown', 500, sayUnknown(logUnknown(error)))
  const status = statuses[error.refusal]
  return makeProblem(
    status === 404 ? 'not-found' : error.refusal,
    status,
    error.refusal === 'forbidden' ? nothingHere : error.message,
    { ...error.fields },
  )
}

export function makeProblem(
  type: string,
  status: number,
  detail: string,
  fields: Record<string, string> = {},
): Problem {
  return { type, title: titles[status] ?? 'Refused', status, detail, fields }
}

export function answerProblem(problem: Problem): Response {
  return Response.json(problem, {
    status: problem.status,
    headers: { 'Content-Type': 'application/problem+json', 'Cache-Control': 'private, no-store' },
  })
}

/** Logs what nobody foresaw under a number, which is all that the person is told. */
export function logUnknown(error: unknown): string {
  const number = randomBytes(4).toString('hex')
  log.error({ err: error, number }, 'unforeseen')
  return number
}

export function sayUnknown(number: string): string {
  return `Something went wrong here and was noted under ${number}; please try again, and name the number if it stays.`
}
