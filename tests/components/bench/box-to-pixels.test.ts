import { expect, test } from 'vitest'
import { boxToPixels } from '@/components/bench/box-to-pixels'
import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs'
import { makePdf } from '@/tests/support/pdf'

/** The viewport that the PDF reader itself makes of a real page. */
async function makeViewport(scale: number, rotation: number) {
  const task = getDocument({ data: new Uint8Array(await makePdf()) })
  const page = await (await task.promise).getPage(1)
  const viewport = page.getViewport({ scale, rotation })
  await task.destroy()
  return viewport
}

test('a box near the foot of the page is drawn near the foot', async () => {
  const viewport = await makeViewport(2, 0)
  const pixels = boxToPixels([10, 20, 60, 32], viewport)
  expect(pixels.left).toBeCloseTo(20, 4)
  expect(pixels.width).toBeCloseTo(100, 4)
  expect(pixels.height).toBeCloseTo(24, 4)
  expect(pixels.top + pixels.height).toBeCloseTo(viewport.height - 40, 4)
})

test('on a page turned by a quarter the box turns with it', async () => {
  const viewport = await makeViewport(1, 90)
  const pixels = boxToPixels([10, 20, 60, 32], viewport)
  expect(pixels.width).toBeCloseTo(12, 4)
  expect(pixels.height).toBeCloseTo(50, 4)
  expect(pixels.left).toBeCloseTo(20, 4)
  expect(pixels.top).toBeCloseTo(10, 4)
})
