import { getDocketFacets } from '@/db/queries/docket'
import { docketFilter } from '@/lib/rules/docket'
import { parse, readQuery } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

export const GET = route(({ request, db, actor, now }) =>
  getDocketFacets(db, actor, parse(docketFilter.pick({ as: true }), readQuery(request)), now),
)
