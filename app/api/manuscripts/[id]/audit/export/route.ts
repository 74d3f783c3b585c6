import { z } from 'zod'
import { getAudit } from '@/db/queries/audit'
import { getManuscript } from '@/db/queries/manuscript'
import { writeAuditScript, writeFamilyScript } from '@/lib/checks/r-script/audit-script'
import type { Audit } from '@/lib/checks/types'
import { writeAuditCsv } from '@/lib/letters/write-audit-csv'
import { describeDisposition } from '@/lib/web/file-response'
import { getRound, parse, readQuery } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

const FORMATS = {
  json: {
    type: 'application/json',
    ending: 'json',
    write: (audit: Audit) => `${JSON.stringify(audit, null, 1)}\n`,
  },
  csv: { type: 'text/csv; charset=utf-8', ending: 'csv', write: writeAuditCsv },
  r: { type: 'text/plain; charset=utf-8', ending: 'R', write: writeAuditScript },
} as const

// a family is given as R alone
const asked = z
  .object({ format: z.enum(['json', 'csv', 'r']).default('json'), family: z.string().optional() })
  .refine(({ format, family }) => family === undefined || format === 'r', {
    path: ['family'],
    error: 'A family can be had as an R script only.',
  })

/** The audit as JSON, CSV or R script; `family` asks for the R script of that one alone. */
export const GET = route<{ id: string }>(({ request, db, actor, params, now }) => {
  const { format, family } = parse(asked, readQuery(request))
  const kept = getAudit(db, actor, params.id, getRound(request))
  const manuscript = getManuscript(db, actor, params.id)
  if (!kept || !manuscript) return null
  const { audit } = kept
  if (family !== undefined && !audit.families.some(({ id }) => id === family)) return null
  const { type, ending, write } = FORMATS[format]
  const day = new Date(now).toISOString().slice(0, 10)
  const name = ['audit', manuscript.reference ?? 'draft', `round-${kept.round}`, family, day]
    .filter(Boolean)
    .join('-')
  return new Response(family === undefined ? write(audit) : writeFamilyScript(audit, family), {
    headers: {
      'Content-Type': type,
      'Content-Disposition': describeDisposition('attachment', `${name}.${ending}`),
      'X-Content-Type-Options': 'nosniff',
      'Cache-Control': 'private, no-store',
    },
  })
})
