import { useQuery, type QueryKey } from '@tanstack/react-query'
import type { KeptAudit } from '@/db/queries/audit'
import type { AuditProgress } from '@/db/queries/audit-progress'
import { fetchJson } from '../shell/fetch-json'

/** Addresses and cache keys of one manuscript's resources; a page that prefetches uses the same keys. */
export const manuscriptUrl = (id: string, rest = '') => `/api/manuscripts/${id}${rest}`
export const manuscriptKeys = {
  progress: (id: string): QueryKey => ['manuscript', id, 'progress'],
  audit: (id: string): QueryKey => ['manuscript', id, 'audit'],
  points: (id: string): QueryKey => ['manuscript', id, 'points'],
  comments: (id: string): QueryKey => ['manuscript', id, 'comments'],
}

export function useAudit(id: string) {
  return useQuery({
    queryKey: manuscriptKeys.audit(id),
    queryFn: ({ signal }) => fetchJson<KeptAudit | null>(manuscriptUrl(id, '/audit'), { signal }),
    // A finished audit does not change; running it again makes another one.
    staleTime: 5 * 60_000,
    structuralSharing: false,
  })
}

/** Asked every second and a half while the audit waits or runs, and then no more. */
export function useAuditProgress(id: string, first: AuditProgress | null) {
  return useQuery({
    queryKey: manuscriptKeys.progress(id),
    queryFn: ({ signal }) => fetchJson<AuditProgress | null>(manuscriptUrl(id, '/progress'), { signal }),
    initialData: first,
    staleTime: 0,
    refetchInterval: ({ state }) => (isUnderWay(state.data ?? null) ? 1500 : false),
  })
}

export function isUnderWay(progress: AuditProgress | null): boolean {
  return progress?.status === 'queued' || progress?.status === 'running'
}
