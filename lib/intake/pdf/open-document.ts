import { createHash } from 'node:crypto'
import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'
import type { PDFDocumentProxy, PDFPageProxy } from 'pdfjs-dist'
import { getDocument, OPS, VerbosityLevel } from 'pdfjs-dist/legacy/build/pdf.mjs'
import type { ReadDocument, ReadFont, ReadPage, TextRun } from '@/lib/checks/types'
import { makePageRecogniser, type PageRecogniser, type RecognitionLimits } from '../recognise/recognise-pages'
import { recognisedFont } from '../recognise/to-runs'

const assets = dirname(createRequire(import.meta.url).resolve('pdfjs-dist/package.json'))

export type Reading = {
  maxPages: number
  recognition: RecognitionLimits
  onPage: (page: number, of: number) => void
  /** A page is a picture, and its text will be recognised, which takes seconds. */
  onRecognise: () => void
}

type PositionedItem = {
  str: string
  transform: number[]
  width: number
  height: number
  fontName: string
  hasEOL: boolean
}

/**
 * Reads every page's positioned text; that of a page which is a picture is recognised. Throws pdfjs's own errors (PasswordException, InvalidPDFException, …), a
 * TooManyPagesException for more than `maxPages` pages and a NoTextException where no page holds a letter or a digit.
 */
export async function readPages(bytes: Uint8Array, reading: Reading): Promise<ReadDocument> {
  const { maxPages, onPage } = reading
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  const loading = getDocument({
    data: bytes,
    cMapUrl: join(assets, 'cmaps/'),
    cMapPacked: true,
    standardFontDataUrl: join(assets, 'standard_fonts/'),
    wasmUrl: join(assets, 'wasm/'),
    isEvalSupported: false,
    disableFontFace: true,
    useSystemFonts: false,
    stopAtErrors: false,
    verbosity: VerbosityLevel.ERRORS,
  })
  const recogniser = makePageRecogniser(reading.recognition, reading.onRecognise)
  try {
    const pdf = await loading.promise
    if (pdf.numPages > maxPages) throw named('TooManyPagesException', `${pdf.numPages} pages`)
    const fonts: Record<string, ReadFont> = {}
    const pages: ReadPage[] = []
    for (let number = 1; number <= pdf.numPages; number++) {
      const page = await pdf.getPage(number)
      pages.push(await recognisePicture(page, await readPage(page, fonts), recogniser))
      page.cleanup()
      onPage(number, pdf.numPages)
    }
    if (!pages.some((page) => page.runs.some((run) => /[\p{L}\p{N}]/u.test(run.text))))
      throw named('NoTextException', 'no text on any page')
    if (pages.some((page) => page.recognised))
      fonts[recognisedFont] = { family: 'serif', ascent: 0.75, descent: -0.25, vertical: false }
    return { sha256, title: await getTitle(pdf), pages, fonts }
  } finally {
    recogniser.close()
    await loading.destroy()
  }
}

function named(name: string, message: string): Error {
  return Object.assign(new Error(message), { name })
}

/** Fewer letters and digits are a stamp on a scanned page: "Downloaded on 1 December". */
const stamp = 60

/** The page with its text recognised where it is a picture, else as it is. */
async function recognisePicture(
  page: PDFPageProxy,
  read: ReadPage,
  recogniser: PageRecogniser,
): Promise<ReadPage> {
  const characters = read.runs.reduce((sum, run) => sum + run.text.replace(/[^\p{L}\p{N}]/gu, '').length, 0)
  if (characters >= stamp || (characters > 0 && !(await showsPicture(page)))) return read
  const runs = await recogniser.recognise(page)
  return runs ? { ...read, runs, recognised: true } : read
}

async function showsPicture(page: PDFPageProxy): Promise<boolean> {
  const { fnArray } = await page.getOperatorList()
  return fnArray.some(
    (operator) => operator === OPS.paintImageXObject || operator === OPS.paintImageMaskXObject,
  )
}

async function readPage(page: PDFPageProxy, fonts: Record<string, ReadFont>): Promise<ReadPage> {
  const content = await page.getTextContent({ disableNormalization: true, includeMarkedContent: false })
  for (const [key, style] of Object.entries(content.styles)) {
    fonts[key] ??= {
      family: style.fontFamily,
      ascent: finite(style.ascent, 0.75),
      descent: finite(style.descent, -0.25),
      vertical: style.vertical,
    }
  }
  const runs: TextRun[] = []
  for (const item of content.items) {
    if (!('str' in item)) continue
    const run = toRun(item as PositionedItem)
    if (run) runs.push(run)
  }
  const [x0 = 0, y0 = 0, x1 = 0, y1 = 0] = page.view
  return { number: page.pageNumber, width: x1 - x0, height: y1 - y0, rotation: page.rotate, runs }
}

function toRun(item: PositionedItem): TextRun | null {
  const [a = 0, b = 0, c = 0, d = 0, x = 0, y = 0] = item.transform
  if (![a, b, c, d, x, y, item.width].every(Number.isFinite)) return null
  if (item.str === '' && !item.hasEOL) return null
  return {
    text: item.str,
    x,
    y,
    width: item.width,
    size: Math.hypot(c, d) || item.height,
    angle: (Math.atan2(b, a) * 180) / Math.PI,
    font: item.fontName,
    endsLine: item.hasEOL,
  }
}

async function getTitle(pdf: PDFDocumentProxy): Promise<string | null> {
  const { info } = await pdf.getMetadata()
  const title: unknown = 'Title' in info ? info.Title : null
  return typeof title === 'string' && title.trim() !== '' ? title.trim() : null
}

function finite(value: number, otherwise: number): number {
  return Number.isFinite(value) && value !== 0 ? value : otherwise
}
