import type { Figures } from '@/db/queries/figures'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { Bar } from './bar'

const weeks = ['within 7 days', 'in 8 to 14 days', 'in 15 to 21 days', 'in 22 to 28 days'] as const

export function DueFigures({ overdue, dueByWeek }: Pick<Figures, 'overdue' | 'dueByWeek'>) {
  const max = Math.max(overdue, ...dueByWeek)
  const rows = [
    { label: 'overdue', reviews: overdue },
    ...weeks.map((label, week) => ({ label, reviews: dueByWeek[week] ?? 0 })),
  ]
  return (
    <Table caption="Reviews by due date">
      <Thead>
        <Tr>
          <Th>Due</Th>
          <Th number>Reviews</Th>
          <Th className="w-1/2">
            <span className="sr-only">Bar</span>
          </Th>
        </Tr>
      </Thead>
      <Tbody>
        {rows.map(({ label, reviews }) => (
          <Tr key={label}>
            <RowTh>{label}</RowTh>
            <Td number>{reviews}</Td>
            <Td aria-hidden="true">
              <Bar
                parts={[{ value: reviews, fill: label === 'overdue' ? 'outlined' : 'filled' }]}
                max={max}
              />
            </Td>
          </Tr>
        ))}
      </Tbody>
    </Table>
  )
}
