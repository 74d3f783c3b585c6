'use client'

import { useRef, useState } from 'react'
import type { FileKind } from '@/lib/rules/words'
import { isProblem } from '../shell/fetch-json'
import { uploadFile } from './upload-file'

export type UploadState =
  | { status: 'idle' }
  | { status: 'sending'; name: string; bytes: number; sent: number }
  /** All of it has left; the server reads it. */
  | { status: 'checking'; name: string; bytes: number }
  | { status: 'refused'; name: string; reason: string }

/** One upload at a time into one slot; what was there stays until the new file is accepted. */
export function useUpload(url: string, kind: FileKind, onKept: () => void) {
  const [state, setState] = useState<UploadState>({ status: 'idle' })
  const stop = useRef<AbortController | null>(null)

  const send = async (file: File) => {
    const { name, size: bytes } = file
    const controller = new AbortController()
    stop.current = controller
    setState({ status: 'sending', name, bytes, sent: 0 })
    const onProgress = (sent: number) =>
      setState(sent < 1 ? { status: 'sending', name, bytes, sent } : { status: 'checking', name, bytes })
    try {
      await uploadFile({ url, file, kind, onProgress, signal: controller.signal })
      setState({ status: 'idle' })
      onKept()
    } catch (error) {
      if (!isProblem(error)) throw error
      setState(
        controller.signal.aborted ? { status: 'idle' } : { status: 'refused', name, reason: error.message },
      )
    }
  }

  return {
    state,
    send: (file: File) => void send(file),
    refuse: (name: string, reason: string) => setState({ status: 'refused', name, reason }),
    cancel: () => stop.current?.abort(),
  }
}
