import { createCanvas } from '@napi-rs/canvas'
import type { PDFPageProxy } from 'pdfjs-dist'
import { median } from 'simple-statistics'
import type { TextRun } from '@/lib/checks/types'
import { openRecogniser, type Recogniser, type SeenWord } from './recogniser'
import { toRuns } from './to-runs'

/** Dots an inch at which a page is drawn: digits of 8 points need as many. */
const resolution = 300
/** The largest picture that is drawn, in dots: about that of an A3 page. */
const mostDots = 18_000_000

export type RecognitionLimits = { pages: number; milliseconds: number }

export type PageRecogniser = {
  /** The text of a page that is a picture; null where the limits are used up or nothing was recognised. */
  recognise: (page: PDFPageProxy) => Promise<TextRun[] | null>
  close: () => void
}

/** Recognises pages one by one; the recogniser is loaded when the first page asks for it. */
export function makePageRecogniser(limits: RecognitionLimits, onPage: () => void): PageRecogniser {
  let opened: Recogniser | null = null
  let pages = 0
  let spent = 0
  return {
    async recognise(page) {
      if (pages >= limits.pages || spent >= limits.milliseconds) return null
      onPage()
      pages++
      const started = performance.now()
      opened ??= await openRecogniser()
      const runs = await readPage(page, opened)
      spent += performance.now() - started
      return runs.length > 0 ? runs : null
    },
    close: () => opened?.close(),
  }
}

async function readPage(page: PDFPageProxy, recogniser: Recogniser): Promise<TextRun[]> {
  // Drawn as the page lies in the file: places are told in its own coordinates, and a scanner's turn is undone below.
  const unit = page.getViewport({ scale: 1 })
  const scale = Math.min(resolution / 72, Math.sqrt(mostDots / Math.max(1, unit.width * unit.height)))
  const viewport = page.getViewport({ scale })
  const [width, height] = [Math.max(1, Math.ceil(viewport.width)), Math.max(1, Math.ceil(viewport.height))]
  const canvas = createCanvas(width, height)
  const context = canvas.getContext('2d')
  context.fillStyle = 'white'
  context.fillRect(0, 0, width, height)
  await page.render({
    // The same drawing interface as the browser's, by another maker.
    canvas: canvas as unknown as HTMLCanvasElement,
    canvasContext: context as unknown as CanvasRenderingContext2D,
    viewport,
  }).promise
  const grey = toGrey(context.getImageData(0, 0, width, height).data, width * height)
  if (isBlank(grey)) return []
  const words = recogniser.recognise(grey, width, height, Math.round(72 * scale))
  if (!isText(words)) return []
  return toRuns(words, 1 / scale, unit.height).map((run) => turnBack(run, page))
}

/** A photograph or a drawing gives a few words that the recogniser does not trust itself. */
function isText(words: readonly SeenWord[]): boolean {
  return words.length >= 3 && median(words.map((word) => word.confidence)) >= 55
}

function toGrey(colours: Uint8ClampedArray, dots: number): Uint8Array {
  const grey = new Uint8Array(dots)
  for (let i = 0; i < dots; i++) {
    const at = 4 * i
    // Weights of the colours in perceived brightness (ITU-R BT.601), in 256ths.
    grey[i] = ((colours[at] ?? 0) * 77 + (colours[at + 1] ?? 0) * 151 + (colours[at + 2] ?? 0) * 28) >> 8
  }
  return grey
}

/** Less than one dot in ten thousand differs from the paper. */
function isBlank(grey: Uint8Array): boolean {
  let dark = 0
  for (const dot of grey) if (dot < 160) dark++
  return dark < grey.length / 10_000
}

/** From the page as it is shown to the page as it lies in the file, where its rotation is not applied. */
function turnBack(run: TextRun, page: PDFPageProxy): TextRun {
  const [x0 = 0, y0 = 0, x1 = 0, y1 = 0] = page.view
  const [width, height] = [x1 - x0, y1 - y0]
  const { x, y } = run
  if (page.rotate === 90) return { ...run, x: x0 + width - y, y: y0 + x, angle: 90 }
  if (page.rotate === 180) return { ...run, x: x0 + width - x, y: y0 + height - y, angle: 180 }
  if (page.rotate === 270) return { ...run, x: x0 + y, y: y0 + height - x, angle: 270 }
  return { ...run, x: x0 + x, y: y0 + y }
}
