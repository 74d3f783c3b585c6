import Link from 'next/link'
import type { RecordRow } from '@/db/queries/record'
import { Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { Time } from '../ui/time'
import { RecordDetail } from './record-detail'

type RecordTableProps = {
  rows: readonly RecordRow[]
  /** Left out on a manuscript's own record. */
  showManuscript?: boolean
}

/** Lines of the record, newest first. */
export function RecordTable({ rows, showManuscript = true }: RecordTableProps) {
  return (
    <Table caption="The record" stacks>
      <Thead>
        <Tr>
          <Th number>No.</Th>
          <Th>When</Th>
          <Th>Event</Th>
          {showManuscript ? <Th>Manuscript</Th> : null}
          <Th>Who</Th>
          <Th>Detail</Th>
        </Tr>
      </Thead>
      <Tbody>
        {rows.map((row) => (
          <Tr key={row.sequence}>
            <Td label="No." number className="text-ink-soft">
              {row.sequence}
            </Td>
            <Td label="When" className="whitespace-nowrap">
              <Time at={row.at} show="moment" />
            </Td>
            <Td label="Event" className="font-medium">
              {row.event}
            </Td>
            {showManuscript ? (
              <Td label="Manuscript" className="whitespace-nowrap">
                {row.manuscriptId && row.reference ? (
                  <Link
                    href={`/manuscripts/${row.manuscriptId}`}
                    className="text-tide underline-offset-2 hover:underline"
                  >
                    {row.reference}
                  </Link>
                ) : (
                  <span className="text-ink-soft">–</span>
                )}
              </Td>
            ) : null}
            <Td label="Who">{row.actorName}</Td>
            <Td label="Detail" className="text-ink-soft">
              <RecordDetail detail={row.detail} />
            </Td>
          </Tr>
        ))}
      </Tbody>
    </Table>
  )
}
