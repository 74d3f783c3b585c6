/**
 * Draws the pages of a PDF with the box of every report (red) and statistic (blue) of its audit, one PNG a page that has
 * any, for looking at: `npx tsx scripts/draw-boxes.ts manuscript.pdf folder [dots an inch]`. A Word document is drawn by
 * its reading copy.
 */
import { mkdir, readFile, writeFile } from 'node:fs/promises'
import { createRequire } from 'node:module'
import { basename, dirname, join } from 'node:path'
import { createCanvas } from '@napi-rs/canvas'
import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs'
import { audit } from '@/lib/checks/audit'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { readManuscript } from '@/lib/intake/read-manuscript'

const [path, folder, dpi = '110'] = process.argv.slice(2)
if (path === undefined || folder === undefined) {
  console.error('usage: npx tsx scripts/draw-boxes.ts manuscript.pdf folder [dots an inch]')
  process.exit(1)
}
const assets = dirname(createRequire(import.meta.url).resolve('pdfjs-dist/package.json'))
const { document, readingCopy } = await readManuscript(path)
const { reports, statistics } = audit(document, null, defaultHouseRules)
const pdf = await getDocument({
  data: readingCopy ?? new Uint8Array(await readFile(path)),
  standardFontDataUrl: join(assets, 'standard_fonts/'),
  cMapUrl: join(assets, 'cmaps/'),
  cMapPacked: true,
  verbosity: 0,
}).promise
await mkdir(folder, { recursive: true })
const marks = [
  ...reports.map(({ place }) => ({ place, colour: '#c00' })),
  ...statistics.map(({ place }) => ({ place, colour: '#06c' })),
]
for (let number = 1; number <= pdf.numPages; number++) {
  const here = marks.filter(({ place }) => place.page === number && place.source !== 'results-table')
  if (here.length === 0) continue
  const page = await pdf.getPage(number)
  const viewport = page.getViewport({ scale: Number(dpi) / 72 })
  const canvas = createCanvas(Math.ceil(viewport.width), Math.ceil(viewport.height))
  const context = canvas.getContext('2d')
  await page.render({
    canvas: canvas as unknown as HTMLCanvasElement,
    canvasContext: context as unknown as CanvasRenderingContext2D,
    viewport,
  }).promise
  for (const { place, colour } of here)
    for (const [x0, y0, x1, y1] of place.boxes) {
      const [a, b, c, d] = viewport.convertToViewportRectangle([x0, y0, x1, y1]) as number[]
      context.strokeStyle = colour
      context.strokeRect(a ?? 0, b ?? 0, (c ?? 0) - (a ?? 0), (d ?? 0) - (b ?? 0))
    }
  const file = join(folder, `${basename(path).replace(/\.\w+$/, '')}-${number}.png`)
  await writeFile(file, await canvas.encode('png'))
  console.log(`${file}: ${here.length} boxes`)
}
