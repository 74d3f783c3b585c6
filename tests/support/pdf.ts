import PDFDocument from 'pdfkit'

type Given = {
  pages?: string[]
  options?: PDFKit.PDFDocumentOptions
  draw?: (pdf: PDFKit.PDFDocument) => void
}

/** A real PDF, one page a text. */
export function makePdf({
  pages = ['Kelp held on (p = .021).'],
  options = {},
  draw,
}: Given = {}): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const pdf = new PDFDocument({ autoFirstPage: false, ...options })
    const chunks: Buffer[] = []
    pdf.on('data', (chunk: Buffer) => chunks.push(chunk))
    pdf.on('end', () => resolve(Buffer.concat(chunks)))
    pdf.on('error', reject)
    for (const text of pages) {
      pdf.addPage()
      if (text !== '') pdf.fontSize(10).text(text)
      draw?.(pdf)
    }
    pdf.end()
  })
}
