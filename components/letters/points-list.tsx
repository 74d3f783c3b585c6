'use client'

import { useState } from 'react'
import type { PointRow } from '@/db/queries/points'
import { useAddPoint, useDecidePoint, useMovePoint, usePoints } from '../findings/use-points'
import { RewordForm } from '../findings/reword-form'
import { Failed } from '../shell/failed'
import { Button } from '../ui/button'
import { Skeleton } from '../ui/skeleton'
import { toast } from '../ui/toast'
import { PointItem } from './point-item'

type PointsListProps = { manuscriptId: string; mayDecide: boolean; mayAdd: boolean }

/** The points of the round: kept ones in the letter's order, then those to decide, then the dropped ones. */
export function PointsList({ manuscriptId, mayDecide, mayAdd }: PointsListProps) {
  const points = usePoints(manuscriptId)
  const decide = useDecidePoint(manuscriptId)
  const move = useMovePoint(manuscriptId)
  const add = useAddPoint(manuscriptId)
  const [adding, setAdding] = useState(false)
  const [droppedToo, setDroppedToo] = useState(false)
  if (points.isPending) return <Skeleton rows={6} label="Loading the points" />
  if (points.error) return <Failed error={points.error} onRetry={() => void points.refetch()} />
  const of = (status: PointRow['status']) => points.data.filter((point) => point.status === status)
  const kept = of('kept')
  const open = of('open')
  const dropped = of('dropped')
  const item = (point: PointRow, at: number | null) => {
    const before = at === null ? undefined : kept[at - 1]
    const after = at === null ? undefined : kept[at + 1]
    const moveTo = (other: PointRow | undefined) =>
      other && {
        run: () =>
          move.mutate(
            { pointId: point.id, position: points.data.findIndex((one) => one.id === other.id) },
            { onError: (error) => toast.error(error.message) },
          ),
      }
    return (
      <PointItem
        key={point.id}
        point={point}
        number={at === null ? null : at + 1}
        mayDecide={mayDecide}
        busy={decide.isPending}
        error={decide.error?.message}
        onDecide={(change, done) =>
          decide.mutate(change, { onSuccess: done, onError: (error) => toast.error(error.message) })
        }
        onUp={moveTo(before)?.run}
        onDown={moveTo(after)?.run}
      />
    )
  }
  return (
    <section aria-labelledby="points-title">
      <h2 id="points-title" className="text-lg font-semibold">
        Points
      </h2>
      <p className="mb-2 text-ink-soft" aria-live="polite">
        {kept.length} kept, {open.length} undecided, {dropped.length} dropped
      </p>
      {points.data.length === 0 && (
        <p className="margin-rule py-4 pl-4 font-serif text-base">
          The audit asks for nothing. A point of your own can be added.
        </p>
      )}
      <ol>{kept.map((point, at) => item(point, at))}</ol>
      {open.length > 0 && (
        <>
          <h3 className="mt-5 mb-1 font-sans text-sm font-semibold">Not decided</h3>
          <ol>{open.map((point) => item(point, null))}</ol>
        </>
      )}
      {dropped.length > 0 && (
        <div className="mt-4">
          <Button
            size="small"
            variant="quiet"
            aria-expanded={droppedToo}
            onClick={() => setDroppedToo(!droppedToo)}
          >
            {droppedToo ? 'Hide the dropped ones' : `Show ${dropped.length} dropped`}
          </Button>
          {droppedToo && <ol>{dropped.map((point) => item(point, null))}</ol>}
        </div>
      )}
      {mayAdd && (
        <div className="mt-4">
          {adding ? (
            <RewordForm
              asks=""
              severity="minor"
              busy={add.isPending}
              error={add.error?.message}
              onCancel={() => setAdding(false)}
              onSave={(point) => add.mutate(point, { onSuccess: () => setAdding(false) })}
            />
          ) : (
            <Button size="small" onClick={() => setAdding(true)}>
              Add a point of your own
            </Button>
          )}
        </div>
      )}
    </section>
  )
}
