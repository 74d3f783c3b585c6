'use client'

import { ArrowDown, ArrowUp } from 'lucide-react'
import { useState } from 'react'
import type { PointRow } from '@/db/queries/points'
import { PointStatusMark } from '../findings/point-status'
import { RewordForm } from '../findings/reword-form'
import { ruleWords } from '../findings/rule-words'
import type { PointChange } from '../findings/use-points'
import { SeverityMark } from '../shell/severity-mark'
import { Button } from '../ui/button'
import { IconButton } from '../ui/icon-button'

type PointItemProps = {
  point: PointRow
  number: number | null
  mayDecide: boolean
  busy: boolean
  error: string | undefined
  onDecide: (change: PointChange, done?: () => void) => void
  /** Absent at the ends of the list. */
  onUp?: () => void
  onDown?: () => void
}

/** A point for the letter, with what can be done about it. */
export function PointItem(props: PointItemProps) {
  const { point, mayDecide, onDecide } = props
  const [rewording, setRewording] = useState(false)
  const set = (status: PointRow['status']) => onDecide({ pointId: point.id, status })
  return (
    <li className="grid grid-cols-[2rem_minmax(0,1fr)]">
      <span className="tabular pt-2.5 text-right text-xs text-ink-soft">
        {props.number ?? ''}
        {point.page !== null && <span className="block">p. {point.page}</span>}
      </span>
      <div className="margin-rule ml-2 border-b border-b-rule py-2.5 pl-3">
        <div className="flex flex-wrap items-baseline justify-between gap-x-3">
          <h3 className="font-sans text-sm font-semibold">{ruleWords(point.rule)}</h3>
          <span className="flex items-center gap-3 text-xs">
            <SeverityMark severity={point.severity} />
            <PointStatusMark status={point.status} />
          </span>
        </div>
        {point.familyLabel && <p className="text-xs text-ink-soft">{point.familyLabel}</p>}
        {rewording ? (
          <RewordForm
            asks={point.asks}
            severity={point.severity}
            busy={props.busy}
            error={props.error}
            onCancel={() => setRewording(false)}
            onSave={(change) =>
              onDecide({ pointId: point.id, status: 'kept', ...change }, () => setRewording(false))
            }
          />
        ) : (
          <p className="mt-1 font-serif">{point.asks}</p>
        )}
        {mayDecide && !rewording && (
          <div className="mt-1 -ml-2 flex flex-wrap items-center gap-0.5">
            {point.status !== 'kept' && (
              <Button size="small" variant="quiet" onClick={() => set('kept')}>
                Keep
              </Button>
            )}
            {point.status !== 'dropped' && (
              <Button size="small" variant="quiet" onClick={() => set('dropped')}>
                Drop
              </Button>
            )}
            <Button size="small" variant="quiet" onClick={() => setRewording(true)}>
              Reword
            </Button>
            {point.status === 'kept' && (
              <>
                <IconButton label="Move up" disabled={!props.onUp} onClick={props.onUp} className="size-7">
                  <ArrowUp />
                </IconButton>
                <IconButton
                  label="Move down"
                  disabled={!props.onDown}
                  onClick={props.onDown}
                  className="size-7"
                >
                  <ArrowDown />
                </IconButton>
              </>
            )}
          </div>
        )}
      </div>
    </li>
  )
}
