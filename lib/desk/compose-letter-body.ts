import { z } from 'zod'
import type { Reader } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'
import { VERDICTS } from '@/lib/rules/words'

export const composeLetterBodyInput = z.object({ manuscriptId: z.string(), verdict: z.enum(VERDICTS) })

export type ComposeLetterBodyResult = { body: string }

/** The letter as it follows from the points that are kept and the comments for the authors; Markdown. Writes nothing. */
export function composeLetterBody(
  _db: Reader,
  _actor: Actor,
  _input: z.infer<typeof composeLetterBodyInput>,
): ComposeLetterBodyResult {
  throw new Error('not yet')
}
