import type { PageViewport } from 'pdfjs-dist'
import type { Box } from '@/lib/checks/types'

/** A box in PDF points (origin bottom left, unrotated) as pixels from the top left of the page as it is shown. */
export function boxToPixels(box: Box, viewport: Pick<PageViewport, 'convertToViewportRectangle'>) {
  const [ax = 0, ay = 0, bx = 0, by = 0]: number[] = viewport.convertToViewportRectangle(box)
  return {
    left: Math.min(ax, bx),
    top: Math.min(ay, by),
    width: Math.abs(bx - ax),
    height: Math.abs(by - ay),
  }
}
