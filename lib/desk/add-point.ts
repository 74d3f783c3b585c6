import { z } from 'zod'
import type { Db } from '@/db/client'
import { SEVERITIES } from '@/lib/checks/vocabulary'
import type { Actor } from '@/lib/rules/roles'

export const addPointInput = z.object({
  manuscriptId: z.string(),
  severity: z.enum(SEVERITIES),
  says: z.string().trim().max(5000).default(''),
  asks: z.string().trim().min(1).max(5000),
  familyKey: z.string().nullish(),
  familyLabel: z.string().trim().max(300).default(''),
  quote: z.string().trim().max(2000).default(''),
  page: z.number().int().min(1).nullish(),
})

export type AddPointResult = { pointId: string }

export function addPoint(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof addPointInput>,
  _now: number,
): AddPointResult {
  throw new Error('not yet')
}
