import { Button } from './button'

type PagerProps = {
  /** From 1. */
  page: number
  pageSize: number
  total: number
  /** What is counted, in the plural: "manuscripts". */
  things: string
  onPage: (page: number) => void
}

/** "26–50 of 131 manuscripts" and the way to the pages before and after. */
export function Pager({ page, pageSize, total, things, onPage }: PagerProps) {
  const pages = Math.max(1, Math.ceil(total / pageSize))
  const first = total === 0 ? 0 : (page - 1) * pageSize + 1
  const last = Math.min(total, page * pageSize)
  return (
    <nav aria-label="Pages" className="tabular flex flex-wrap items-center justify-between gap-3 py-3">
      <p className="text-ink-soft" aria-live="polite">
        {total === 0 ? `No ${things}` : `${first}–${last} of ${total} ${things}`}
      </p>
      {pages > 1 ? (
        <div className="flex gap-2">
          <Button size="small" disabled={page <= 1} onClick={() => onPage(page - 1)}>
            Previous
          </Button>
          <Button size="small" disabled={page >= pages} onClick={() => onPage(page + 1)}>
            Next
          </Button>
        </div>
      ) : null}
    </nav>
  )
}
