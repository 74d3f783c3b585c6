import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import type { NamedColumn, ReadTable } from '@/lib/checks'
import { manuscriptKeys } from '../manuscripts/resources'
import { fetchJson } from '../shell/fetch-json'

/** A results table as the route handler gives it: its first rows, and what people named. */
export type TableColumnsView = {
  fileId: string
  name: string
  alpha: number
  columns: NamedColumn[]
  revision: number
  mayName: boolean
  asksAudit: boolean
  table: ReadTable
  cut: boolean
}

const urlOf = (fileId: string) => `/api/files/${fileId}/columns`
const keyOf = (fileId: string) => ['file', fileId, 'columns']

export const namingKey = ['name columns']

export function useTableColumns(fileId: string) {
  return useQuery({
    queryKey: keyOf(fileId),
    queryFn: ({ signal }) => fetchJson<TableColumnsView>(urlOf(fileId), { signal }),
    // Whether one may name columns changes with the state of the manuscript.
    staleTime: 0,
    refetchOnWindowFocus: false,
  })
}

/** Saves the named columns, one change after the other, each on the revision that the one before it made. */
export function useNameColumns(fileId: string, manuscriptId: string) {
  const client = useQueryClient()
  const key = keyOf(fileId)
  return useMutation({
    mutationKey: namingKey,
    scope: { id: fileId },
    mutationFn: (columns: readonly NamedColumn[]) =>
      fetchJson<{ revision: number; auditId: string | null }>(urlOf(fileId), {
        method: 'PUT',
        body: { columns, revision: client.getQueryData<TableColumnsView>(key)?.revision ?? 0 },
      }),
    onSuccess: ({ revision, auditId }, columns) => {
      client.setQueryData<TableColumnsView>(
        key,
        (view) => view && { ...view, revision, columns: [...columns] },
      )
      if (auditId === null) return undefined
      return Promise.all(
        [manuscriptKeys.audit, manuscriptKeys.points, manuscriptKeys.progress].map((keyOfPart) =>
          client.invalidateQueries({ queryKey: keyOfPart(manuscriptId) }),
        ),
      )
    },
  })
}
