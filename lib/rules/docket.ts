import { z } from 'zod'
import { OUTCOMES } from '@/lib/checks/vocabulary'
import { listOf } from './list-of'
import { STATES } from './states'

export const DOCKET_SORTS = ['received', 'state', 'due', 'title', 'reviewer'] as const
export type DocketSort = (typeof DOCKET_SORTS)[number]

export const DIRECTIONS = ['asc', 'desc'] as const
export type Direction = (typeof DIRECTIONS)[number]

export const DUE_FILTERS = ['overdue', 'this week'] as const
export type DueFilter = (typeof DUE_FILTERS)[number]

/** What the docket is asked for; the screen keeps it in the address, so that numbers come as strings. */
export const docketFilter = z.object({
  /** Only what one sees in this role; without it the union of one's roles. */
  as: z.enum(['submitter', 'reviewer', 'editor']).optional(),
  states: listOf(z.enum(STATES)),
  search: z.string().trim().max(200).default(''),
  /** The worst outcome among the families of the current audit. */
  outcome: z.enum(OUTCOMES).optional(),
  due: z.enum(DUE_FILTERS).optional(),
  /** Handed in by me, offered or assigned to me, or assigned by me. */
  mine: z.union([z.boolean(), z.stringbool()]).default(false),
  sort: z.enum(DOCKET_SORTS).default('received'),
  direction: z.enum(DIRECTIONS).default('desc'),
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(50),
})
export type DocketFilter = z.infer<typeof docketFilter>
