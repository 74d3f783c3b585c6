/**
 * Why a command does not do what was asked. Thrown, so that the transaction around it rolls back, and
 * translated at the edge (lib/web). The message is for the person who asked: one sentence that says what is
 * wrong and what to do.
 */
export const REFUSALS = [
  'invalid',
  'forbidden',
  'not-found',
  'conflict',
  'too-large',
  'unreadable',
  'too-many',
] as const
export type RefusalKind = (typeof REFUSALS)[number]

export type Refusal = Error & {
  readonly refusal: RefusalKind
  /** Field name → what is wrong with it. */
  readonly fields: Readonly<Record<string, string>>
}

export function refuse(kind: RefusalKind, message: string, fields: Record<string, string> = {}): Refusal {
  return Object.assign(new Error(message), { refusal: kind, fields })
}

export function isRefusal(error: unknown): error is Refusal {
  return error instanceof Error && 'refusal' in error
}

/** One sentence wherever something is not there or not for the actor, so that the two cannot be told apart. */
export const nothingHere = 'There is nothing here that you can open.'

export function refuseUnknown(): Refusal {
  return refuse('not-found', nothingHere)
}
