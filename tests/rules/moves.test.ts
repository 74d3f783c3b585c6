import { eq } from 'drizzle-orm'
import { beforeAll, expect, test } from 'vitest'
import { manuscripts } from '@/db/schema'
import { moveManuscript } from '@/lib/desk/move-manuscript'
import { isRefusal } from '@/lib/rules/refusal'
import { systemActor, type Actor } from '@/lib/rules/roles'
import { STATES, type MoveName, type State } from '@/lib/rules/states'
import { relate } from '../support/relate'
import { makeManuscript, makeWorld, rehearse, type World } from '../support/world'

/** From where each move leads where to, and who makes it: written out here, not taken from the code. */
const expected: Record<MoveName, { from: State[]; to: State; by: keyof World | 'system' }> = {
  'hand in': { from: ['draft'], to: 'received', by: 'submitter' },
  'finish the audit': { from: ['received'], to: 'ready', by: 'system' },
  'stop the audit': { from: ['received'], to: 'stuck', by: 'system' },
  'replace a file': { from: ['stuck'], to: 'received', by: 'submitter' },
  'run the audit again': { from: ['ready', 'stuck'], to: 'received', by: 'editor' },
  assign: { from: ['ready'], to: 'assigned', by: 'editor' },
  accept: { from: ['assigned'], to: 'in review', by: 'reviewer' },
  decline: { from: ['assigned'], to: 'ready', by: 'reviewer' },
  'end the assignment': { from: ['assigned', 'in review', 'verdict drafted'], to: 'ready', by: 'editor' },
  'step aside': { from: ['assigned', 'in review', 'verdict drafted'], to: 'ready', by: 'reviewer' },
  'draft the verdict': { from: ['in review'], to: 'verdict drafted', by: 'reviewer' },
  'send the verdict back': { from: ['verdict drafted'], to: 'in review', by: 'editor' },
  'release the verdict': { from: ['verdict drafted'], to: 'returned', by: 'editor' },
  'release the own verdict': { from: ['verdict drafted'], to: 'returned', by: 'reviewer' },
  'open a round': { from: ['returned'], to: 'received', by: 'submitter' },
  close: { from: ['returned'], to: 'closed', by: 'editor' },
  withdraw: {
    from: ['received', 'stuck', 'ready', 'assigned', 'in review', 'verdict drafted'],
    to: 'withdrawn',
    by: 'submitter',
  },
}

const offered: MoveName[] = ['accept', 'decline']
const moves = Object.keys(expected) as MoveName[]

let world: World
let manuscriptId: string
beforeAll(() => {
  world = makeWorld()
  manuscriptId = makeManuscript(world, 'ready')
})

function tryMove(move: MoveName, state: State, actor: Actor): string {
  const { db } = world
  return rehearse(db, () => {
    if (actor === world.reviewer) {
      relate(world, actor, manuscriptId, offered.includes(move) ? 'offered' : 'assigned')
    }
    db.update(manuscripts).set({ state, stateSince: 0 }).where(eq(manuscripts.id, manuscriptId)).run()
    try {
      db.transaction((tx) => moveManuscript(tx, actor, manuscriptId, move, 5))
    } catch (error) {
      if (isRefusal(error)) return error.refusal
      throw error
    }
    const row = db
      .select({ state: manuscripts.state, since: manuscripts.stateSince })
      .from(manuscripts)
      .where(eq(manuscripts.id, manuscriptId))
      .get()
    return `${row?.state} since ${row?.since}`
  })
}

test.each(moves)('“%s” starts where the table says and nowhere else', (move) => {
  const { from, to, by } = expected[move]
  const actor = by === 'system' ? systemActor : (world[by] as Actor)
  for (const state of STATES) {
    const found = tryMove(move, state, actor)
    if (from.includes(state)) expect(found, state).toBe(`${to} since 5`)
    // A draft is not there at all for anybody but its submitter.
    else
      expect(found, state).toBe(
        state === 'draft' && by !== 'submitter' && by !== 'system' ? 'not-found' : 'conflict',
      )
  }
})

test.each(moves)('“%s” is refused to an administrator', (move) => {
  for (const state of STATES) {
    expect(['not-found', 'forbidden']).toContain(tryMove(move, state, world.administrator))
  }
})
