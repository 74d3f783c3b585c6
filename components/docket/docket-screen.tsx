'use client'

import { useQueryClient } from '@tanstack/react-query'
import { useQueryStates } from 'nuqs'
import { useState } from 'react'
import type { DocketRow } from '@/db/queries/docket'
import { Failed } from '../shell/failed'
import type { Answer } from '../shell/use-action'
import { Button, ButtonLink } from '../ui/button'
import { EmptyState } from '../ui/empty-state'
import { Pager } from '../ui/pager'
import { Skeleton } from '../ui/skeleton'
import { AnswerDialog, type AnswerInput } from './answer-dialog'
import { AssignDialog, type AssignInput } from './assign-dialog'
import { DocketFilters } from './docket-filters'
import { docketPageSize, docketParsers, isNarrowed, toDocketFilter, type DocketPart } from './docket-params'
import { DocketTable } from './docket-table'
import { useDocket, useDocketFacets } from './use-docket'

type DocketScreenProps = {
  parts: readonly DocketPart[]
  mayAssign: boolean
  maySubmit: boolean
  reviewDays: number
  offer: (input: AssignInput) => Promise<Answer<unknown>>
  answer: (input: AnswerInput) => Promise<Answer<unknown>>
}

/** The queue: what the address asks for, what is selected, and the two things one can do from here. */
export function DocketScreen(props: DocketScreenProps) {
  const [params, setParams] = useQueryStates(docketParsers, { history: 'push' })
  const filter = toDocketFilter(params, props.parts)
  const docket = useDocket(filter)
  const facets = useDocketFacets(filter.as)
  const [selected, setSelected] = useState<ReadonlySet<string>>(new Set())
  const [assigning, setAssigning] = useState(false)
  const [answering, setAnswering] = useState<{ row: DocketRow; accept: boolean } | null>(null)
  const client = useQueryClient()

  const rows = docket.data?.rows ?? []
  const chosen = rows.filter((row) => selected.has(row.id))
  const change = (next: Parameters<typeof setParams>[0]) => {
    setSelected(new Set())
    void setParams(next)
  }
  const refresh = () => {
    setSelected(new Set())
    void client.invalidateQueries({ queryKey: ['docket'] })
  }

  return (
    <>
      <DocketFilters params={params} parts={props.parts} facets={facets.data ?? null} onChange={change} />
      {chosen.length > 0 ? (
        <div className="sticky top-0 z-20 flex items-center justify-between gap-4 border border-tide bg-sheet px-3 py-2">
          <p aria-live="polite">{chosen.length} selected</p>
          <div className="flex gap-2">
            <Button size="small" variant="quiet" onClick={() => setSelected(new Set())}>
              Clear
            </Button>
            <Button size="small" variant="primary" onClick={() => setAssigning(true)}>
              Assign
            </Button>
          </div>
        </div>
      ) : null}
      {docket.isError ? (
        <Failed error={docket.error} onRetry={() => void docket.refetch()} />
      ) : docket.isPending ? (
        <Skeleton rows={10} label="Loading the docket" />
      ) : rows.length === 0 ? (
        <NothingHere
          narrowed={isNarrowed(params)}
          maySubmit={props.maySubmit}
          beyond={docket.data.total > 0}
          onClear={() => change(null)}
        />
      ) : (
        <div aria-busy={docket.isPlaceholderData} className={docket.isPlaceholderData ? 'opacity-70' : ''}>
          <DocketTable
            rows={rows}
            parts={props.parts}
            sort={filter.sort ?? 'received'}
            direction={filter.direction ?? 'desc'}
            onSort={(sort, direction) => change({ sort, direction, page: 1 })}
            selectable={props.mayAssign}
            selected={selected}
            onSelect={setSelected}
            onAnswer={(row, accept) => setAnswering({ row, accept })}
          />
        </div>
      )}
      {docket.data && docket.data.total > 0 ? (
        <Pager
          page={filter.page === undefined ? 1 : Number(filter.page)}
          pageSize={docketPageSize}
          total={docket.data.total}
          things={docket.data.total === 1 ? 'manuscript' : 'manuscripts'}
          onPage={(page) => change({ page })}
        />
      ) : null}
      {assigning ? (
        <AssignDialog
          manuscripts={chosen}
          reviewDays={props.reviewDays}
          offer={props.offer}
          onClose={() => setAssigning(false)}
          onDone={refresh}
        />
      ) : null}
      {answering ? (
        <AnswerDialog
          manuscript={answering.row}
          accept={answering.accept}
          answer={props.answer}
          onClose={() => setAnswering(null)}
          onDone={refresh}
        />
      ) : null}
    </>
  )
}

type NothingHereProps = { narrowed: boolean; beyond: boolean; maySubmit: boolean; onClear: () => void }

function NothingHere({ narrowed, beyond, maySubmit, onClear }: NothingHereProps) {
  if (narrowed || beyond) {
    return (
      <EmptyState action={<Button onClick={onClear}>Show everything</Button>}>
        No manuscript fits what you asked for.
      </EmptyState>
    )
  }
  if (maySubmit) {
    return (
      <EmptyState
        action={
          <ButtonLink href="/hand-in" variant="primary">
            Hand in a manuscript
          </ButtonLink>
        }
      >
        Nothing has been handed in yet.
      </EmptyState>
    )
  }
  return <EmptyState>The docket is empty; what is handed in or assigned to you will stand here.</EmptyState>
}
