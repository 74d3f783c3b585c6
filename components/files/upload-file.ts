import type { FileKind } from '@/lib/rules/words'
import { makeProblem, readProblem } from '../shell/fetch-json'

type Upload = {
  url: string
  file: File
  kind: FileKind
  /** Part of the file that has left this machine, in [0, 1]. */
  onProgress: (sent: number) => void
  signal: AbortSignal
}

/**
 * Sends one file as the body of a request and resolves when the server has checked and kept it. Rejects with
 * the server's refusal as a Problem; XMLHttpRequest, because fetch does not tell how much has been sent.
 */
export function uploadFile({ url, file, kind, onProgress, signal }: Upload): Promise<void> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest()
    request.open('POST', url)
    request.setRequestHeader('X-File-Name', encodeURIComponent(file.name))
    request.setRequestHeader('X-File-Kind', kind)
    request.setRequestHeader('Content-Type', file.type || 'application/octet-stream')
    request.upload.onprogress = (event) => {
      if (event.lengthComputable && event.total > 0) onProgress(event.loaded / event.total)
    }
    request.onload = () => {
      if (request.status >= 200 && request.status < 300) resolve()
      else reject(readProblem(request.status, request.responseText))
    }
    request.onerror = () =>
      reject(makeProblem(0, 'The file did not arrive; please check the connection and send it again.'))
    request.onabort = () => reject(makeProblem(0, 'Sending was stopped; nothing was kept.'))
    signal.addEventListener('abort', () => request.abort(), { once: true })
    request.send(file)
  })
}
