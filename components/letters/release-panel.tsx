'use client'

import { useRouter } from 'next/navigation'
import { useState } from 'react'
import type { ManuscriptView } from '@/db/queries/manuscript'
import type { VerdictView } from '@/db/queries/verdict'
import { ReasonDialog } from '../manuscripts/reason-dialog'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import type { VerdictActions } from './verdict-actions'

type ReleasePanelProps = {
  manuscript: ManuscriptView
  verdict: VerdictView
  actions: Pick<VerdictActions, 'sendBack' | 'release'>
}

/** What becomes of a drafted verdict, and who may say so. */
export function ReleasePanel({ manuscript, verdict, actions }: ReleasePanelProps) {
  const router = useRouter()
  const [asked, setAsked] = useState<'release' | 'back' | null>(null)
  const mayRelease = manuscript.actions.includes('releaseVerdict')
  const maySendBack = manuscript.actions.includes('sendVerdictBack')
  const { id } = manuscript
  if (verdict.status === 'released') return null
  if (verdict.status === 'sent back') {
    return (
      <Notice tone="care" title="The editor sent the verdict back">
        {verdict.sentBackReason}
      </Notice>
    )
  }
  if (!mayRelease && !maySendBack) {
    return (
      <Notice title="The verdict is drafted">
        {manuscript.rules.twoPersonRelease
          ? 'The house rules ask for two people: an editor reads it and releases it, or sends it back to you.'
          : 'It can be released once it is saved.'}
      </Notice>
    )
  }
  return (
    <Notice
      title="The verdict waits to be released"
      action={
        <span className="flex flex-wrap gap-2">
          {maySendBack && <Button onClick={() => setAsked('back')}>Send back</Button>}
          {mayRelease && (
            <Button variant="primary" onClick={() => setAsked('release')}>
              Release verdict
            </Button>
          )}
        </span>
      }
    >
      {verdict.kept} {verdict.kept === 1 ? 'point' : 'points'} kept
      {verdict.undecided > 0 && `, ${verdict.undecided} undecided`}.{' '}
      {!mayRelease && 'You wrote it, so another editor releases it.'}
      {asked === 'release' && (
        <ReasonDialog
          title="Release the verdict"
          reasonLabel={null}
          reasonNeeded={false}
          submit="Release verdict"
          busy="Releasing…"
          done="The verdict is released and the letter is on its way."
          act={() => actions.release({ manuscriptId: id })}
          onClose={() => setAsked(null)}
          onDone={() => router.refresh()}
        >
          {undecidedWords(verdict.undecided)}The letter is mailed to the submitter as it stands, with the
          verdict “{verdict.verdict}”. This cannot be undone.
        </ReasonDialog>
      )}
      {asked === 'back' && (
        <ReasonDialog
          title="Send the verdict back"
          reasonLabel="What should change"
          reasonHint="The reviewer reads this."
          reasonNeeded
          submit="Send back"
          busy="Sending…"
          done="The reviewer has it again."
          act={(reason) => actions.sendBack({ manuscriptId: id, reason })}
          onClose={() => setAsked(null)}
          onDone={() => router.refresh()}
        >
          The manuscript goes back into review; the reviewer can change points, verdict and letter.
        </ReasonDialog>
      )}
    </Notice>
  )
}

function undecidedWords(undecided: number): string {
  if (undecided === 0) return ''
  return undecided === 1
    ? 'One point is not decided yet and not asked of the authors. '
    : `${undecided} points are not decided yet and not asked of the authors. `
}
