import { notFound, redirect } from 'next/navigation'
import { toDraftForm } from '@/components/hand-in/draft-form'
import { HandInForm } from '@/components/hand-in/hand-in-form'
import { StuckForm } from '@/components/hand-in/stuck-form'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { getDb } from '@/db/current'
import { getManuscript, type RoundView } from '@/db/queries/manuscript'
import { getSettings } from '@/lib/settings'
import { requireActor } from '@/lib/web/actor'
import { handInAction, handInAgainAction, removeFileAction } from '../actions'

export const metadata = { title: 'Hand in' }

export default async function DraftPage({ params }: PageProps<'/hand-in/[manuscriptId]'>) {
  const actor = await requireActor()
  const { manuscriptId } = await params
  const manuscript = getManuscript(getDb(), actor, manuscriptId)
  if (!manuscript) notFound()
  if (!manuscript.actions.includes('addFile')) redirect(`/manuscripts/${manuscriptId}`)
  const stuck = !manuscript.actions.includes('changeDraft')
  const round = manuscript.rounds.at(-1)
  if (!round) notFound()
  const { uploadLimitBytes } = getSettings()
  const above = [manuscript.reference, round.number > 1 ? `round ${round.number}` : null]
  return (
    <Page narrow>
      <PageHead
        title={stuck ? 'Replace a file' : round.number > 1 ? 'Hand in the revision' : 'Hand in a manuscript'}
        above={above.filter(Boolean).join(' · ')}
      />
      {stuck ? (
        <StuckForm
          manuscriptId={manuscriptId}
          trouble={manuscript.progress?.trouble ?? null}
          files={pickFiles(round)}
          limitBytes={uploadLimitBytes}
          handInAgain={handInAgainAction}
        />
      ) : (
        <HandInForm
          manuscriptId={manuscriptId}
          round={round.number}
          drafted={toDraftForm({ ...manuscript, ...round })}
          files={pickFiles(round)}
          limitBytes={uploadLimitBytes}
          handIn={handInAction}
          removeFile={removeFileAction}
        />
      )}
    </Page>
  )
}

/** The file of each kind that counts: the one that was not replaced. */
function pickFiles(round: RoundView) {
  const current = (kind: 'manuscript' | 'table') =>
    round.files.findLast((file) => file.kind === kind && file.replacedAt === null)
  const [manuscript, table] = [current('manuscript'), current('table')]
  return { ...(manuscript ? { manuscript } : {}), ...(table ? { table } : {}) }
}
