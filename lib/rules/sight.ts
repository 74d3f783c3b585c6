import { may, type Standing } from './permissions'
import type { Actor } from './roles'
import type { Blinding } from './words'

/** In which part a person looks at a manuscript; the widest one where they have several. */
export type Sight = 'editor' | 'reviewer' | 'submitter'

/** A person as the viewer may know them: without id where the house rules hide who it is. */
export type PersonRef = { id: string | null; name: string }

/** Null when the actor may not see the manuscript at all. */
export function getSight(actor: Actor, standing: Standing): Sight | null {
  if (!may(actor, 'manuscript.see', standing)) return null
  if (standing.relations.includes('own')) return 'submitter'
  return actor.roles.includes('editor') ? 'editor' : 'reviewer'
}

export function seesReviewer(sight: Sight, blinding: Blinding): boolean {
  return sight !== 'submitter' || blinding === 'open'
}

export function seesSubmitter(sight: Sight, blinding: Blinding): boolean {
  return sight !== 'reviewer' || blinding !== 'double'
}

const strictness: Record<Blinding, number> = { open: 0, single: 1, double: 2 }

/** A name that one round has hidden stays hidden when the house opens up later. */
export function strictest(blindings: readonly Blinding[]): Blinding {
  return blindings.reduce<Blinding>((a, b) => (strictness[b] > strictness[a] ? b : a), 'open')
}
