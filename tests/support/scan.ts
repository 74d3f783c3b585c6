import { createCanvas } from '@napi-rs/canvas'
import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs'
import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'
import { makePdf } from './pdf'

const assets = dirname(createRequire(import.meta.url).resolve('pdfjs-dist/package.json'))

type Scan = {
  /** Dots an inch. */
  dpi?: number
  /** How far the page lies askew, in degrees. */
  askew?: number
  /** Share of dots that are speckled. */
  speckles?: number
}

/** Pictures of a PDF's pages, as a scanner makes them: grey, a little askew and speckled, each as PNG. */
export async function scanPages(pdf: Uint8Array, { dpi = 200, askew = 0, speckles = 0 }: Scan = {}) {
  const loading = getDocument({
    data: new Uint8Array(pdf),
    standardFontDataUrl: join(assets, 'standard_fonts/'),
    verbosity: 0,
  })
  const document = await loading.promise
  const pictures: { png: Buffer; width: number; height: number }[] = []
  for (let number = 1; number <= document.numPages; number++) {
    const page = await document.getPage(number)
    const viewport = page.getViewport({ scale: dpi / 72 })
    const [width, height] = [Math.ceil(viewport.width), Math.ceil(viewport.height)]
    const drawn = createCanvas(width, height)
    await page.render({
      canvas: drawn as unknown as HTMLCanvasElement,
      canvasContext: drawn.getContext('2d') as unknown as CanvasRenderingContext2D,
      viewport,
    }).promise
    const scanned = createCanvas(width, height)
    const context = scanned.getContext('2d')
    context.fillStyle = '#f4f2ee'
    context.fillRect(0, 0, width, height)
    context.translate(width / 2, height / 2)
    context.rotate((askew * Math.PI) / 180)
    context.globalCompositeOperation = 'multiply'
    context.drawImage(drawn, -width / 2, -height / 2)
    context.setTransform(1, 0, 0, 1, 0, 0)
    context.globalCompositeOperation = 'source-over'
    context.fillStyle = '#555'
    const next = makeRandom(7)
    for (let i = 0; i < speckles * width * height; i++)
      context.fillRect(Math.floor(next() * width), Math.floor(next() * height), 1, 1)
    pictures.push({ png: await scanned.encode('png'), width: viewport.width, height: viewport.height })
  }
  await loading.destroy()
  return pictures.map((picture) => ({
    ...picture,
    points: [picture.width * (72 / dpi), picture.height * (72 / dpi)],
  }))
}

/** The same numbers in every run: a linear congruential generator. */
function makeRandom(seed: number): () => number {
  let state = seed
  return () => (state = (state * 1_664_525 + 1_013_904_223) % 4_294_967_296) / 4_294_967_296
}

/** A PDF whose pages are pictures of another's. */
export async function makeScan(pdf: Uint8Array, how: Scan = {}): Promise<Buffer> {
  const pictures = await scanPages(pdf, how)
  let at = 0
  return makePdf({
    pages: pictures.map(() => ''),
    options: { size: pictures[0]?.points as [number, number], margin: 0 },
    draw: (doc) => {
      const picture = pictures[at++]
      if (picture) doc.image(picture.png, 0, 0, { width: picture.points[0] ?? 0 })
    },
  })
}
