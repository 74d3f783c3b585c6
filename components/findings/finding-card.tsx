'use client'

import { useState } from 'react'
import type { PointRow } from '@/db/queries/points'
import { bibliography } from '@/lib/checks/bibliography'
import type { Finding } from '@/lib/checks/types'
import { isSame, outcomeOfReport, placeOf } from '../bench/audit-index'
import { useBench } from '../bench/bench-state'
import { PlaceLink, placeWords } from '../bench/place-link'
import { RowView } from '../bench/row-view'
import { OutcomeShape } from '../shell/outcome-mark'
import { SeverityMark } from '../shell/severity-mark'
import { Button } from '../ui/button'
import { classes } from '../ui/classes'
import { toast } from '../ui/toast'
import { PointStatusMark } from './point-status'
import { RewordForm } from './reword-form'
import { ruleWords } from './rule-words'
import { useDecidePoint } from './use-points'

/** One finding: what was found, what the authors are asked, its evidence, and what the reviewer decides. */
export function FindingCard({ finding, point }: { finding: Finding; point: PointRow | undefined }) {
  const { index, chosen, show, comment, manuscriptId, mayDecide } = useBench()
  const [rewording, setRewording] = useState(false)
  const decide = useDecidePoint(manuscriptId)
  const target = { kind: 'finding' as const, id: finding.id }
  const place = placeOf(index, target)
  const family = finding.family ? index.families.get(finding.family) : undefined
  const outcome =
    finding.reports.map((id) => outcomeOfReport(index, id)).find((one) => one && one !== 'holds') ??
    family?.outcome ??
    null
  const selected = isSame(chosen, target)
  const set = (status: 'kept' | 'dropped' | 'open') =>
    point && decide.mutate({ pointId: point.id, status }, { onError: (error) => toast.error(error.message) })
  return (
    <article
      aria-labelledby={`finding-${finding.id}-title`}
      aria-current={selected || undefined}
      data-target={`finding-${finding.id}`}
      className="grid scroll-mt-4 grid-cols-[2.5rem_minmax(0,1fr)] break-inside-avoid"
    >
      <div className="flex flex-col items-center gap-1 pt-2.5 text-xs text-ink-soft">
        {outcome && <OutcomeShape outcome={outcome} />}
        {place && place.page !== null && <span className="tabular">{place.page}</span>}
      </div>
      <div
        className={classes(
          'margin-rule min-w-0 border-b border-b-rule py-2.5 pr-2 pl-4',
          selected && 'bg-tide-wash/50',
          point?.status === 'dropped' && 'text-ink-soft',
        )}
      >
        <header className="flex flex-wrap items-baseline justify-between gap-x-4">
          <h3 id={`finding-${finding.id}-title`} className="text-base font-semibold">
            {ruleWords(finding.rule)}
          </h3>
          <span className="flex items-center gap-4">
            <SeverityMark severity={point?.severity ?? finding.severity} />
            {point && <PointStatusMark status={point.status} />}
          </span>
        </header>
        {family && <p className="text-xs text-ink-soft">{family.label}</p>}
        <p className="mt-1 max-w-prose">{finding.says}</p>
        {place && (
          <p className="mt-1.5 flex flex-wrap items-baseline gap-x-2">
            <PlaceLink place={place} what={ruleWords(finding.rule)} onShow={() => show(target)} />
            {place.page !== null && place.quote && (
              <q className="font-mono text-xs break-words">{place.quote}</q>
            )}
          </p>
        )}
        {place && place.page === null && place.row !== null && (
          <RowView place={place} words={placeWords(place)} />
        )}
        {rewording && point ? (
          <RewordForm
            asks={point.asks}
            severity={point.severity}
            busy={decide.isPending}
            error={decide.error?.message}
            onCancel={() => setRewording(false)}
            onSave={(change) =>
              decide.mutate(
                { pointId: point.id, status: 'kept', ...change },
                { onSuccess: () => setRewording(false) },
              )
            }
          />
        ) : (
          <blockquote className="mt-2 max-w-prose border-l-2 border-rule pl-3 font-serif text-base text-ink">
            {point?.asks ?? finding.asks}
          </blockquote>
        )}
        {finding.cites.length > 0 && (
          <p className="mt-1.5 text-xs text-ink-soft">
            Guidance: {finding.cites.map((key) => bibliography.get(key)?.text ?? key).join(' ')}
          </p>
        )}
        {!rewording && (
          <div className="mt-2 flex flex-wrap gap-1.5 print:hidden">
            {point && mayDecide && (
              <>
                <Button
                  size="small"
                  variant={point.status === 'kept' ? 'primary' : 'plain'}
                  aria-pressed={point.status === 'kept'}
                  onClick={() => set(point.status === 'kept' ? 'open' : 'kept')}
                >
                  Keep
                </Button>
                <Button
                  size="small"
                  aria-pressed={point.status === 'dropped'}
                  onClick={() => set(point.status === 'dropped' ? 'open' : 'dropped')}
                >
                  Drop
                </Button>
                <Button size="small" variant="quiet" onClick={() => setRewording(true)}>
                  Reword
                </Button>
              </>
            )}
            {comment && (
              <Button size="small" variant="quiet" onClick={() => comment(target)}>
                Comment
              </Button>
            )}
          </div>
        )}
      </div>
    </article>
  )
}
