'use client'

import Link from 'next/link'
import { useMemo, useState } from 'react'
import type { NamedColumn } from '@/lib/checks'
import { describeTable } from '@/lib/checks/table/describe-table'
import { Failed } from '../shell/failed'
import { Button } from '../ui/button'
import { EmptyState } from '../ui/empty-state'
import { LoadingSteps } from '../ui/mark'
import { Notice } from '../ui/notice'
import { isSameNaming, nameColumn } from './name-column'
import { SaveNaming } from './save-naming'
import { TablePreview } from './table-preview'
import { useNameColumns, useTableColumns, type TableColumnsView } from './use-table-columns'
import { ValuesRead } from './values-read'

type ColumnEditorProps = {
  fileId: string
  manuscriptId: string
  /** Level of each table's heading: below that of the place where it stands. */
  heading: 'h2' | 'h3'
}

/** How a results table is read: each of its tables with what every column was taken for, to be put right by hand. */
export function ColumnEditor({ fileId, manuscriptId, heading }: ColumnEditorProps) {
  const { data, error, isPending, refetch } = useTableColumns(fileId)
  if (isPending) return <LoadingSteps label="Reading the results table" />
  if (error) return <Failed error={error} onRetry={() => void refetch()} />
  return <Editor view={data} manuscriptId={manuscriptId} heading={heading} reload={() => void refetch()} />
}

const mostTables = 30
const mostValues = 6

type EditorProps = Omit<ColumnEditorProps, 'fileId'> & { view: TableColumnsView; reload: () => void }

function Editor(props: EditorProps) {
  const { view, manuscriptId, heading: Heading } = props
  const { table, alpha, mayName, asksAudit } = view
  const [draft, setDraft] = useState<readonly NamedColumn[] | null>(null)
  const naming = useNameColumns(view.fileId, manuscriptId)
  const named = draft ?? view.columns
  const found = useMemo(() => describeTable(table, { alpha }), [table, alpha])
  const shown = useMemo(
    () => describeTable({ ...table, roles: named }, { alpha }, mostValues),
    [table, alpha, named],
  )
  const save = (columns: readonly NamedColumn[]) => naming.mutate(columns)
  const set = (columns: readonly NamedColumn[]) => {
    setDraft(columns)
    // Before it is handed in nothing hangs on it: each choice is kept at once.
    if (!asksAudit) save(columns)
  }
  if (shown.length === 0) return <EmptyState>No table was found in this file.</EmptyState>
  const several = table.sheets.length > 1
  return (
    <div className="flex flex-col gap-6">
      {shown.slice(0, mostTables).map((one, i) => {
        const title = [several ? one.sheetName : null, one.title || `Table ${i + 1}`]
          .filter(Boolean)
          .join(': ')
        const spot = { sheet: one.sheet, row: one.row }
        return (
          <section key={`${one.sheet}-${one.row}-${one.columns[0]?.column ?? 0}`}>
            <Heading className="mb-2 font-semibold">
              {title}{' '}
              <span className="font-normal text-ink-soft">
                {one.rows} {one.rows === 1 ? 'row' : 'rows'}
              </span>
            </Heading>
            <TablePreview
              table={one}
              name={title}
              {...(mayName
                ? {
                    onRole: (column, role) => set(nameColumn(named, { ...spot, column }, role, found)),
                  }
                : {})}
            />
            <ValuesRead table={one} name={title} />
          </section>
        )
      })}
      {view.cut || shown.length > mostTables ? (
        <Notice>Only the beginning of this file is shown. The audit reads all of it.</Notice>
      ) : null}
      {naming.error ? (
        <Notice
          tone="trouble"
          action={
            <Button
              onClick={() => {
                setDraft(null)
                naming.reset()
                props.reload()
              }}
            >
              Load it again
            </Button>
          }
        >
          {naming.error.message}
        </Notice>
      ) : null}
      {naming.data?.auditId && !naming.isPending ? (
        <Notice
          tone="done"
          action={
            <Link href={`/manuscripts/${manuscriptId}`} className="text-tide underline underline-offset-2">
              Follow the audit
            </Link>
          }
        >
          Saved. The audit of this round runs again with these columns; points that are decided stay.
        </Notice>
      ) : null}
      {mayName ? (
        <SaveNaming
          asksAudit={asksAudit}
          changed={!isSameNaming(named, view.columns)}
          pending={naming.isPending}
          anyNamed={named.length > 0}
          onSave={() => save(named)}
          onClear={() => set([])}
        />
      ) : null}
    </div>
  )
}
