import { listReports } from './reports'
import type { Actor } from '@/lib/rules/roles'
import { answerAssignment } from '@/lib/desk/answer-assignment'
import { closeManuscript } from '@/lib/desk/close-manuscript'
import { decidePoint } from '@/lib/desk/decide-point'
import { withdrawManuscript } from '@/lib/desk/withdraw-manuscript'
import { writeComment } from '@/lib/desk/write-comment'
import { listPoints } from '@/db/queries/points'
import type { PersonKey } from './people'
import * as stories from './stories'
import { accept, beginDraft, day, decideAll, handOver, judge, offer, release, type Stage } from './tell-story'

/** The twelve manuscripts, one in every state at least; `now` is the moment that the demonstration begins. */
export async function tellAll(stage: Stage, who: Record<PersonKey, Actor>, now: number): Promise<void> {
  const { editor, secondEditor, reviewer, secondReviewer } = who
  const begin = (story: stories.Story, submitter: Actor, daysAgo: number) =>
    beginDraft(stage, story, submitter, now - daysAgo * day)

  // closed: correct, found sound
  let way = await handOver(stage, await begin(stories.kelpAttachment, who.submitter, 41))
  way = accept(stage, offer(stage, way, editor, reviewer, way.at + 14 * day), reviewer)
  way = judge(stage, decideAll(stage, way, reviewer), reviewer, 'sound', 45)
  way = release(stage, way, editor)
  closeManuscript(stage.db, editor, { manuscriptId: way.id }, way.at)

  // returned: wrong m
  way = await handOver(stage, await begin(stories.hatcheryLighting, who.secondSubmitter, 30))
  way = accept(stage, offer(stage, way, editor, secondReviewer, way.at + 14 * day), secondReviewer)
  writeComment(
    stage.db,
    secondReviewer,
    {
      manuscriptId: way.id,
      audience: 'authors',
      target: 'whole',
      targetLabel: '',
      boxes: [],
      body: 'The design is clear and the counts are double-checked, which is good to see.',
    },
    way.at,
  )
  way = judge(stage, decideAll(stage, way, secondReviewer), secondReviewer, 'sound after changes', 70)
  release(stage, way, editor)

  // verdict drafted: text and table differ
  way = await handOver(stage, await begin(stories.gullRoostNoise, who.thirdSubmitter, 16))
  way = accept(stage, offer(stage, way, editor, secondEditor, way.at + 14 * day), secondEditor)
  way = decideAll(stage, way, secondEditor)
  judge(
    stage,
    way,
    secondEditor,
    'sound after changes',
    35,
    'A slip in one number, I think; nothing that should hold the paper up.',
  )

  // in review: "adjusted" values that are the raw ones; half decided, with comments
  way = await handOver(stage, await begin(stories.seagrassSediment, who.thirdSubmitter, 12))
  way = accept(stage, offer(stage, way, editor, reviewer, now + 3 * day), reviewer)
  const [firstPoint] = listPoints(stage.db, reviewer, way.id)
  if (firstPoint)
    decidePoint(stage.db, reviewer, { pointId: firstPoint.id, status: 'kept', reason: '' }, way.at)
  const [firstReport] = listReports(stage.db, reviewer, way.id)
  writeComment(
    stage.db,
    reviewer,
    {
      manuscriptId: way.id,
      audience: 'private',
      target: firstReport ? 'report' : 'whole',
      targetKey: firstReport?.id ?? null,
      targetLabel: firstReport?.place.quote ?? '',
      boxes: [],
      body: 'Recomputed by hand from t and df: the printed values are the unadjusted ones throughout.',
    },
    way.at,
  )
  writeComment(
    stage.db,
    reviewer,
    {
      manuscriptId: way.id,
      audience: 'editor',
      target: 'whole',
      targetLabel: '',
      boxes: [],
      body: 'The raw table was promised on request. May I ask for it through you?',
    },
    way.at + 1_800_000,
  )

  // in review and overdue: cannot be decided at the printed precision
  way = await handOver(stage, await begin(stories.urchinGrazing, who.thirdSubmitter, 25))
  accept(stage, offer(stage, way, editor, secondReviewer, now - 2 * day), secondReviewer)

  // assigned, after a first reviewer declined: eight uncorrected correlations
  way = await handOver(stage, await begin(stories.tidalPoolSnails, who.secondSubmitter, 9))
  way = offer(stage, way, editor, secondReviewer, now + 8 * day)
  answerAssignment(
    stage.db,
    secondReviewer,
    { manuscriptId: way.id, accept: false, reason: 'At sea until the middle of the month.', conflict: false },
    way.at,
  )
  offer(stage, { ...way, at: way.at + day }, editor, reviewer, now + 10 * day)

  // ready: one correct, one with a level rounded up
  await handOver(stage, await begin(stories.hullCoatings, who.submitter, 3))
  await handOver(stage, await begin(stories.musselByssus, who.submitter, 2))

  // withdrawn by its submitter
  way = await handOver(stage, await begin(stories.lobsterShelter, who.thirdSubmitter, 20))
  withdrawManuscript(
    stage.db,
    who.thirdSubmitter,
    { manuscriptId: way.id, reason: 'We found a slip in the table and will hand it in again.' },
    way.at + 2 * day,
  )

  // stuck: the PDF is protected by a password
  await handOver(stage, await begin(stories.periwinkleShells, who.secondSubmitter, 1))

  // a draft, and one that is audited when the demonstration starts
  await begin(stories.barnacleSettlement, who.secondSubmitter, 1)
  await handOver(stage, await begin(stories.sandEelBurrowing, who.submitter, 0.02), { audited: false })
}
