import Link from 'next/link'
import type { Figures } from '@/db/queries/figures'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { Bar } from './bar'

export function StateFigures({ states }: { states: Figures['states'] }) {
  const max = Math.max(...states.map((row) => row.manuscripts))
  return (
    <Table caption="Manuscripts by state">
      <Thead>
        <Tr>
          <Th>State</Th>
          <Th number>Manuscripts</Th>
          <Th className="w-1/2">
            <span className="sr-only">Bar</span>
          </Th>
        </Tr>
      </Thead>
      <Tbody>
        {states.map(({ state, manuscripts }) => (
          <Tr key={state}>
            <RowTh>
              <Link
                href={`/docket?states=${encodeURIComponent(state)}`}
                className="text-tide underline-offset-2 hover:underline"
              >
                {state}
              </Link>
            </RowTh>
            <Td number>{manuscripts}</Td>
            <Td aria-hidden="true">
              <Bar parts={[{ value: manuscripts, fill: 'filled' }]} max={max} />
            </Td>
          </Tr>
        ))}
      </Tbody>
    </Table>
  )
}
