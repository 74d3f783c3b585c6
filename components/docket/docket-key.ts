import type { DocketFilter } from '@/lib/rules/docket'

/** The docket's key in the cache of queries, for the page that fills it and the hook that reads it. */
export const docketKey = (filter: DocketFilter) => ['docket', filter] as const
