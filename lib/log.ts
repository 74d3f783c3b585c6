import pino from 'pino'

/**
 * What goes wrong and what was done, as JSON lines: ids and kinds, never an address, a name or a manuscript's
 * text. The record (lib/record) is the place for who did what.
 */
export const log = pino({
  level: process.env.VITEST ? 'silent' : (process.env.ASSIZE_LOG_LEVEL ?? 'info'),
  base: null,
  redact: {
    paths: ['password', 'token', 'email', 'recipient', 'cookie', 'authorization', '*.password', '*.email'],
    remove: true,
  },
  serializers: { err: describeError },
})

export type LoggedError = { type: string; message: string; code?: string; stack?: string }

/** An error for the log. The database layer puts a statement's values into its messages; they are cut. */
export function describeError(error: unknown): LoggedError {
  if (!(error instanceof Error)) return { type: typeof error, message: 'thrown without an error' }
  const code = 'code' in error && typeof error.code === 'string' ? { code: error.code } : {}
  const message = withoutValues(error.message)
  // Frames of a stack such as "    at run (/app/lib/x.ts:1:2)"; its head repeats the message.
  const frames = (error.stack ?? '').split('\n').filter((line) => /^\s+at /.test(line))
  return { type: error.name, message, ...code, stack: frames.join('\n') }
}

function withoutValues(message: string): string {
  return (message.split('\nparams:')[0] ?? '').slice(0, 500)
}
