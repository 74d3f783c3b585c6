'use client'

import type { DocketRow } from '@/db/queries/docket'
import type { Direction, DocketSort } from '@/lib/rules/docket'
import { canMove } from '@/lib/rules/states'
import { Checkbox } from '../ui/choice'
import { Table, Tbody, Th, Thead, Tr } from '../ui/table'
import { DocketTableRow } from './docket-table-row'
import type { DocketPart } from './docket-params'

type DocketTableProps = {
  rows: readonly DocketRow[]
  parts: readonly DocketPart[]
  sort: DocketSort
  direction: Direction
  onSort: (sort: DocketSort, direction: Direction) => void
  selectable: boolean
  selected: ReadonlySet<string>
  onSelect: (selected: ReadonlySet<string>) => void
  onAnswer: (row: DocketRow, accept: boolean) => void
}

export function DocketTable(props: DocketTableProps) {
  const { rows, selected, onSelect } = props
  const assignable = rows.filter(isAssignable)
  const all = assignable.length > 0 && assignable.every((row) => selected.has(row.id))
  const judged = props.parts.some((part) => part !== 'submitter')
  const head = (sort: DocketSort, label: string) => {
    const now = props.sort === sort ? props.direction : null
    return (
      <Th
        sort={now === null ? null : now === 'asc' ? 'ascending' : 'descending'}
        onSort={() => props.onSort(sort, now === 'asc' ? 'desc' : 'asc')}
      >
        {label}
      </Th>
    )
  }
  const toggle = (id: string) => {
    const next = new Set(selected)
    if (!next.delete(id)) next.add(id)
    onSelect(next)
  }
  return (
    <Table caption="The docket" stacks>
      <Thead>
        <Tr>
          {props.selectable ? (
            <Th className="w-8">
              <Checkbox
                label="Select all that can be assigned"
                hideLabel
                disabled={assignable.length === 0}
                checked={all}
                onChange={() => onSelect(new Set(all ? [] : assignable.map((row) => row.id)))}
              />
            </Th>
          ) : null}
          <Th>Reference</Th>
          {head('title', 'Title')}
          {head('state', 'State')}
          {judged ? <Th>Families</Th> : null}
          {head('reviewer', 'Reviewer')}
          {head('due', 'Due')}
          {head('received', 'Received')}
        </Tr>
      </Thead>
      <Tbody>
        {rows.map((row) => (
          <DocketTableRow
            key={row.id}
            row={row}
            judged={judged}
            selectable={props.selectable}
            selected={selected.has(row.id)}
            onToggle={isAssignable(row) ? () => toggle(row.id) : null}
            onAnswer={(accept) => props.onAnswer(row, accept)}
          />
        ))}
      </Tbody>
    </Table>
  )
}

function isAssignable(row: DocketRow): boolean {
  return row.sight === 'editor' && canMove('assign', row.state)
}
