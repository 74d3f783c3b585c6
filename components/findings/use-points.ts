import { useIsMutating, useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query'
import type { PointRow } from '@/db/queries/points'
import type { Severity } from '@/lib/checks/vocabulary'
import type { PointStatus } from '@/lib/rules/words'
import { manuscriptKeys, manuscriptUrl } from '../manuscripts/resources'
import { fetchJson } from '../shell/fetch-json'

export function usePoints(manuscriptId: string, enabled = true) {
  return useQuery({
    enabled,
    queryKey: manuscriptKeys.points(manuscriptId),
    queryFn: ({ signal }) => fetchJson<PointRow[]>(manuscriptUrl(manuscriptId, '/points'), { signal }),
  })
}

const changing = (manuscriptId: string) => ['points', manuscriptId]

/** True while a change of a point is on its way: what is made from the points must wait for it. */
export function useArePointsChanging(manuscriptId: string): boolean {
  return useIsMutating({ mutationKey: changing(manuscriptId) }) > 0
}

/** The last of several changes asks again; an answer in between would undo the others on the screen. */
function askAgain(client: QueryClient, manuscriptId: string): Promise<void> | undefined {
  if (client.isMutating({ mutationKey: changing(manuscriptId) }) > 1) return undefined
  return client.invalidateQueries({ queryKey: manuscriptKeys.points(manuscriptId) })
}

export type PointChange = {
  pointId: string
  status: PointStatus
  reason?: string
  severity?: Severity
  asks?: string
}

/** Keeps, drops, rewords or weighs a point. Shown at once; put back if the server refuses. */
export function useDecidePoint(manuscriptId: string) {
  const client = useQueryClient()
  const key = manuscriptKeys.points(manuscriptId)
  return useMutation({
    mutationKey: changing(manuscriptId),
    mutationFn: ({ pointId, ...change }: PointChange) =>
      fetchJson(manuscriptUrl(manuscriptId, `/points/${pointId}`), { method: 'PATCH', body: change }),
    onMutate: async ({ pointId, ...change }) => {
      await client.cancelQueries({ queryKey: key })
      const before = client.getQueryData<PointRow[]>(key)
      client.setQueryData<PointRow[]>(key, (rows) =>
        rows?.map((row) => (row.id === pointId ? { ...row, ...change } : row)),
      )
      return { before }
    },
    onError: (_error, _change, context) => client.setQueryData(key, context?.before),
    onSettled: () => askAgain(client, manuscriptId),
  })
}

export type NewPoint = {
  severity: Severity
  asks: string
  says?: string
  quote?: string
  page?: number | null
}

export function useAddPoint(manuscriptId: string) {
  const client = useQueryClient()
  return useMutation({
    mutationKey: changing(manuscriptId),
    mutationFn: (point: NewPoint) =>
      fetchJson(manuscriptUrl(manuscriptId, '/points'), { method: 'POST', body: point }),
    onSuccess: () => askAgain(client, manuscriptId),
  })
}

export function useMovePoint(manuscriptId: string) {
  const client = useQueryClient()
  return useMutation({
    mutationKey: changing(manuscriptId),
    mutationFn: ({ pointId, position }: { pointId: string; position: number }) =>
      fetchJson(manuscriptUrl(manuscriptId, `/points/${pointId}`), { method: 'PATCH', body: { position } }),
    onSettled: () => askAgain(client, manuscriptId),
  })
}
