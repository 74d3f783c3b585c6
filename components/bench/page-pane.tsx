'use client'

import { useVirtualizer } from '@tanstack/react-virtual'
import type { PDFDocumentProxy } from 'pdfjs-dist'
import { useCallback, useEffect, useRef, useState } from 'react'
import { Button, ButtonLink } from '../ui/button'
import { LoadingSteps } from '../ui/mark'
import { Notice } from '../ui/notice'
import { placeOf, type AuditIndex, type MarkedPlace, type Target } from './audit-index'
import { bringIntoSight } from './page-marks'
import { PdfPage } from './pdf-page'
import { placeWords } from './place-link'
import { PageToolbar } from './page-toolbar'
import { RowView } from './row-view'
import { usePdfDocument } from './use-pdf-document'
import './page-pane.css'

type PagePaneProps = {
  url: string
  /** The pages are a copy of a Word document. */
  isCopy: boolean
  index: AuditIndex
  chosen: Target | null
  /** Grows with each wish to be shown the chosen place, so that asking twice scrolls twice. */
  asked: number
  onChoose: (target: Target) => void
}

/** The manuscript's pages with their marks. */
export function PagePane(props: PagePaneProps) {
  const opened = usePdfDocument(props.url)
  if (opened.status === 'failed') {
    return (
      <div className="p-4">
        <Notice
          tone="trouble"
          title="The pages are not here"
          action={
            <span className="flex gap-2">
              <Button onClick={opened.again}>Try again</Button>
              <ButtonLink href={props.url} target="_blank" prefetch={false}>
                Open the file
              </ButtonLink>
            </span>
          }
        >
          {opened.message}
        </Notice>
      </div>
    )
  }
  if (opened.status === 'loading') return <LoadingSteps label="Opening the manuscript" />
  return <Pages {...props} pdf={opened.document} first={opened} />
}

const ZOOM_STEPS = [0.5, 0.67, 0.8, 1, 1.25, 1.5, 2, 3]
const GAP = 16

function Pages(props: PagePaneProps & { pdf: PDFDocumentProxy; first: { width: number; height: number } }) {
  const { pdf, first, index, chosen, asked, url } = props
  const scroller = useRef<HTMLDivElement>(null)
  const paneWidth = useWidth(scroller)
  const [zoom, setZoom] = useState<number | null>(null)
  const fit = Math.max(0.3, (paneWidth - 2 * GAP) / first.width)
  const scale = zoom ?? fit
  // eslint-disable-next-line react-hooks/incompatible-library -- the virtualizer is used in this component alone
  const rows = useVirtualizer({
    count: pdf.numPages,
    getScrollElement: () => scroller.current,
    estimateSize: () => first.height * scale + GAP,
    overscan: 1,
    paddingStart: GAP,
    scrollPaddingStart: GAP,
  })
  useEffect(() => {
    rows.measure()
  }, [rows, scale])
  const place = chosen ? placeOf(index, chosen) : null
  const page = place?.page ?? null
  useEffect(() => {
    if (page !== null && asked > 0) rows.scrollToIndex(page - 1, { align: 'auto' })
  }, [rows, page, asked])
  // Scrolls to a chosen mark once a wish: a page that is drawn again while someone scrolls must not pull them back.
  const wish = chosen ? `${asked} ${chosen.kind} ${chosen.id}` : ''
  const granted = useRef('')
  const grant = useCallback(
    (element: HTMLElement) => {
      if (granted.current === wish) return
      granted.current = wish
      bringIntoSight(element)
    },
    [wish],
  )
  const items = rows.getVirtualItems()
  const current = pageInSight(items, rows.scrollOffset ?? 0, scroller.current?.clientHeight ?? 0)
  return (
    <div className="flex h-full flex-col">
      <PageToolbar
        page={current}
        pages={pdf.numPages}
        percent={Math.round(scale * 100)}
        onPage={(number) => rows.scrollToIndex(number - 1, { align: 'start' })}
        onZoom={(direction) => setZoom(nextZoom(scale, direction))}
        onFit={() => setZoom(null)}
        url={url}
      />
      {props.isCopy && (
        <p className="shrink-0 border-b border-rule bg-paper px-3 py-1 text-xs text-ink-soft print:hidden">
          A copy in pages of the Word document that was handed in; pictures are left out.
        </p>
      )}
      {place && place.page === null && place.row !== null && (
        <div role="status" className="shrink-0 border-b border-rule bg-sheet px-3 py-2">
          <p className="text-ink-soft">This stands in the results table, not on a page:</p>
          <RowView place={place} words={placeWords(place)} />
        </div>
      )}
      <div
        ref={scroller}
        data-page-scroller=""
        className="min-h-0 flex-1 overflow-auto bg-sunken"
        role="region"
        aria-label="Pages of the manuscript"
        tabIndex={0}
      >
        {paneWidth > 0 && (
          <div
            className="relative"
            style={{ height: rows.getTotalSize(), minWidth: first.width * scale + 2 * GAP }}
          >
            {items.map((row) => (
              <div
                key={row.key}
                ref={rows.measureElement}
                data-index={row.index}
                className="absolute inset-x-0 pb-4"
                style={{ transform: `translateY(${row.start}px)` }}
              >
                <PdfPage
                  document={pdf}
                  number={row.index + 1}
                  scale={scale}
                  guess={first}
                  marks={marksWithChosen(index, row.index + 1, chosen)}
                  chosen={chosen}
                  onChoose={props.onChoose}
                  onChosenDrawn={grant}
                />
              </div>
            ))}
          </div>
        )}
      </div>
    </div>
  )
}

/** The page's marks, and the chosen place as well where it is none of them: a finding, a statistic, a family. */
function marksWithChosen(index: AuditIndex, page: number, chosen: Target | null): readonly MarkedPlace[] {
  const marks = index.marks.get(page) ?? []
  if (!chosen || chosen.kind === 'report' || chosen.kind === 'claim') return marks
  const place = placeOf(index, chosen)
  if (!place || place.page !== page || place.boxes.length === 0) return marks
  return [...marks, { target: chosen, page, boxes: place.boxes, outcome: null, label: place.quote }]
}

function pageInSight(
  items: readonly { index: number; start: number; end: number }[],
  top: number,
  height: number,
) {
  const middle = top + height / 2
  return (items.find((item) => item.end >= middle)?.index ?? 0) + 1
}

function nextZoom(scale: number, direction: 1 | -1): number {
  const steps = direction === 1 ? ZOOM_STEPS : [...ZOOM_STEPS].reverse()
  return steps.find((step) => (step - scale) * direction > 0.01) ?? scale
}

function useWidth(element: React.RefObject<HTMLElement | null>): number {
  const [width, setWidth] = useState(0)
  useEffect(() => {
    const watched = element.current
    if (!watched) return
    const watcher = new ResizeObserver(() => setWidth(watched.clientWidth))
    watcher.observe(watched)
    return () => watcher.disconnect()
  }, [element])
  return width
}
