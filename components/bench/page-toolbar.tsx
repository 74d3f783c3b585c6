import { ExternalLink, Minus, MoveHorizontal, Plus } from 'lucide-react'
import { IconButton } from '../ui/icon-button'

/** Which page is in sight, how large it is, and the file by itself. */
export function PageToolbar(props: {
  page: number
  pages: number
  percent: number
  url: string
  onPage: (page: number) => void
  onZoom: (direction: 1 | -1) => void
  onFit: () => void
}) {
  return (
    <div
      role="toolbar"
      aria-label="Pages"
      className="flex h-11 shrink-0 items-center gap-1 border-b border-rule bg-paper px-2 print:hidden"
    >
      <PageNumber key={props.page} page={props.page} pages={props.pages} onPage={props.onPage} />
      <span className="tabular mr-auto text-ink-soft">of {props.pages}</span>
      <IconButton label="Smaller" onClick={() => props.onZoom(-1)}>
        <Minus />
      </IconButton>
      <span className="tabular w-11 text-center text-ink-soft">{props.percent} %</span>
      <IconButton label="Larger" onClick={() => props.onZoom(1)}>
        <Plus />
      </IconButton>
      <IconButton label="Fit the width" onClick={props.onFit}>
        <MoveHorizontal />
      </IconButton>
      <a
        href={props.url}
        target="_blank"
        rel="noreferrer"
        aria-label="Open the file by itself"
        title="Open the file by itself"
        className="inline-flex size-8 items-center justify-center text-ink-soft hover:text-tide"
      >
        <ExternalLink className="size-4" />
      </a>
    </div>
  )
}

function PageNumber({
  page,
  pages,
  onPage,
}: {
  page: number
  pages: number
  onPage: (page: number) => void
}) {
  return (
    <label className="flex items-center gap-1.5 pl-1 text-ink-soft">
      Page
      <input
        defaultValue={page}
        inputMode="numeric"
        className="tabular h-7 w-12 rounded-sm border border-edge bg-sheet px-1.5 text-right text-ink"
        onKeyDown={(event) => {
          if (event.key !== 'Enter') return
          const wanted = Number(event.currentTarget.value)
          if (Number.isInteger(wanted) && wanted >= 1 && wanted <= pages) onPage(wanted)
          else event.currentTarget.value = String(page)
        }}
        onBlur={(event) => {
          event.currentTarget.value = String(page)
        }}
      />
    </label>
  )
}
