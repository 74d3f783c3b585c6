import {
  createLoader,
  createSerializer,
  parseAsArrayOf,
  parseAsBoolean,
  parseAsInteger,
  parseAsString,
  parseAsStringLiteral,
  type inferParserType,
} from 'nuqs/server'
import { OUTCOMES } from '@/lib/checks/vocabulary'
import { DIRECTIONS, DOCKET_SORTS, DUE_FILTERS, type DocketFilter } from '@/lib/rules/docket'
import type { Role } from '@/lib/rules/roles'
import { STATES } from '@/lib/rules/states'

export const DOCKET_PARTS = ['submitter', 'reviewer', 'editor'] as const satisfies readonly Role[]
export type DocketPart = (typeof DOCKET_PARTS)[number]

/** The docket's state in the address. What is not in the address is not asked for. */
export const docketParsers = {
  as: parseAsStringLiteral(DOCKET_PARTS),
  states: parseAsArrayOf(parseAsStringLiteral(STATES)).withDefault([]),
  search: parseAsString.withDefault(''),
  outcome: parseAsStringLiteral(OUTCOMES),
  due: parseAsStringLiteral(DUE_FILTERS),
  mine: parseAsBoolean.withDefault(false),
  sort: parseAsStringLiteral(DOCKET_SORTS),
  direction: parseAsStringLiteral(DIRECTIONS),
  page: parseAsInteger.withDefault(1),
}
export type DocketParams = inferParserType<typeof docketParsers>

export const loadDocketParams = createLoader(docketParsers)
export const serializeDocketParams = createSerializer(docketParsers)

export const docketPageSize = 50

/** The filter that the query is asked; a reviewer's own work comes most urgent first, the rest newest first. */
export function toDocketFilter(params: DocketParams, parts: readonly DocketPart[]): DocketFilter {
  const urgent = (params.as ?? (parts.length === 1 ? parts[0] : null)) === 'reviewer'
  const sort = params.sort ?? (urgent ? 'due' : 'received')
  return {
    ...(params.as && parts.includes(params.as) ? { as: params.as } : {}),
    states: params.states,
    search: params.search.trim().slice(0, 200),
    ...(params.outcome ? { outcome: params.outcome } : {}),
    ...(params.due ? { due: params.due } : {}),
    mine: params.mine,
    sort,
    direction: params.direction ?? (sort === 'received' ? 'desc' : 'asc'),
    page: Math.max(1, params.page),
    pageSize: docketPageSize,
  }
}

/** The filter as the query string of the docket's route; a list is repeated. */
export function toDocketQuery(filter: DocketFilter): string {
  const query = new URLSearchParams()
  for (const [name, value] of Object.entries(filter)) {
    if (Array.isArray(value)) for (const item of value) query.append(name, item)
    else if (value !== undefined && value !== '' && value !== false) query.set(name, String(value))
  }
  return query.toString()
}

/** True when something narrows the docket, so that an empty one means "none fits" and not "none yet". */
export function isNarrowed(params: DocketParams): boolean {
  return (
    params.states.length > 0 ||
    params.search.trim() !== '' ||
    params.outcome !== null ||
    params.due !== null ||
    params.mine
  )
}
