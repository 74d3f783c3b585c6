import { LinkTabs } from '../ui/tabs'

export function MailboxTabs() {
  return (
    <div className="mb-4">
      <LinkTabs
        label="Mail"
        items={[
          { href: '/mailbox', label: 'Received here' },
          { href: '/mailbox/outbox', label: 'Outbox' },
        ]}
      />
    </div>
  )
}
