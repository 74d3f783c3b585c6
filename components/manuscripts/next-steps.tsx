'use client'

import { useRouter } from 'next/navigation'
import { useState } from 'react'
import type { ManuscriptView } from '@/db/queries/manuscript'
import { AnswerDialog } from '../docket/answer-dialog'
import { AssignDialog } from '../docket/assign-dialog'
import { Button, ButtonLink } from '../ui/button'
import type { ManuscriptActions } from './manuscript-actions'
import { ReasonDialog } from './reason-dialog'

type Asked = 'assign' | 'accept' | 'decline' | 'end' | 'conflict' | 'withdraw' | 'close' | 'again'

/** What the viewer can do next; each change asks once more in a dialog. */
export function NextSteps({
  manuscript,
  actions,
}: {
  manuscript: ManuscriptView
  actions: ManuscriptActions
}) {
  const router = useRouter()
  const [asked, setAsked] = useState<Asked | null>(null)
  const { id } = manuscript
  const may = (action: ManuscriptView['actions'][number]) => manuscript.actions.includes(action)
  const home = `/manuscripts/${id}`
  const close = () => setAsked(null)
  const done = () => router.refresh()
  const mine = manuscript.sight === 'reviewer' && may('answerAssignment')
  const toVerdict = may('draftVerdict') || may('releaseVerdict') || may('readVerdict')
  return (
    <section aria-label="What can be done" className="flex flex-wrap gap-2">
      {mine && (
        <>
          <Button variant="primary" onClick={() => setAsked('accept')}>
            Accept the review
          </Button>
          <Button onClick={() => setAsked('decline')}>Decline</Button>
        </>
      )}
      {may('offerAssignment') && (
        <Button variant="primary" onClick={() => setAsked('assign')}>
          Assign
        </Button>
      )}
      {may('readAudit') && (
        <ButtonLink href={`${home}/bench`} variant={may('decidePoint') ? 'primary' : 'plain'}>
          Open the bench
        </ButtonLink>
      )}
      {toVerdict && (
        <ButtonLink href={`${home}/verdict`} variant={may('releaseVerdict') ? 'primary' : 'plain'}>
          {may('releaseVerdict')
            ? 'Release the verdict'
            : may('draftVerdict')
              ? 'Write the verdict'
              : 'Verdict'}
        </ButtonLink>
      )}
      {(may('readLetter') || may('readAnswers')) && (
        <ButtonLink href={`${home}/answer`} variant={may('writeAnswer') ? 'primary' : 'plain'}>
          {may('writeAnswer') ? 'Read the letter and answer' : 'Letter and answers'}
        </ButtonLink>
      )}
      {manuscript.sight === 'submitter' && may('handIn') && (
        <ButtonLink href={`/hand-in/${id}`} variant="primary">
          {manuscript.state === 'draft' ? 'Go on with the draft' : 'Go on with the revision'}
        </ButtonLink>
      )}
      {may('readRecord') && <ButtonLink href={`${home}/record`}>Record</ButtonLink>}
      {may('runAuditAgain') && <Button onClick={() => setAsked('again')}>Run the audit again</Button>}
      {may('endAssignment') && <Button onClick={() => setAsked('end')}>End the assignment</Button>}
      {may('declareConflict') && <Button onClick={() => setAsked('conflict')}>Declare a conflict</Button>}
      {may('closeManuscript') && <Button onClick={() => setAsked('close')}>Close</Button>}
      {may('withdrawManuscript') && (
        <Button variant="danger" onClick={() => setAsked('withdraw')}>
          Withdraw
        </Button>
      )}
      {asked === 'assign' && (
        <AssignDialog
          manuscripts={[manuscript]}
          reviewDays={manuscript.rules.reviewDays}
          offer={actions.offer}
          onClose={close}
          onDone={done}
        />
      )}
      {(asked === 'accept' || asked === 'decline') && (
        <AnswerDialog
          manuscript={manuscript}
          accept={asked === 'accept'}
          answer={actions.answer}
          onClose={close}
          onDone={done}
        />
      )}
      {asked === 'again' && (
        <ReasonDialog
          title="Run the audit again"
          reasonLabel={null}
          reasonNeeded={false}
          submit="Run again"
          busy="Starting…"
          done="The audit runs again."
          act={() => actions.runAuditAgain({ manuscriptId: id })}
          onClose={close}
          onDone={done}
        >
          The files are read and every family is recomputed afresh. Points that nobody decided yet are made
          anew.
        </ReasonDialog>
      )}
      {asked === 'end' && (
        <ReasonDialog
          title="End the assignment"
          reasonLabel="Reason"
          reasonHint="The reviewer reads this."
          reasonNeeded
          submit="End it"
          busy="Ending…"
          done="The assignment is ended; the manuscript can be assigned again."
          act={(reason) => actions.endAssignment({ manuscriptId: id, reason })}
          onClose={close}
          onDone={done}
        >
          The reviewer no longer sees the manuscript. What they wrote is kept.
        </ReasonDialog>
      )}
      {asked === 'conflict' && (
        <ReasonDialog
          title="Declare a conflict of interest"
          reasonLabel="What it is"
          reasonHint="The editor reads this, the authors do not."
          reasonNeeded
          submit="Declare it"
          busy="Saving…"
          done="The conflict is noted; the editor is told."
          act={(reason) => actions.declareConflict({ manuscriptId: id, reason })}
          onClose={close}
          onDone={() => router.push('/docket')}
        >
          You step aside at once and no longer see the manuscript.
        </ReasonDialog>
      )}
      {asked === 'close' && (
        <ReasonDialog
          title="Close the manuscript"
          reasonLabel={null}
          reasonNeeded={false}
          submit="Close"
          busy="Closing…"
          done="The manuscript is closed."
          act={() => actions.close({ manuscriptId: id })}
          onClose={close}
          onDone={done}
        >
          No further answer or revision can be handed in. Everything stays readable.
        </ReasonDialog>
      )}
      {asked === 'withdraw' && (
        <ReasonDialog
          title="Withdraw the manuscript"
          reasonLabel="Reason"
          reasonNeeded={false}
          submit="Withdraw"
          busy="Withdrawing…"
          danger
          done="The manuscript is withdrawn."
          act={(reason) => actions.withdraw({ manuscriptId: id, reason })}
          onClose={close}
          onDone={done}
        >
          The review ends and nobody works on the manuscript any more. This cannot be undone.
        </ReasonDialog>
      )}
    </section>
  )
}
