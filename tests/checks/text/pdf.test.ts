import { writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { expect, test } from 'vitest'
import { layOut } from '@/lib/checks/text/lay-out'
import { readPdf } from '@/lib/intake/pdf/read-pdf'
import { makePdf } from '../../support/pdf'
import { makeFolder } from '../../support/folder'

type Draw = (pdf: PDFKit.PDFDocument) => void

/** Lays out a real PDF of one page, drawn with pdfkit and read as manuscripts are. */
async function layOutDrawn(draw: Draw, options: PDFKit.PDFDocumentOptions = {}) {
  const path = join(makeFolder(), 'manuscript.pdf')
  await writeFile(path, await makePdf({ pages: [''], options: { size: 'A4', margin: 60, ...options }, draw }))
  return layOut(await readPdf(path))
}

test('the boxes of a quote lie within 2 points of where the quote was drawn', async () => {
  const before = 'The mean of the treated plots exceeded that of the others ('
  const quote = 't(28) = 2.46, p = 0.021'
  const drawn = { left: 0, right: 0, baseline: 0 }
  const { prose } = await layOutDrawn((pdf) => {
    pdf.font('Times-Roman').fontSize(10)
    pdf.text(`${before}${quote}).`, 60, 100, { lineBreak: false })
    drawn.left = 60 + pdf.widthOfString(before)
    drawn.right = drawn.left + pdf.widthOfString(quote)
    drawn.baseline = pdf.page.height - 100 - 0.683 * 10
  })
  const start = prose.text.indexOf(quote)
  const [box] = prose.boxesOf(start, start + quote.length)
  const [x0 = 0, y0 = 0, x1 = 0, y1 = 0] = box ?? []
  expect(Math.abs(x0 - drawn.left)).toBeLessThan(2)
  expect(Math.abs(x1 - drawn.right)).toBeLessThan(2)
  expect(y0).toBeLessThan(drawn.baseline)
  expect(y1).toBeGreaterThan(drawn.baseline + 5)
})

test('two justified columns drawn by a typesetter are read in order, hyphenless and whole', async () => {
  const sentence = (n: number) =>
    `Sentence ${n} tells of the plots and of the rain that fell on them in the spring. `
  const text = Array.from({ length: 60 }, (_, i) => sentence(i)).join('')
  const { prose, tables } = await layOutDrawn((pdf) => {
    pdf
      .font('Helvetica')
      .fontSize(9)
      .text(text, 60, 80, { columns: 2, columnGap: 18, align: 'justify', height: 640 })
  })
  expect(tables).toEqual([])
  expect(prose.text.replace(/\s+/g, ' ').trim()).toBe(text.trim())
})

test('a drawn table is read cell by cell beside a paragraph that stays prose', async () => {
  const cells = [
    ['Comparison', 'Difference', 'SE', 't', 'p'],
    ['Control vs Low', '–1.20', '0.81', '–1.48', '0.148'],
    ['Control vs High', '–3.41', '0.83', '–4.11', '<0.001'],
    ['Low vs High', '–2.21', '0.80', '–2.76', '0.009'],
  ]
  const { prose, tables } = await layOutDrawn((pdf) => {
    pdf
      .font('Times-Roman')
      .fontSize(10)
      .text('All pairs were compared and the values are shown in Table 1. '.repeat(4), 60, 80, { width: 470 })
    pdf.fontSize(9).text('Table 1. Comparison of all pairs of doses.', 60, 150)
    cells.forEach((row, i) =>
      row.forEach((cell, j) =>
        pdf.text(cell, [60, 170, 250, 310, 370][j] ?? 0, 166 + 12 * i, { lineBreak: false }),
      ),
    )
    pdf
      .fontSize(10)
      .text('The dose mattered only when it was high, as expected. '.repeat(5), 60, 230, { width: 470 })
  })
  expect(tables[0]?.header.map((row) => row.map(({ text }) => text))).toEqual([cells[0]])
  expect(tables[0]?.rows.map((row) => row.map(({ text }) => text))).toEqual(
    cells.slice(1).map((row) => row.map((cell) => cell.replace('–', '-'))),
  )
  expect(prose.text).not.toContain('Control vs Low')
  expect(prose.text.match(/The dose mattered/g)).toHaveLength(5)
})

test('a page without any text beside pages with text is a place that could not be read', async () => {
  const { prose, unread } = await layOutDrawn((pdf) => {
    pdf.fontSize(10).text('All pairs were compared.', 60, 80)
    pdf.addPage().rect(100, 100, 200, 200).fill('grey')
  })
  expect(prose.text).toBe('All pairs were compared.')
  expect(unread.map(({ page }) => page)).toEqual([2])
})
