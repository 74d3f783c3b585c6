import type { Permission } from './permissions'

export const STATES = [
  'draft',
  'received',
  'stuck',
  'ready',
  'assigned',
  'in review',
  'verdict drafted',
  'returned',
  'closed',
  'withdrawn',
] as const
export type State = (typeof STATES)[number]

type Move = {
  readonly from: readonly State[]
  readonly to: State
  /** The permission that allows it, or `system` where only the worker makes it. */
  readonly by: Permission | 'system'
}

/** The one table of changes of state. */
export const MOVES = {
  'hand in': { from: ['draft'], to: 'received', by: 'manuscript.hand-in' },
  'finish the audit': { from: ['received'], to: 'ready', by: 'system' },
  'stop the audit': { from: ['received'], to: 'stuck', by: 'system' },
  'replace a file': { from: ['stuck'], to: 'received', by: 'manuscript.replace-file' },
  'run the audit again': { from: ['ready', 'stuck'], to: 'received', by: 'audit.run-again' },
  assign: { from: ['ready'], to: 'assigned', by: 'assignment.offer' },
  accept: { from: ['assigned'], to: 'in review', by: 'assignment.answer' },
  decline: { from: ['assigned'], to: 'ready', by: 'assignment.answer' },
  'end the assignment': {
    from: ['assigned', 'in review', 'verdict drafted'],
    to: 'ready',
    by: 'assignment.end',
  },
  'step aside': {
    from: ['assigned', 'in review', 'verdict drafted'],
    to: 'ready',
    by: 'conflict.declare',
  },
  'draft the verdict': { from: ['in review'], to: 'verdict drafted', by: 'verdict.draft' },
  'send the verdict back': { from: ['verdict drafted'], to: 'in review', by: 'verdict.send-back' },
  'release the verdict': { from: ['verdict drafted'], to: 'returned', by: 'verdict.release' },
  'release the own verdict': { from: ['verdict drafted'], to: 'returned', by: 'verdict.release-own' },
  'open a round': { from: ['returned'], to: 'received', by: 'manuscript.open-round' },
  close: { from: ['returned'], to: 'closed', by: 'manuscript.close' },
  withdraw: {
    from: ['received', 'stuck', 'ready', 'assigned', 'in review', 'verdict drafted'],
    to: 'withdrawn',
    by: 'manuscript.withdraw',
  },
} as const satisfies Record<string, Move>

export type MoveName = keyof typeof MOVES

/** True when the move may start from this state. */
export function canMove(move: MoveName, state: State): boolean {
  const from: readonly State[] = MOVES[move].from
  return from.includes(state)
}
