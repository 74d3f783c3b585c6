import type { VerdictView } from '@/db/queries/verdict'
import { Time } from '../ui/time'
import { verdictSentences } from './verdict-words'

/** A verdict to read: which one, who wrote it, the word to the editor. */
export function VerdictSummary({ verdict }: { verdict: VerdictView }) {
  return (
    <section aria-labelledby="verdict-title">
      <h2 id="verdict-title" className="text-lg font-semibold">
        Verdict: {verdict.verdict}
      </h2>
      <p className="text-ink-soft">{verdictSentences[verdict.verdict]}</p>
      <p className="mt-1">
        {verdict.reviewer.name}, <Time at={verdict.changedAt} show="moment" />
        {verdict.effortMinutes !== null && `, ${verdict.effortMinutes} minutes`}
      </p>
      {verdict.remark && (
        <div className="margin-rule mt-3 pl-4">
          <h3 className="font-sans text-sm font-semibold">Remark to the editor</h3>
          <p className="max-w-prose whitespace-pre-wrap">{verdict.remark}</p>
        </div>
      )}
    </section>
  )
}
