import type { PointRow } from '@/db/queries/points'
import { ruleWords } from '../findings/rule-words'
import { SeverityMark } from '../shell/severity-mark'

/** What was asked in the round before, and what the authors answered. */
export function EarlierPoints({ points, round }: { points: readonly PointRow[]; round: number }) {
  const asked = points.filter((point) => point.status === 'kept')
  if (asked.length === 0) return null
  return (
    <section aria-labelledby="earlier-title" className="mt-8">
      <h2 id="earlier-title" className="mb-2 text-lg font-semibold">
        Asked in round {round}
      </h2>
      <ol className="flex flex-col gap-4">
        {asked.map((point, index) => (
          <li key={point.id} className="margin-rule pl-4">
            <p className="flex flex-wrap items-baseline justify-between gap-x-3 text-xs text-ink-soft">
              <span>
                {index + 1}. {ruleWords(point.rule)}
              </span>
              <SeverityMark severity={point.severity} />
            </p>
            <p className="font-serif">{point.asks}</p>
            {point.answer ? (
              <div className="mt-1.5 border-l-2 border-tide pl-3">
                <p className="text-xs text-ink-soft">The authors answer</p>
                <p className="whitespace-pre-wrap">{point.answer.body}</p>
              </div>
            ) : (
              <p className="mt-1 text-ink-soft">Not answered.</p>
            )}
          </li>
        ))}
      </ol>
    </section>
  )
}
