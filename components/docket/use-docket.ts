'use client'

import { keepPreviousData, useQuery } from '@tanstack/react-query'
import type { DocketFacets, DocketPage } from '@/db/queries/docket'
import type { DocketFilter } from '@/lib/rules/docket'
import { fetchJson } from '../shell/fetch-json'
import { docketKey, facetsKey } from './docket-key'
import { toDocketQuery } from './docket-params'

export function useDocket(filter: DocketFilter) {
  return useQuery({
    queryKey: docketKey(filter),
    queryFn: ({ signal }) => fetchJson<DocketPage>(`/api/docket?${toDocketQuery(filter)}`, { signal }),
    placeholderData: keepPreviousData,
    refetchInterval: 60_000,
  })
}

export function useDocketFacets(as: DocketFilter['as']) {
  return useQuery({
    queryKey: facetsKey(as),
    queryFn: ({ signal }) =>
      fetchJson<DocketFacets>(`/api/docket/facets${as ? `?as=${as}` : ''}`, { signal }),
    placeholderData: keepPreviousData,
    refetchInterval: 60_000,
  })
}
