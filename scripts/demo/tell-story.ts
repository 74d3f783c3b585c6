import { createHash } from 'node:crypto'
import { Readable } from 'node:stream'
import type { Db } from '@/db/client'
import { listPoints } from '@/db/queries/points'
import { addFile } from '@/lib/desk/add-file'
import { answerAssignment } from '@/lib/desk/answer-assignment'
import { changeDraft } from '@/lib/desk/change-draft'
import { composeLetterBody } from '@/lib/desk/compose-letter-body'
import { createDraft } from '@/lib/desk/create-draft'
import { decidePoint } from '@/lib/desk/decide-point'
import { draftVerdict } from '@/lib/desk/draft-verdict'
import { handIn } from '@/lib/desk/hand-in'
import { offerAssignment } from '@/lib/desk/offer-assignment'
import { releaseVerdict } from '@/lib/desk/release-verdict'
import { storeFile } from '@/lib/intake/store-file'
import type { Actor } from '@/lib/rules/roles'
import type { Verdict } from '@/lib/rules/words'
import type { Story } from './stories'
import { writeManuscript } from './write-manuscript'
import { writeResults } from './write-results'

export const day = 24 * 3_600_000
const hour = 3_600_000

export type Stage = { db: Db; uploads: string; audit: (at: number) => Promise<unknown> }

/** A manuscript on its way: each step uses the same commands as the screens, at the time that is given. */
export type Way = { id: string; at: number; submitter: Actor }

export async function beginDraft(stage: Stage, story: Story, submitter: Actor, at: number): Promise<Way> {
  const { manuscriptId } = createDraft(stage.db, submitter, { title: story.manuscript.title }, at)
  changeDraft(
    stage.db,
    submitter,
    {
      manuscriptId,
      correspondingAuthor: submitter.name,
      correspondingEmail: submitter.email,
      ...story.form,
    },
    at + 60_000,
  )
  await putFile(stage, submitter, manuscriptId, 'manuscript', `${story.key}.pdf`, at + 120_000, () =>
    writeManuscript(story.manuscript),
  )
  const { results } = story
  if (results)
    await putFile(stage, submitter, manuscriptId, 'table', results.file, at + 180_000, () =>
      writeResults(results),
    )
  return { id: manuscriptId, at: at + 240_000, submitter }
}

async function putFile(
  { db, uploads }: Stage,
  actor: Actor,
  manuscriptId: string,
  kind: 'manuscript' | 'table',
  name: string,
  at: number,
  write: () => Promise<Buffer> | Buffer,
): Promise<void> {
  const bytes = await write()
  const { sha256, mediaType } = await storeFile(Readable.from([bytes]), {
    folder: uploads,
    kind,
    limit: 50_000_000,
  })
  if (sha256 !== createHash('sha256').update(bytes).digest('hex'))
    throw new Error(`${name} was stored otherwise`)
  addFile(db, actor, { manuscriptId, kind, name, mediaType, sha256, bytes: bytes.length }, at)
}

/** Hands it in and, unless told otherwise, lets the worker's own job audit it. */
export async function handOver(stage: Stage, way: Way, { audited = true } = {}): Promise<Way> {
  handIn(stage.db, way.submitter, { manuscriptId: way.id }, way.at)
  if (audited) await stage.audit(way.at + 60_000)
  return { ...way, at: way.at + hour }
}

export function offer(stage: Stage, way: Way, editor: Actor, reviewer: Actor, dueAt: number): Way {
  offerAssignment(stage.db, editor, { manuscriptIds: [way.id], reviewerId: reviewer.id, dueAt }, way.at)
  return { ...way, at: way.at + 5 * hour }
}

export function accept(stage: Stage, way: Way, reviewer: Actor): Way {
  answerAssignment(
    stage.db,
    reviewer,
    { manuscriptId: way.id, accept: true, reason: '', conflict: false },
    way.at,
  )
  return { ...way, at: way.at + day }
}

/** Keeps every point of weight, drops notes: the reviewer's work, done by the book. */
export function decideAll(stage: Stage, way: Way, reviewer: Actor): Way {
  for (const point of listPoints(stage.db, reviewer, way.id)) {
    const kept = point.severity !== 'note'
    decidePoint(
      stage.db,
      reviewer,
      {
        pointId: point.id,
        status: kept ? 'kept' : 'dropped',
        reason: kept ? '' : 'Nothing to ask of the authors.',
      },
      way.at,
    )
  }
  return { ...way, at: way.at + hour }
}

export function judge(
  stage: Stage,
  way: Way,
  reviewer: Actor,
  verdict: Verdict,
  minutes: number,
  remark = '',
): Way {
  const { body } = composeLetterBody(stage.db, reviewer, { manuscriptId: way.id, verdict })
  draftVerdict(
    stage.db,
    reviewer,
    { manuscriptId: way.id, verdict, remark, effortMinutes: minutes, body },
    way.at,
  )
  return { ...way, at: way.at + 3 * hour }
}

export function release(stage: Stage, way: Way, editor: Actor): Way {
  releaseVerdict(stage.db, editor, { manuscriptId: way.id }, way.at)
  return { ...way, at: way.at + day }
}
