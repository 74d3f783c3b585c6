/** A refusal or a fault as the server tells it (application/problem+json), thrown by fetchJson. */
export type Problem = Error & { status: number; fields: Record<string, string> }

export function isProblem(error: unknown): error is Problem {
  return error instanceof Error && 'status' in error && 'fields' in error
}

const unreachable = 'The server cannot be reached; please check the connection and try again.'

/**
 * Asks a route handler and gives its JSON (undefined where it answers nothing). `body` is sent as JSON.
 * Throws a Problem whose message can be shown as it is.
 */
export async function fetchJson<T>(
  url: string,
  options: {
    method?: 'GET' | 'POST' | 'PATCH' | 'PUT' | 'DELETE'
    body?: unknown
    signal?: AbortSignal
  } = {},
): Promise<T> {
  const response = await fetch(url, {
    method: options.method ?? 'GET',
    signal: options.signal ?? null,
    ...(options.body === undefined
      ? {}
      : { body: JSON.stringify(options.body), headers: { 'Content-Type': 'application/json' } }),
  }).catch((cause: unknown) => {
    if (options.signal?.aborted) throw cause
    throw makeProblem(0, unreachable)
  })
  const text = await response.text()
  if (!response.ok) throw readProblem(response.status, text)
  return (text ? JSON.parse(text) : undefined) as T
}

/** Reads a problem document; whatever else came is told as a fault of the server. */
export function readProblem(status: number, text: string): Problem {
  try {
    const given: unknown = JSON.parse(text)
    if (
      typeof given === 'object' &&
      given !== null &&
      'detail' in given &&
      typeof given.detail === 'string'
    ) {
      return makeProblem(status, given.detail, 'fields' in given ? readFields(given.fields) : {})
    }
  } catch {
    // Not JSON: a proxy's page or nothing at all. The status says what can be said.
  }
  return makeProblem(status, `The server answered with an error (${status}); please try again.`)
}

function readFields(given: unknown): Record<string, string> {
  if (typeof given !== 'object' || given === null) return {}
  return Object.fromEntries(
    Object.entries(given).filter((entry): entry is [string, string] => typeof entry[1] === 'string'),
  )
}

export function makeProblem(status: number, message: string, fields: Record<string, string> = {}): Problem {
  return Object.assign(new Error(message), { status, fields })
}
