'use client'

import { parseAsInteger, useQueryState } from 'nuqs'
import { Pager } from './pager'

type UrlPagerProps = { page: number; pageSize: number; total: number; things: string }

/** A Pager whose page stands in the address as `page`; the server draws the next one. */
export function UrlPager(props: UrlPagerProps) {
  const [, setPage] = useQueryState(
    'page',
    parseAsInteger.withDefault(1).withOptions({ history: 'push', shallow: false, scroll: true }),
  )
  return <Pager {...props} onPage={(page) => void setPage(page)} />
}
