import { z } from 'zod'
import type { Db } from '@/db/client'
import { VERDICTS } from '@/lib/rules/words'
import type { Actor } from '@/lib/rules/roles'

export const draftVerdictInput = z.object({
  manuscriptId: z.string(),
  verdict: z.enum(VERDICTS),
  /** To the editor, never to the authors. */
  remark: z.string().trim().max(10_000).default(''),
  effortMinutes: z.coerce.number().int().min(0).max(100_000).nullish(),
  /** The letter, Markdown. */
  body: z.string().trim().min(1).max(200_000),
})

export type DraftVerdictResult = { verdictId: string }

export function draftVerdict(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof draftVerdictInput>,
  _now: number,
): DraftVerdictResult {
  throw new Error('not yet')
}
