import type { ReviewerRow } from '@/db/queries/reviewers'
import { Time } from '../ui/time'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'

export function LoadFigures({ reviewers }: { reviewers: readonly ReviewerRow[] }) {
  return (
    <Table caption="Load of the reviewers">
      <Thead>
        <Tr>
          <Th>Reviewer</Th>
          <Th number>Open</Th>
          <Th number>Overdue</Th>
          <Th>Next due</Th>
        </Tr>
      </Thead>
      <Tbody>
        {reviewers.map((reviewer) => (
          <Tr key={reviewer.id}>
            <RowTh>{reviewer.name}</RowTh>
            <Td number>{reviewer.open}</Td>
            <Td number className={reviewer.overdue > 0 ? 'text-fails' : undefined}>
              {reviewer.overdue}
            </Td>
            <Td>{reviewer.nextDueAt === null ? '–' : <Time at={reviewer.nextDueAt} show="due-short" />}</Td>
          </Tr>
        ))}
      </Tbody>
    </Table>
  )
}
