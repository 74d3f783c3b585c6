'use client'

import type { PDFDocumentProxy, PDFPageProxy, PageViewport } from 'pdfjs-dist'
import { useEffect, useMemo, useRef, useState } from 'react'
import type { MarkedPlace, Target } from './audit-index'
import { PageMarks } from './page-marks'

type PdfPageProps = {
  document: PDFDocumentProxy
  number: number
  scale: number
  /** Size of the first page, until this one's own is known. */
  guess: { width: number; height: number }
  marks: readonly MarkedPlace[]
  chosen: Target | null
  onChoose: (target: Target) => void
  onChosenDrawn: (element: HTMLElement) => void
}

/** The browser refuses larger canvases; beyond this a page is drawn coarser and stretched. */
const MOST_PIXELS = 2 ** 24

/** One page: its picture, its selectable text and its marks. Drawn when it comes near, dropped when it goes. */
export function PdfPage(props: PdfPageProps) {
  const { document: pdf, number, scale, guess } = props
  const [page, setPage] = useState<PDFPageProxy | null>(null)
  const [failed, setFailed] = useState(false)
  useEffect(() => {
    let gone = false
    pdf.getPage(number).then(
      (loaded) => !gone && setPage(loaded),
      () => !gone && setFailed(true),
    )
    return () => {
      gone = true
    }
  }, [pdf, number])
  const viewport = useMemo(() => page?.getViewport({ scale }) ?? null, [page, scale])
  const size = viewport ?? { width: guess.width * scale, height: guess.height * scale }
  return (
    <div
      className="relative mx-auto bg-white shadow-sheet"
      style={{
        colorScheme: 'light',
        width: size.width,
        height: size.height,
        ['--total-scale-factor' as string]: scale,
      }}
    >
      {page && viewport && <Drawn page={page} viewport={viewport} onFail={() => setFailed(true)} />}
      {viewport && (
        <PageMarks
          marks={props.marks}
          viewport={viewport}
          chosen={props.chosen}
          onChoose={props.onChoose}
          onChosenDrawn={props.onChosenDrawn}
        />
      )}
      {failed && (
        <p role="alert" className="absolute inset-x-4 top-8 bg-sheet p-3 text-sm">
          Page {number} cannot be drawn here. Its numbers are in the audit beside it; the file can be opened
          by itself.
        </p>
      )}
    </div>
  )
}

function Drawn(props: { page: PDFPageProxy; viewport: PageViewport; onFail: () => void }) {
  const { page, viewport, onFail } = props
  const canvas = useRef<HTMLCanvasElement>(null)
  const text = useRef<HTMLDivElement>(null)
  const fail = useRef(onFail)
  useEffect(() => {
    fail.current = onFail
  }, [onFail])
  useEffect(() => {
    const canvasNow = canvas.current
    const textNow = text.current
    if (!canvasNow || !textNow) return
    const task = drawPage(page, viewport, canvasNow)
    let gone = false
    const layer = drawText(page, viewport, textNow, () => gone)
    task.promise.catch((error: unknown) => {
      if (!gone && !isCancelled(error)) fail.current()
    })
    return () => {
      gone = true
      task.cancel()
      void layer.then((one) => one?.cancel())
    }
  }, [page, viewport])
  return (
    <>
      <canvas
        ref={canvas}
        className="absolute inset-0 size-full"
        role="img"
        aria-label={`Page ${page.pageNumber}`}
      />
      <div ref={text} className="pdf-text" />
    </>
  )
}

function drawPage(page: PDFPageProxy, viewport: PageViewport, canvas: HTMLCanvasElement) {
  const wanted = window.devicePixelRatio || 1
  const most = Math.sqrt(MOST_PIXELS / (viewport.width * viewport.height))
  const ratio = Math.min(wanted, most)
  canvas.width = Math.floor(viewport.width * ratio)
  canvas.height = Math.floor(viewport.height * ratio)
  return page.render({ canvas, viewport, transform: ratio === 1 ? undefined : [ratio, 0, 0, ratio, 0, 0] })
}

async function drawText(
  page: PDFPageProxy,
  viewport: PageViewport,
  container: HTMLDivElement,
  isGone: () => boolean,
) {
  const { TextLayer } = await import('pdfjs-dist')
  if (isGone()) return null
  container.replaceChildren()
  const layer = new TextLayer({ textContentSource: page.streamTextContent(), container, viewport })
  // Without the text layer the page can still be read; selecting text is all that is lost.
  layer.render().then(hideMeasuringCanvas, () => undefined)
  return layer
}

/** The reader measures letters on a canvas of no size, which it leaves outside every landmark. */
function hideMeasuringCanvas() {
  for (const canvas of document.querySelectorAll('.hiddenCanvasElement'))
    canvas.setAttribute('aria-hidden', 'true')
}

function isCancelled(error: unknown): boolean {
  return error instanceof Error && error.name === 'RenderingCancelledException'
}
