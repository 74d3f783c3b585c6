import type { Figures } from '@/db/queries/figures'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { Bar } from './bar'

/** How often reviewers upheld each kind of point: what is known of the audit's own precision. */
export function PointFigures({ points }: { points: Figures['points'] }) {
  const max = Math.max(...points.map((row) => row.kept + row.dropped))
  return (
    <Table caption="Points kept and dropped, by rule">
      <Thead>
        <Tr>
          <Th>Rule</Th>
          <Th number>Kept</Th>
          <Th number>Dropped</Th>
          <Th number>Upheld</Th>
          <Th className="w-2/5 max-sm:hidden">
            <span className="sr-only">Bar</span>
          </Th>
        </Tr>
      </Thead>
      <Tbody>
        {points.map(({ rule, kept, dropped }) => (
          <Tr key={rule}>
            <RowTh className="font-mono text-xs">{rule}</RowTh>
            <Td number>{kept}</Td>
            <Td number>{dropped}</Td>
            <Td number>{kept + dropped === 0 ? '–' : `${Math.round((100 * kept) / (kept + dropped))} %`}</Td>
            <Td aria-hidden="true" className="max-sm:hidden">
              <Bar
                parts={[
                  { value: kept, fill: 'filled' },
                  { value: dropped, fill: 'outlined' },
                ]}
                max={max}
              />
            </Td>
          </Tr>
        ))}
      </Tbody>
    </Table>
  )
}
