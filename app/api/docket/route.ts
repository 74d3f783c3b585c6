import { listDocket } from '@/db/queries/docket'
import { docketFilter } from '@/lib/rules/docket'
import { parse, readQuery } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

export const GET = route(({ request, db, actor, now }) =>
  listDocket(db, actor, parse(docketFilter, readQuery(request)), now),
)
