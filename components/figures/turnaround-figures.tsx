import type { Figures, Turnaround } from '@/db/queries/figures'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'

export function TurnaroundFigures({ turnaround }: { turnaround: Figures['turnaround'] }) {
  return (
    <Table caption="Days from hand-in to verdict">
      <Thead>
        <Tr>
          <Th>Released</Th>
          <Th number>Rounds</Th>
          <Th number>Median days</Th>
          <Th number>Slowest tenth above</Th>
        </Tr>
      </Thead>
      <Tbody>
        <Line label="in the last 90 days" figures={turnaround.lastQuarter} />
        <Line label="ever" figures={turnaround.ever} />
      </Tbody>
    </Table>
  )
}

function Line({ label, figures }: { label: string; figures: Turnaround }) {
  return (
    <Tr>
      <RowTh>{label}</RowTh>
      <Td number>{figures.rounds}</Td>
      <Td number>{figures.median === null ? '–' : figures.median.toFixed(1)}</Td>
      <Td number>{figures.slowestTenth === null ? '–' : figures.slowestTenth.toFixed(1)}</Td>
    </Tr>
  )
}
