'use client'

import { useId } from 'react'
import { useDropzone } from 'react-dropzone'
import type { FileView } from '@/db/queries/manuscript'
import type { FileKind } from '@/lib/rules/words'
import { Button } from '../ui/button'
import { classes } from '../ui/classes'
import { Notice } from '../ui/notice'
import { ProgressBar } from '../ui/progress-bar'
import { Time } from '../ui/time'
import { fileKinds } from './file-kinds'
import { formatBytes } from './format-bytes'
import { useUpload, type UploadState } from './use-upload'

type FileSlotProps = {
  kind: FileKind
  optional?: boolean
  /** Where the file is sent. */
  url: string
  /** What is in the slot now. */
  file: FileView | null
  limitBytes: number
  onKept: () => void
  /** Left out where the file cannot be taken out. */
  onRemove?: (fileId: string) => void
  /** Said beside the slot, such as that the file is missing. */
  error?: string | undefined
}

/** A place for one file: by drop or by browse, with progress, checked at once; a refusal loses nothing. */
export function FileSlot({ kind, optional, url, file, limitBytes, onKept, onRemove, error }: FileSlotProps) {
  const { label, hint, accept, wrong } = fileKinds[kind]
  const id = useId()
  const upload = useUpload(url, kind, onKept)
  const busy = upload.state.status === 'sending' || upload.state.status === 'checking'
  const zone = useDropzone({
    accept,
    multiple: false,
    maxSize: limitBytes,
    disabled: busy,
    noClick: true,
    noKeyboard: true,
    onDropAccepted: ([first]) => first && upload.send(first),
    onDropRejected: (rejections) => {
      const [first] = rejections
      if (!first) return
      const code = first.errors[0]?.code
      if (rejections.length > 1)
        upload.refuse(`${rejections.length} files`, 'Please drop one file at a time.')
      else if (code === 'file-too-large') {
        const size = formatBytes(first.file.size)
        upload.refuse(
          first.file.name,
          `The file has ${size}; at most ${formatBytes(limitBytes)} can be taken.`,
        )
      } else upload.refuse(first.file.name, wrong)
    },
  })
  return (
    <section aria-labelledby={id}>
      <div
        {...zone.getRootProps({ tabIndex: -1 })}
        className={classes(
          'rounded-sm border bg-sheet px-4 py-3.5',
          zone.isDragActive ? 'border-tide bg-tide-wash' : error ? 'border-fails' : 'border-rule',
        )}
      >
        <input {...zone.getInputProps({ 'aria-label': `${label}: choose a file` })} />
        <div className="flex flex-wrap items-start justify-between gap-x-4 gap-y-3">
          <div className="min-w-0">
            <h3 id={id} className="font-sans font-medium">
              {label}
              {optional ? <span className="font-normal text-ink-soft"> (optional)</span> : null}
            </h3>
            {file ? <FileLine file={file} /> : <p className="text-ink-soft">{hint}</p>}
          </div>
          {busy ? (
            <Button size="small" onClick={upload.cancel}>
              Stop
            </Button>
          ) : (
            <div className="flex gap-2">
              {file && onRemove ? (
                <Button size="small" variant="quiet" onClick={() => onRemove(file.id)}>
                  Remove<span className="sr-only"> {label}</span>
                </Button>
              ) : null}
              <Button size="small" onClick={zone.open} data-slot={kind}>
                {file ? 'Replace' : 'Browse'}
                <span className="sr-only"> {label}</span>
              </Button>
            </div>
          )}
        </div>
        <UploadLine state={upload.state} kept={file !== null} />
        {zone.isDragActive ? (
          <p className="mt-2 text-tide">Let go to send it.</p>
        ) : !file && !busy ? (
          <p className="mt-2 text-xs text-ink-soft">
            Drop the file here, or browse. At most {formatBytes(limitBytes)}.
          </p>
        ) : null}
      </div>
      {error ? <p className="mt-1 text-fails">{error}</p> : null}
    </section>
  )
}

function FileLine({ file }: { file: FileView }) {
  return (
    <p className="tabular break-words">
      {file.name}
      <span className="text-ink-soft">
        {' '}
        · {formatBytes(file.bytes)} · checked and kept <Time at={file.createdAt} show="moment" />
      </span>
    </p>
  )
}

function UploadLine({ state, kept }: { state: UploadState; kept: boolean }) {
  if (state.status === 'idle') return null
  if (state.status === 'refused') {
    return (
      <Notice tone="trouble" className="mt-3" title={state.name}>
        {state.reason}
        {kept ? ' The file that was here before is still in place.' : ''}
      </Notice>
    )
  }
  const checking = state.status === 'checking'
  const sent = checking ? 1 : state.sent
  return (
    <div className="mt-3">
      <p className="tabular mb-1.5 flex justify-between gap-4">
        <span className="truncate">{state.name}</span>
        <span className="whitespace-nowrap text-ink-soft" aria-live="polite">
          {checking
            ? 'Checking the file…'
            : `${formatBytes(sent * state.bytes)} of ${formatBytes(state.bytes)}`}
        </span>
      </p>
      <ProgressBar value={checking ? null : sent} label={checking ? 'Checking the file' : 'Sending'} />
    </div>
  )
}
