import { RowLink } from '../ui/row-link'
import { Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { Time } from '../ui/time'

type ReceivedTableProps = {
  mails: readonly { id: string; to: string; subject: string; receivedAt: number }[]
}

/** What the local mail server received instead of sending it on. */
export function ReceivedTable({ mails }: ReceivedTableProps) {
  return (
    <Table caption="Mails received here" stacks>
      <Thead>
        <Tr>
          <Th>Subject</Th>
          <Th>To</Th>
          <Th>Received</Th>
        </Tr>
      </Thead>
      <Tbody>
        {mails.map((mail) => (
          <Tr key={mail.id} opens>
            <Td className="md:w-1/2">
              <RowLink href={`/mailbox/${mail.id}`} className="font-medium">
                {mail.subject || 'Without a subject'}
              </RowLink>
            </Td>
            <Td label="To" className="break-all">
              {mail.to}
            </Td>
            <Td label="Received" className="whitespace-nowrap">
              <Time at={mail.receivedAt} show="moment" />
            </Td>
          </Tr>
        ))}
      </Tbody>
    </Table>
  )
}
