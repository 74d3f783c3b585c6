import type { Actor, Role } from './roles'

/**
 * How a person stands to one manuscript. `own`: they handed it in; `offered`: a review was offered to them and
 * not yet answered; `assigned`: they accepted it and are at work or have reported. 'any' asks for no relation.
 */
export const RELATIONS_TO_MANUSCRIPT = ['own', 'offered', 'assigned', 'any'] as const
export type ManuscriptRelation = (typeof RELATIONS_TO_MANUSCRIPT)[number]

type Grants = Partial<Record<Role, readonly ManuscriptRelation[]>>

const own = ['own'] as const
const assigned = ['assigned'] as const
const invited = ['offered', 'assigned'] as const
const any = ['any'] as const

/** The one table of who may do what: pages, actions, routes and menus all ask it. What is absent is denied. */
export const PERMISSIONS = {
  'account.change': { submitter: any, reviewer: any, editor: any, administrator: any },
  'docket.list': { submitter: any, reviewer: any, editor: any },
  'calculator.use': { submitter: any, reviewer: any, editor: any, administrator: any },

  'draft.create': { submitter: any },
  'draft.change': { submitter: own },
  'manuscript.hand-in': { submitter: own },
  'manuscript.replace-file': { submitter: own },
  'table.name-columns': { submitter: own, reviewer: assigned, editor: any },
  'manuscript.withdraw': { submitter: own },
  'manuscript.open-round': { submitter: own },
  'manuscript.close': { editor: any },
  'manuscript.see': { submitter: own, reviewer: invited, editor: any },
  'file.read': { submitter: own, reviewer: assigned, editor: any },

  'audit.follow': { submitter: own, reviewer: assigned, editor: any },
  'audit.read': { reviewer: assigned, editor: any },
  'audit.read-as-submitter': { submitter: own },
  'audit.run-again': { reviewer: assigned, editor: any },

  'assignment.offer': { editor: any },
  'assignment.end': { editor: any },
  'assignment.answer': { reviewer: ['offered'] },
  'conflict.declare': { reviewer: invited, editor: any },
  'conflict.lift': { editor: any },

  'point.decide': { reviewer: assigned },
  'comment.write': { reviewer: assigned, editor: any },
  'comment.read': { submitter: own, reviewer: assigned, editor: any },
  'verdict.draft': { reviewer: assigned },
  'verdict.read': { reviewer: assigned, editor: any },
  'verdict.send-back': { editor: any },
  'verdict.release': { editor: any },
  'verdict.release-own': { reviewer: assigned },
  'letter.read': { submitter: own, reviewer: assigned, editor: any },
  'answer.write': { submitter: own },
  'answer.read': { submitter: own, reviewer: assigned, editor: any },

  'manuscript.record': { editor: any },
  'record.read': { editor: any, administrator: any },
  'figures.read': { editor: any },
  'house-rules.read': { reviewer: any, editor: any },
  'house-rules.change': { editor: any },
  'people.list': { editor: any, administrator: any },
  'people.invite': { administrator: any },
  'people.change': { administrator: any },
  'mailbox.read': { administrator: any },
  'outbox.read': { administrator: any },
} as const satisfies Record<string, Grants>

export type Permission = keyof typeof PERMISSIONS

/**
 * Facts about one manuscript and one person. Three of them take away every grant but that of the submitter's
 * own: an open conflict; that it is one's own manuscript, which nobody may judge or manage in another role; and
 * that it is not handed in yet, or not there at all.
 */
export type Standing = {
  readonly relations: readonly Exclude<ManuscriptRelation, 'any'>[]
  readonly conflicted: boolean
  readonly handedIn: boolean
}

export const noStanding: Standing = { relations: [], conflicted: false, handedIn: true }

/** True when one of the actor's roles is granted `permission` for this standing. */
export function may(actor: Actor, permission: Permission, standing: Standing = noStanding): boolean {
  const grants: Grants = PERMISSIONS[permission]
  const barred = standing.conflicted || !standing.handedIn || standing.relations.includes('own')
  return actor.roles.some((role) =>
    (grants[role] ?? []).some((needed) => {
      if (barred && needed !== 'own') return false
      return needed === 'any' || standing.relations.includes(needed)
    }),
  )
}
