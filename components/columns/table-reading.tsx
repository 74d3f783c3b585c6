import { ColumnEditor } from './column-editor'

/** Beside the file that was added: how it is read, before it is handed in. */
export function TableReading(props: { fileId: string; manuscriptId: string }) {
  return (
    <details open className="border border-rule bg-paper px-3.5 py-2.5">
      <summary className="font-semibold">How the results table is read</summary>
      <p className="mt-1 mb-4 max-w-prose text-ink-soft">
        What each column was taken for, and what was read with it. Where that is wrong, say what the column
        holds.
      </p>
      <ColumnEditor heading="h3" {...props} />
    </details>
  )
}
