import type { DocketFilter } from '@/lib/rules/docket'

/** The docket's key in the cache of queries, for the page that fills it and the hook that reads it. */
export const docketKey = (filter: DocketFilter) => ['docket', filter] as const

/** The counts beside the filters; `as` is all that they depend on. Shares its first part, so that both go stale together. */
export const facetsKey = (as: DocketFilter['as']) => ['docket', 'facets', as ?? 'all'] as const
