import { useQuery } from '@tanstack/react-query'
import type { PDFDocumentProxy } from 'pdfjs-dist'
import { useEffect, useState } from 'react'

export type OpenedPdf =
  | { status: 'loading' }
  | { status: 'failed'; message: string }
  | { status: 'open'; document: PDFDocumentProxy; width: number; height: number }

/** Fetches a manuscript's bytes once and opens them; closes the document when the pane goes. */
export function usePdfDocument(url: string): OpenedPdf & { again: () => void } {
  const bytes = useQuery({
    queryKey: ['pdf', url],
    queryFn: async ({ signal }) => {
      const answer = await fetch(url, { signal })
      if (!answer.ok) throw new Error('The manuscript’s file could not be fetched.')
      return answer.arrayBuffer()
    },
    staleTime: Infinity,
    structuralSharing: false,
  })
  const [opened, setOpened] = useState<OpenedPdf>({ status: 'loading' })
  const data = bytes.data
  useEffect(() => {
    if (!data) return
    let gone = false
    const opening = openPdf(data)
    opening.then(
      (open) => !gone && setOpened(open),
      () =>
        !gone &&
        setOpened({
          status: 'failed',
          message: 'The pages cannot be shown; the file can be opened by itself.',
        }),
    )
    return () => {
      gone = true
      void opening.then(
        (open) => open.document.loadingTask.destroy(),
        () => undefined,
      )
    }
  }, [data])
  const again = () => void bytes.refetch()
  if (bytes.error) return { status: 'failed', message: bytes.error.message, again }
  return { ...opened, again }
}

async function openPdf(data: ArrayBuffer) {
  const pdfjs = await import('pdfjs-dist')
  pdfjs.GlobalWorkerOptions.workerSrc = '/pdfjs/pdf.worker.min.mjs'
  const document = await pdfjs.getDocument({
    // The reader takes the buffer away with it; the fetched one stays for the next time.
    data: new Uint8Array(data.slice(0)),
    cMapUrl: '/pdfjs/cmaps/',
    cMapPacked: true,
    standardFontDataUrl: '/pdfjs/standard_fonts/',
    wasmUrl: '/pdfjs/wasm/',
    iccUrl: '/pdfjs/iccs/',
    isEvalSupported: false,
  }).promise
  const { width, height } = (await document.getPage(1)).getViewport({ scale: 1 })
  return { status: 'open' as const, document, width, height }
}
