import { and, desc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { newId } from '@/db/ids'
import {
  audits,
  files,
  houseRulesVersions,
  manuscripts,
  people,
  personRoles,
  points,
  rounds,
} from '@/db/schema'
import { addFile } from '@/lib/desk/add-file'
import { answerAssignment } from '@/lib/desk/answer-assignment'
import { changeDraft } from '@/lib/desk/change-draft'
import { closeManuscript } from '@/lib/desk/close-manuscript'
import { createDraft } from '@/lib/desk/create-draft'
import { decidePoint } from '@/lib/desk/decide-point'
import { draftVerdict } from '@/lib/desk/draft-verdict'
import { handIn } from '@/lib/desk/hand-in'
import { keepAudit } from '@/lib/desk/keep-audit'
import { offerAssignment } from '@/lib/desk/offer-assignment'
import { releaseVerdict } from '@/lib/desk/release-verdict'
import { stopAudit } from '@/lib/desk/stop-audit'
import { withdrawManuscript } from '@/lib/desk/withdraw-manuscript'
import { defaultFullHouseRules, type FullHouseRules } from '@/lib/rules/house-rules'
import { systemActor, type Actor, type Role } from '@/lib/rules/roles'
import type { State } from '@/lib/rules/states'
import { makeDb } from './db'
import { makeSmallAudit } from './small-audit'

/** 2 March 2026, 09:00 UTC. */
export const morning = Date.UTC(2026, 2, 2, 9)
export const day = 24 * 3_600_000

export type World = {
  db: Db
  submitter: Actor
  reviewer: Actor
  editor: Actor
  administrator: Actor
  /** A minute later each time. */
  now: () => number
}

/** A desk with one person of each role; `rules` is what the house decided otherwise than by default. */
export function makeWorld(rules: Partial<FullHouseRules> = {}): World {
  const db = makeDb()
  let time = morning
  db.insert(houseRulesVersions)
    .values({ body: { ...defaultFullHouseRules, ...rules }, createdAt: time })
    .run()
  return {
    db,
    submitter: makePerson(db, ['submitter'], 'Isla Inglis'),
    reviewer: makePerson(db, ['reviewer'], 'Rurik Tane'),
    editor: makePerson(db, ['editor'], 'Edda Moss'),
    administrator: makePerson(db, ['administrator'], 'Alva Quist'),
    now: () => (time += 60_000),
  }
}

export function makePerson(db: Db, roles: Role[], name: string): Actor {
  const id = newId('person')
  const email = `${name.toLowerCase().replaceAll(' ', '.')}@ternharbour.example`
  const affiliation = `Institute of ${name}`
  db.insert(people).values({ id, email, name, affiliation, status: 'active', createdAt: morning }).run()
  for (const role of roles) db.insert(personRoles).values({ personId: id, role }).run()
  return { kind: 'person', id, name, email, roles, sessionId: null }
}

/** A draft with everything that handing it in asks for. */
export function makeDraft(
  { db, submitter, now }: World,
  by: Actor = submitter,
  title = 'Kelp holdfasts under tow',
) {
  const { manuscriptId } = createDraft(db, by, { title }, now())
  changeDraft(
    db,
    by,
    {
      manuscriptId,
      correspondingAuthor: 'Corin Inglis',
      correspondingEmail: 'corin.inglis@kelpbay.example',
      correction: 'Bonferroni over three tests',
    },
    now(),
  )
  addManuscriptFile({ db, now }, by, manuscriptId)
  return manuscriptId
}

export function addManuscriptFile({ db, now }: Pick<World, 'db' | 'now'>, by: Actor, manuscriptId: string) {
  return addFile(
    db,
    by,
    {
      manuscriptId,
      kind: 'manuscript',
      name: 'Inglis kelp v7.pdf',
      mediaType: 'application/pdf',
      sha256: 'c'.repeat(64),
      bytes: 123_456,
    },
    now(),
  ).fileId
}

/** A results table in the newest round, as a row: of a round that is handed in it could not be added any more. */
export function addTableRow(db: Db, manuscriptId: string): string {
  const round = db
    .select({ id: rounds.id, openedAt: rounds.openedAt })
    .from(rounds)
    .where(eq(rounds.manuscriptId, manuscriptId))
    .orderBy(desc(rounds.number))
    .get()
  const row = db
    .select({ by: manuscripts.submitterId })
    .from(manuscripts)
    .where(eq(manuscripts.id, manuscriptId))
  const id = newId('file')
  db.insert(files)
    .values({
      id,
      roundId: round?.id ?? '',
      kind: 'table',
      name: 'Inglis results.csv',
      mediaType: 'text/csv',
      sha256: 'e'.repeat(64),
      bytes: 456,
      uploadedBy: row.get()?.by ?? '',
      createdAt: round?.openedAt ?? morning,
    })
    .run()
  return id
}

const way: readonly State[] = [
  'draft',
  'received',
  'ready',
  'assigned',
  'in review',
  'verdict drafted',
  'returned',
  'closed',
]

/** A manuscript brought to a state by the commands that lead there. */
export function makeManuscript(
  world: World,
  state: State,
  by: Actor = world.submitter,
  title?: string,
): string {
  const { db, reviewer, editor, now } = world
  const manuscriptId = makeDraft(world, by, title)
  const goal = state === 'stuck' || state === 'withdrawn' ? 'received' : state
  const steps: Partial<Record<State, () => void>> = {
    received: () => void handIn(db, by, { manuscriptId }, now()),
    ready: () => finishAudit(world, manuscriptId),
    assigned: () =>
      void offerAssignment(db, editor, { manuscriptIds: [manuscriptId], reviewerId: reviewer.id }, now()),
    'in review': () =>
      void answerAssignment(db, reviewer, { manuscriptId, accept: true, reason: '', conflict: false }, now()),
    'verdict drafted': () => writeVerdict(world, manuscriptId),
    returned: () => void releaseVerdict(db, editor, { manuscriptId }, now()),
    closed: () => void closeManuscript(db, editor, { manuscriptId }, now()),
  }
  for (const step of way.slice(0, way.indexOf(goal) + 1)) steps[step]?.()
  if (state === 'stuck') {
    const auditId = getNewestAudit(db, manuscriptId)
    stopAudit(db, systemActor, { auditId, trouble: 'Inglis kelp v7.pdf is encrypted.' }, now())
  }
  if (state === 'withdrawn') withdrawManuscript(db, by, { manuscriptId, reason: '' }, now())
  return manuscriptId
}

export function finishAudit({ db, now }: World, manuscriptId: string, audit = makeSmallAudit()): void {
  keepAudit(db, systemActor, { auditId: getNewestAudit(db, manuscriptId), audit }, now())
}

export function writeVerdict({ db, reviewer, now }: World, manuscriptId: string): void {
  for (const pointId of listPointIds(db, manuscriptId).slice(0, 2)) {
    decidePoint(db, reviewer, { pointId, status: 'kept' }, now())
  }
  draftVerdict(
    db,
    reviewer,
    {
      manuscriptId,
      verdict: 'sound after changes',
      remark: 'Between us: a careful paper.',
      effortMinutes: 90,
      body: 'Dear authors,\n\nplease see **point 1**.',
    },
    now(),
  )
}

export function getNewestAudit(db: Db, manuscriptId: string): string {
  const row = db
    .select({ id: audits.id })
    .from(audits)
    .innerJoin(rounds, eq(rounds.id, audits.roundId))
    .where(eq(rounds.manuscriptId, manuscriptId))
    .orderBy(desc(audits.queuedAt))
    .get()
  if (!row) throw new Error('no audit')
  return row.id
}

export function getRoundId(db: Db, manuscriptId: string, number = 1): string {
  const row = db
    .select({ id: rounds.id })
    .from(rounds)
    .where(and(eq(rounds.manuscriptId, manuscriptId), eq(rounds.number, number)))
    .get()
  if (!row) throw new Error('no round')
  return row.id
}

export function listPointIds(db: Db, manuscriptId: string, number = 1): string[] {
  return db
    .select({ id: points.id })
    .from(points)
    .where(eq(points.roundId, getRoundId(db, manuscriptId, number)))
    .orderBy(points.position)
    .all()
    .map(({ id }) => id)
}

/** Everything the database holds, for "nothing was left behind". */
export function dump(db: Db): string {
  const tables = db.$client
    .prepare<[], { name: string }>(`select name from sqlite_master where type = 'table' order by name`)
    .all()
  return JSON.stringify(
    tables
      .filter(({ name }) => !name.startsWith('sqlite_'))
      .map(({ name }) => [name, db.$client.prepare(`select * from "${name}"`).all()]),
  )
}

/** Runs `work` and takes back whatever it wrote. */
export function rehearse<T>(db: Db, work: () => T): T {
  db.$client.exec('savepoint rehearsal')
  try {
    return work()
  } finally {
    db.$client.exec('rollback to rehearsal; release rehearsal')
  }
}
