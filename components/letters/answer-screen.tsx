'use client'

import Link from 'next/link'
import { useRouter } from 'next/navigation'
import type { LetterView } from '@/db/queries/letter'
import type { ManuscriptView } from '@/db/queries/manuscript'
import type { PointRow } from '@/db/queries/points'
import { StateTag } from '../shell/state-tag'
import { useAction, type Answer } from '../shell/use-action'
import { Button, ButtonLink } from '../ui/button'
import { Notice } from '../ui/notice'
import { Page } from '../ui/page'
import { PageHead } from '../ui/page-head'
import { Time } from '../ui/time'
import { AnswerForm, type WriteAnswer } from './answer-form'
import { LetterSheet } from './letter-sheet'

type AnswerScreenProps = {
  manuscript: ManuscriptView
  letter: LetterView
  points: readonly PointRow[]
  write: WriteAnswer
  openRound: (input: { manuscriptId: string }) => Promise<Answer<unknown>>
}

/** The letter as it was sent, its points with the authors' answers, and the way to a revision. */
export function AnswerScreen({ manuscript, letter, points, write, openRound }: AnswerScreenProps) {
  const may = (action: ManuscriptView['actions'][number]) => manuscript.actions.includes(action)
  const mayWrite = may('writeAnswer')
  const answered = points.filter((point) => point.answer !== null).length
  return (
    <Page>
      <PageHead
        above={
          <span className="flex items-center gap-2">
            <Link href={`/manuscripts/${manuscript.id}`} className="text-tide hover:underline">
              {manuscript.reference ?? 'Manuscript'}
            </Link>
            <StateTag state={manuscript.state} />
            round {letter.round}
          </span>
        }
        title="Letter and answers"
        lead={manuscript.title}
      />
      <div className="grid gap-x-10 gap-y-8 xl:grid-cols-2">
        <section aria-labelledby="letter-title">
          <h2 id="letter-title" className="text-lg font-semibold">
            Verdict: {letter.verdict}
          </h2>
          <p className="mb-2 text-ink-soft">
            Sent <Time at={letter.sentAt} show="moment" />
          </p>
          <LetterSheet subject={letter.subject} html={letter.html} />
        </section>
        <section aria-labelledby="answers-title" className="print:hidden">
          <h2 id="answers-title" className="text-lg font-semibold">
            Point by point
          </h2>
          <p className="mb-4 text-ink-soft" aria-live="polite">
            {points.length === 0 ? 'The letter makes no points.' : `${answered} of ${points.length} answered`}
            {mayWrite && points.length > 0 && (
              <>
                ; an answer is hoped for by <Time at={letter.answerBy} show="due" />
              </>
            )}
            .
          </p>
          <ol>
            {points.map((point, index) => (
              <AnswerForm key={point.id} point={point} number={index + 1} write={mayWrite ? write : null} />
            ))}
          </ol>
          <Revision manuscript={manuscript} openRound={openRound} />
        </section>
      </div>
    </Page>
  )
}

function Revision({ manuscript, openRound }: Pick<AnswerScreenProps, 'manuscript' | 'openRound'>) {
  const router = useRouter()
  const to = `/hand-in/${manuscript.id}`
  const { run, pending, message } = useAction(openRound, () => router.push(to))
  if (manuscript.sight === 'submitter' && manuscript.actions.includes('handIn')) {
    return (
      <Notice
        title="A revision is being prepared"
        action={
          <ButtonLink href={to} variant="primary">
            Go on with it
          </ButtonLink>
        }
      />
    )
  }
  if (!manuscript.actions.includes('openRound')) return null
  return (
    <>
      {message && <Notice tone="trouble">{message}</Notice>}
      <Notice
        title="Hand in a revision"
        action={
          <Button
            variant="primary"
            busy={pending && 'Opening…'}
            onClick={() => run({ manuscriptId: manuscript.id })}
          >
            Begin the revision
          </Button>
        }
      >
        A new round opens with your files; the answers go with it.
      </Notice>
    </>
  )
}
