import { and, asc, desc, eq, sql } from 'drizzle-orm'
import { z } from 'zod'
import type { Reader } from '@/db/client'
import { audits, claims, families, findings, reports, rounds, statistics } from '@/db/schema'
import type { Audit, Box, Place } from '@/lib/checks/types'
import { PROCEDURES, SOURCES, type Source } from '@/lib/checks/vocabulary'
import { may } from '@/lib/rules/permissions'
import type { Actor } from '@/lib/rules/roles'
import { seesSubmitter } from '@/lib/rules/sight'
import { getRulesOf } from './rules-in-force'
import { findViewing, hideFileName } from './viewing'

export type KeptAudit = { auditId: string; round: number; finishedAt: number; audit: Audit }

/**
 * The newest finished audit of a round (the current one unless told), as the engine gave it. The submitter gets
 * it where the house rules of that round say so.
 */
export function getAudit(db: Reader, actor: Actor, manuscriptId: string, round?: number): KeptAudit | null {
  const viewing = findViewing(db, actor, manuscriptId)
  if (!viewing) return null
  const { manuscript, standing, sight, blinding } = viewing
  const row = db
    .select({
      auditId: audits.id,
      round: rounds.number,
      houseRulesVersion: rounds.houseRulesVersion,
      finishedAt: audits.finishedAt,
    })
    .from(audits)
    .innerJoin(rounds, eq(rounds.id, audits.roundId))
    .where(
      and(
        eq(rounds.manuscriptId, manuscriptId),
        eq(rounds.number, round ?? manuscript.currentRound),
        eq(audits.status, 'done'),
      ),
    )
    .orderBy(desc(audits.queuedAt), desc(sql`${audits}.rowid`))
    .limit(1)
    .get()
  if (!row) return null
  const shown =
    may(actor, 'audit.read', standing) ||
    (may(actor, 'audit.read-as-submitter', standing) &&
      getRulesOf(db, row.houseRulesVersion).submitterSeesAudit)
  if (!shown) return null
  const audit = readAudit(db, row.auditId)
  if (audit.table && !seesSubmitter(sight, blinding)) {
    audit.table.file = hideFileName('table', audit.table.file)
  }
  return { auditId: row.auditId, round: row.round, finishedAt: row.finishedAt ?? 0, audit }
}

const numbers = z.array(z.number())
const strings = z.array(z.string())
const ends = z.tuple([z.number(), z.number()])
const boxes = z.array(z.tuple([z.number(), z.number(), z.number(), z.number()]))
const placeSchema = z.object({
  source: z.enum(SOURCES),
  page: z.number().nullable(),
  row: z.number().nullable(),
  sheet: z.string().nullable(),
  quote: z.string(),
  boxes,
})
const decisionsSchema = z.array(
  z.object({
    report: z.string(),
    called: z.boolean().nullable(),
    adjusted: ends,
    significant: z.boolean().nullable(),
    survivesUpTo: z.number().nullable(),
  }),
)
const fitsSchema = z.array(z.object({ procedure: z.enum([...PROCEDURES, 'raw']), m: z.number() }))

const workingSchema = z
  .object({
    procedure: z.enum([...PROCEDURES, 'raw', 'any']),
    alpha: z.number(),
    groups: z.number(),
    sizes: numbers,
    parts: numbers,
    undone: z.object({ procedure: z.enum(PROCEDURES).nullable(), m: z.number() }),
    trusted: z.boolean(),
    fitsUpTo: z.number(),
    tests: z.array(
      z.object({
        statistics: strings,
        oneSided: z.boolean(),
        witnesses: z.array(z.object({ id: z.string(), is: z.enum(['raw', 'adjusted', 'open']) })),
        raw: ends.nullable(),
      }),
    ),
  })
  .nullable()

/** The rows put together again, without asking who wants to know. */
export function readAudit(db: Reader, auditId: string): Audit {
  const head = db.select().from(audits).where(eq(audits.id, auditId)).get()
  if (!head || head.status !== 'done') throw new Error(`audit ${auditId} is not finished`)
  return {
    engine: head.engine ?? '',
    document: { pages: head.pages ?? 0, sha256: head.documentSha256 ?? '', title: head.title },
    table:
      head.tableFile === null
        ? null
        : { file: head.tableFile, rows: head.tableRows ?? 0, sha256: head.tableSha256 ?? '' },
    alpha: { value: head.alpha ?? 0.05, quote: head.alphaQuote, page: head.alphaPage },
    reports: readReports(db, auditId),
    statistics: readStatistics(db, auditId),
    claims: readClaims(db, auditId),
    families: readFamilies(db, auditId),
    findings: readFindings(db, auditId),
  }
}

type PlaceColumns = {
  source: Source
  page: number | null
  row: number | null
  sheet: string | null
  quote: string
  boxes: unknown
}

function toPlace(row: PlaceColumns): Place {
  const { source, page, quote, sheet } = row
  return { source, page, row: row.row, sheet, quote, boxes: boxes.parse(row.boxes) satisfies Box[] }
}

function readReports(db: Reader, auditId: string): Audit['reports'] {
  const rows = db
    .select()
    .from(reports)
    .where(eq(reports.auditId, auditId))
    .orderBy(asc(reports.position))
    .all()
  return rows.map((row) => ({
    id: row.key,
    place: toPlace(row),
    relation: row.relation,
    value: row.value,
    decimals: row.decimals,
    low: row.low,
    high: row.high,
    scale: row.scale,
    statistic: row.statistic,
    comparison:
      row.comparisonA === null || row.comparisonB === null ? null : [row.comparisonA, row.comparisonB],
    called: row.called,
    family: row.family,
  }))
}

function readStatistics(db: Reader, auditId: string): Audit['statistics'] {
  const rows = db
    .select()
    .from(statistics)
    .where(eq(statistics.auditId, auditId))
    .orderBy(asc(statistics.position))
    .all()
  return rows.map((row) => ({
    id: row.key,
    place: toPlace(row),
    test: row.test,
    df: numbers.parse(row.df),
    value: row.value,
    decimals: row.decimals,
    pLow: row.pLow,
    pHigh: row.pHigh,
    report: row.report,
  }))
}

function readClaims(db: Reader, auditId: string): Audit['claims'] {
  const rows = db.select().from(claims).where(eq(claims.auditId, auditId)).orderBy(asc(claims.position)).all()
  return rows.map((row) => ({
    id: row.key,
    place: toPlace(row),
    procedure: row.procedure,
    m: row.m,
    alpha: row.alpha,
    threshold: row.threshold,
    groups: row.groups,
  }))
}

function readFamilies(db: Reader, auditId: string): Audit['families'] {
  const rows = db
    .select()
    .from(families)
    .where(eq(families.auditId, auditId))
    .orderBy(asc(families.position))
    .all()
  return rows.map((row) => ({
    id: row.key,
    label: row.label,
    members: strings.parse(row.members),
    claim: row.claim,
    groups: row.groups,
    m: { printed: row.mPrinted, claimed: row.mClaimed, due: row.mDue, why: row.mWhy },
    outcome: row.outcome,
    why: row.why,
    decisions: decisionsSchema.parse(row.decisions),
    fits: fitsSchema.parse(row.fits),
    working: workingSchema.parse(row.working),
  }))
}

function readFindings(db: Reader, auditId: string): Audit['findings'] {
  const rows = db
    .select()
    .from(findings)
    .where(eq(findings.auditId, auditId))
    .orderBy(asc(findings.position))
    .all()
  return rows.map((row) => ({
    id: row.key,
    rule: row.rule,
    severity: row.severity,
    family: row.family,
    reports: strings.parse(row.reports),
    place: row.place === null ? null : placeSchema.parse(row.place),
    says: row.says,
    asks: row.asks,
    cites: strings.parse(row.cites),
  }))
}
