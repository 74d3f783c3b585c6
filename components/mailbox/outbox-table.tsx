import type { MailRow } from '@/db/queries/mails'
import type { MailStatus } from '@/lib/rules/words'
import { Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { Tag, type Tone } from '../ui/tag'
import { Time } from '../ui/time'

const tones: Record<MailStatus, Tone> = { queued: 'tide', sent: 'plain', failed: 'fails' }

/** What the worker has to send, has sent or could not send. */
export function OutboxTable({ mails }: { mails: readonly MailRow[] }) {
  return (
    <Table caption="Outbox" stacks>
      <Thead>
        <Tr>
          <Th>Subject</Th>
          <Th>To</Th>
          <Th>Status</Th>
          <Th number>Tries</Th>
          <Th>Written</Th>
          <Th>Sent</Th>
        </Tr>
      </Thead>
      <Tbody>
        {mails.map((mail) => (
          <Tr key={mail.id}>
            <Td className="font-medium">
              {mail.subject}
              {mail.trouble ? (
                <span className="block text-xs font-normal text-fails">{mail.trouble}</span>
              ) : null}
            </Td>
            <Td label="To" className="break-all">
              {mail.recipient}
            </Td>
            <Td label="Status">
              <Tag tone={tones[mail.status]}>{mail.status}</Tag>
            </Td>
            <Td label="Tries" number>
              {mail.attempts}
            </Td>
            <Td label="Written" className="whitespace-nowrap">
              <Time at={mail.createdAt} show="moment" />
            </Td>
            <Td label="Sent" className="whitespace-nowrap">
              {mail.sentAt === null ? '–' : <Time at={mail.sentAt} show="moment" />}
            </Td>
          </Tr>
        ))}
      </Tbody>
    </Table>
  )
}
