'use client'

import { Tabs } from '../ui/tabs'
import { Time } from '../ui/time'

type MailSheetProps = {
  mail: {
    from: string
    to: string
    subject: string
    receivedAt: number
    text: string
    html: string | null
  }
}

// Links open in a new window of their own; nothing else that the mail holds may run or load.
const sandbox = 'allow-popups allow-popups-to-escape-sandbox'

/** One mail as its receiver sees it: headers, the HTML part in a sandbox, the text part. */
export function MailSheet({ mail }: MailSheetProps) {
  const text = (
    <pre className="max-w-prose border border-rule bg-sheet p-4 font-mono text-sm whitespace-pre-wrap">
      {mail.text}
    </pre>
  )
  const html = (
    <iframe
      title={`HTML part of ${mail.subject}`}
      sandbox={sandbox}
      referrerPolicy="no-referrer"
      srcDoc={`<base target="_blank">${mail.html ?? ''}`}
      className="h-[70dvh] w-full border border-rule bg-[Canvas] scheme-light"
    />
  )
  return (
    <>
      <dl className="mb-5 grid grid-cols-[auto_1fr] gap-x-5 gap-y-1">
        <Line name="From">{mail.from}</Line>
        <Line name="To">{mail.to}</Line>
        <Line name="Received">
          <Time at={mail.receivedAt} show="moment" />
        </Line>
      </dl>
      {mail.html === null ? (
        text
      ) : (
        <Tabs
          label="Parts of the mail"
          items={[
            { value: 'html', label: 'HTML', content: html },
            { value: 'text', label: 'Text', content: text },
          ]}
        />
      )}
    </>
  )
}

function Line({ name, children }: { name: string; children: React.ReactNode }) {
  return (
    <>
      <dt className="text-ink-soft">{name}</dt>
      <dd className="break-all">{children}</dd>
    </>
  )
}
