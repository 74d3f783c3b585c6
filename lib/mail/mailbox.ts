import { readdir, readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { simpleParser, type AddressObject } from 'mailparser'

export type ReceivedMail = { id: string; from: string; to: string; subject: string; receivedAt: number }
export type ReceivedMailBody = ReceivedMail & { text: string; html: string | null }

/** Names that the fake server gives: 14 digits of time, 12 hexadecimal digits. */
const idPattern = /^(\d{14})-[0-9a-f]{12}$/

/** What the local mail server received, newest first. */
export async function listReceivedMails(folder: string, limit = 200): Promise<ReceivedMail[]> {
  const names = await readdir(folder).catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return []
    throw error
  })
  const ids = names
    .filter((name) => name.endsWith('.eml'))
    .map((name) => name.slice(0, -4))
    .filter((id) => idPattern.test(id))
    .sort((a, b) => b.localeCompare(a))
    .slice(0, limit)
  const mails = await Promise.all(ids.map((id) => getReceivedMail(folder, id)))
  return mails.flatMap((mail) => (mail ? [withoutBody(mail)] : []))
}

/** One mail, parsed; null where the id names none. An id is never taken as a path. */
export async function getReceivedMail(folder: string, id: string): Promise<ReceivedMailBody | null> {
  const receivedAt = Number(idPattern.exec(id)?.[1] ?? Number.NaN)
  if (Number.isNaN(receivedAt)) return null
  const source = await readFile(join(/* turbopackIgnore: true */ folder, `${id}.eml`)).catch(
    (error: NodeJS.ErrnoException) => {
      if (error.code === 'ENOENT') return null
      throw error
    },
  )
  if (source === null) return null
  const mail = await simpleParser(source, { skipImageLinks: true })
  return {
    id,
    from: toText(mail.from),
    to: toText(mail.to),
    subject: mail.subject ?? '',
    receivedAt,
    text: mail.text ?? '',
    html: mail.html || null,
  }
}

function withoutBody({ id, from, to, subject, receivedAt }: ReceivedMailBody): ReceivedMail {
  return { id, from, to, subject, receivedAt }
}

function toText(addresses: AddressObject | AddressObject[] | undefined): string {
  return [addresses ?? []]
    .flat()
    .map((one) => one.text)
    .join(', ')
}
