export const ROLES = ['submitter', 'reviewer', 'editor', 'administrator'] as const
export type Role = (typeof ROLES)[number]

export const PERSON_STATUSES = ['invited', 'active', 'disabled'] as const
export type PersonStatus = (typeof PERSON_STATUSES)[number]

/** Who asks. `system` is the worker; it holds no role and passes only where a move or command names it. */
export type Actor = {
  readonly kind: 'person' | 'system'
  readonly id: string
  readonly name: string
  readonly email: string
  readonly roles: readonly Role[]
  readonly sessionId: string | null
}

export const systemActor: Actor = {
  kind: 'system',
  id: 'system',
  name: 'Assize',
  email: '',
  roles: [],
  sessionId: null,
}
