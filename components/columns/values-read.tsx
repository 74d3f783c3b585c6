import type { ReadValue, TableDescription } from '@/lib/checks'
import type { Scale, Test } from '@/lib/checks/vocabulary'
import { Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { ValueText } from '../ui/value-text'

const letters: Record<Test, string> = { t: 't', F: 'F', chi2: 'χ²', z: 'z', r: 'r', other: 'other' }
const scales: Record<Scale, string> = { raw: 'unadjusted', adjusted: 'adjusted', unknown: 'not stated' }

/** What was read with the columns as they stand: how much, and the first values. */
export function ValuesRead({ table, name }: { table: TableDescription; name: string }) {
  const { reports, statistics, values } = table
  return (
    <div className="mt-3">
      <p aria-live="polite">
        Read from it: {count(reports, 'p-value')} and {count(statistics, 'test statistic')}
        {reports > values.length ? `; the first ${values.length} are shown.` : '.'}
      </p>
      {values.length > 0 ? (
        <div
          className="mt-2 overflow-x-auto"
          role="region"
          aria-label={`Values read from ${name}`}
          tabIndex={0}
        >
          <Table stacks caption={`Values read from ${name}`}>
            <Thead>
              <tr role="row">
                <Th number>Row</Th>
                <Th>Comparison or outcome</Th>
                <Th>Statistic</Th>
                <Th>
                  <i>p</i>
                </Th>
                <Th>Scale</Th>
              </tr>
            </Thead>
            <Tbody>
              {values.map((value, i) => (
                <Tr key={i}>
                  <Td number label="Row">
                    {value.row ?? '–'}
                  </Td>
                  <Td label="About">{aboutOf(value)}</Td>
                  <Td label="Statistic">
                    <StatisticRead value={value} />
                  </Td>
                  <Td label="p">
                    <ValueText
                      name="p"
                      relation={value.relation}
                      value={value.value.toFixed(Math.min(value.decimals, 12))}
                    />
                  </Td>
                  <Td label="Scale">{scales[value.scale]}</Td>
                </Tr>
              ))}
            </Tbody>
          </Table>
        </div>
      ) : null}
    </div>
  )
}

function StatisticRead({ value: { statistic } }: { value: ReadValue }) {
  if (!statistic) return <span className="text-ink-soft">none</span>
  const { test, df, value, decimals } = statistic
  return (
    <ValueText
      name={letters[test]}
      {...(df.length > 0 && test !== 'z' ? { df: df.join(', ') } : {})}
      value={value.toFixed(Math.min(decimals, 12)).replace('-', '−')}
    />
  )
}

function aboutOf({ comparison, outcome }: ReadValue): string {
  const pair = comparison ? `${comparison[0]} vs ${comparison[1]}` : ''
  return [pair, outcome ?? ''].filter((part) => part !== '').join(', ') || '–'
}

const count = (n: number, what: string) => `${n === 0 ? 'no' : n} ${what}${n === 1 ? '' : 's'}`
