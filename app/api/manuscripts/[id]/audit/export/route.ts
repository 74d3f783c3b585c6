import { z } from 'zod'
import { getAudit } from '@/db/queries/audit'
import { getManuscript } from '@/db/queries/manuscript'
import { writeAuditCsv } from '@/lib/letters/write-audit-csv'
import { describeDisposition } from '@/lib/web/file-response'
import { getRound, parse } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

export const GET = route<{ id: string }>(({ request, db, actor, params, now }) => {
  const format = parse(z.enum(['json', 'csv']), new URL(request.url).searchParams.get('format') ?? 'json')
  const kept = getAudit(db, actor, params.id, getRound(request))
  const manuscript = getManuscript(db, actor, params.id)
  if (!kept || !manuscript) return null
  const day = new Date(now).toISOString().slice(0, 10)
  const name = `audit-${manuscript.reference ?? 'draft'}-round-${kept.round}-${day}.${format}`
  const body = format === 'json' ? `${JSON.stringify(kept.audit, null, 1)}\n` : writeAuditCsv(kept.audit)
  return new Response(body, {
    headers: {
      'Content-Type': format === 'json' ? 'application/json' : 'text/csv; charset=utf-8',
      'Content-Disposition': describeDisposition('attachment', name),
      'X-Content-Type-Options': 'nosniff',
      'Cache-Control': 'private, no-store',
    },
  })
})
