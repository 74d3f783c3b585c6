import Link from 'next/link'
import type { HouseRulesView } from '@/db/queries/house-rules'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { Time } from '../ui/time'

type VersionListProps = {
  versions: readonly HouseRulesView[]
  /** The one that is shown. */
  shown: number
}

/** Every version there was; each can be opened to read. */
export function VersionList({ versions, shown }: VersionListProps) {
  const [newest] = versions
  if (versions.length < 2) return null
  return (
    <section className="mt-10">
      <h2 className="mb-2 text-lg font-semibold">Versions</h2>
      <Table caption="Versions of the house rules">
        <Thead>
          <Tr>
            <Th>Version</Th>
            <Th>Since</Th>
            <Th>By</Th>
          </Tr>
        </Thead>
        <Tbody>
          {versions.map((version) => (
            <Tr key={version.version} selected={version.version === shown}>
              <RowTh>
                <Link
                  href={version === newest ? '/house-rules' : `/house-rules?version=${version.version}`}
                  className="text-tide underline-offset-2 hover:underline"
                >
                  {version.version}
                  {version === newest ? ', in force' : ''}
                </Link>
              </RowTh>
              <Td>{version.createdAt === null ? '–' : <Time at={version.createdAt} show="moment" />}</Td>
              <Td>{version.createdBy ?? 'the installation'}</Td>
            </Tr>
          ))}
        </Tbody>
      </Table>
    </section>
  )
}
