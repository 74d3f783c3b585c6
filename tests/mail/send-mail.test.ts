import { once } from 'node:events'
import type { AddressInfo } from 'node:net'
import { eq } from 'drizzle-orm'
import { SMTPServer, type SMTPServerOptions } from 'smtp-server'
import { expect, onTestFinished, test } from 'vitest'
import { transact, type Db } from '@/db/client'
import { jobs, mails, record } from '@/db/schema'
import { runDueJobs } from '@/lib/jobs/run-due-jobs'
import { composeInvitation } from '@/lib/mail/account-mails'
import { startMailbox } from '@/lib/mail/mailbox-server'
import { getReceivedMail, listReceivedMails } from '@/lib/mail/mailbox'
import { getDomain, queueMail, type Mail } from '@/lib/mail/queue-mail'
import { getSettings } from '@/lib/settings'
import { makeDb } from '../support/db'
import { makeFolder } from '../support/folder'

const letter: Mail = {
  template: 'verdict',
  recipient: 'corin.inglis@kelpbay.example',
  subject: 'Your manuscript: Größe der Haftorgane',
  text: 'Dear authors,\n\np < .05 & more.\n',
  html: '<p>Dear authors,</p><p>p &lt; .05 &amp; more.</p>',
}

type Taken = { from: string; to: string[]; source: string }

/** A real mail server that answers each mail in turn with one of the given errors, then takes them. */
async function startServer(answers: (Error | null)[], options: SMTPServerOptions = {}) {
  const taken: Taken[] = []
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onData(stream, session, done) {
      const chunks: Buffer[] = []
      stream.on('data', (chunk: Buffer) => chunks.push(chunk))
      stream.on('end', () => {
        const error = answers.shift() ?? null
        const { mailFrom, rcptTo } = session.envelope
        if (!error) {
          taken.push({
            from: mailFrom ? mailFrom.address : '',
            to: rcptTo.map(({ address }) => address),
            source: Buffer.concat(chunks).toString('utf8'),
          })
        }
        done(error)
      })
    },
    ...options,
  })
  server.listen(0, '127.0.0.1')
  await once(server.server, 'listening')
  onTestFinished(() => new Promise<void>((resolve) => server.close(() => resolve())))
  const { port } = server.server.address() as AddressInfo
  return { taken, settings: getSettings({ ASSIZE_SMTP_URL: `smtp://127.0.0.1:${port}` }) }
}

const answer = (responseCode: number, message: string) => Object.assign(new Error(message), { responseCode })
const put = (db: Db, mail: Mail = letter, now = 0) => transact(db, (tx) => queueMail(tx, mail, now))
const getMail = (db: Db) => db.select().from(mails).get()
const getJob = (db: Db) => db.select().from(jobs).get()
const countEvents = (db: Db, event: 'mail sent' | 'mail failed') =>
  db.select().from(record).where(eq(record.event, event)).all().length

test('a mail waits in the outbox until the worker hands it to the server, as it was written', async () => {
  const db = makeDb()
  const { taken, settings } = await startServer([])
  const id = put(db)
  expect(getMail(db)).toMatchObject({ status: 'queued', attempts: 0 })
  await runDueJobs(db, settings, 'send-mail', () => 1)
  expect(getMail(db)).toMatchObject({ status: 'sent', attempts: 1, sentAt: 1, trouble: null })
  expect(taken).toHaveLength(1)
  expect(taken[0]).toMatchObject({ from: 'desk@ternharbour.example', to: ['corin.inglis@kelpbay.example'] })
  expect(taken[0]?.source).toContain(`Message-ID: <${id}@ternharbour.example>`)
  expect(countEvents(db, 'mail sent')).toBe(1)
})

test('a server that is busy is tried again later, under the same message id, and the mail arrives once', async () => {
  const db = makeDb()
  const { taken, settings } = await startServer([answer(451, 'busy'), answer(421, 'too many'), null])
  const id = put(db)
  let time = 0
  const clock = () => time
  await runDueJobs(db, settings, 'send-mail', clock)
  expect(getMail(db)).toMatchObject({
    status: 'queued',
    attempts: 1,
    trouble: expect.stringContaining('451'),
  })
  expect(await runDueJobs(db, settings, 'send-mail', clock)).toBe(0)
  const waits: number[] = []
  while (getMail(db)?.status === 'queued') {
    const due = getJob(db)?.runAt ?? 0
    waits.push(due - time)
    time = due
    await runDueJobs(db, settings, 'send-mail', clock)
  }
  expect(waits).toEqual([30_000, 120_000])
  expect(getMail(db)).toMatchObject({ status: 'sent', attempts: 3, trouble: null })
  expect(taken).toHaveLength(1)
  expect(taken[0]?.source).toContain(`<${id}@`)
})

test('a refusal for good is not tried again and is recorded', async () => {
  const db = makeDb()
  const { taken, settings } = await startServer([], {
    onRcptTo: (_address, _session, done) => done(answer(550, 'no such mailbox corin.inglis@kelpbay.example')),
  })
  put(db)
  await runDueJobs(db, settings, 'send-mail', () => 1)
  expect(getMail(db)).toMatchObject({
    status: 'failed',
    attempts: 1,
    trouble: expect.stringContaining('550'),
  })
  expect(getMail(db)?.trouble).not.toContain('corin')
  expect(getJob(db)).toMatchObject({ status: 'failed' })
  expect(countEvents(db, 'mail failed')).toBe(1)
  expect(taken).toEqual([])
})

test('a server that cannot be reached is tried eight times and then given up', async () => {
  const db = makeDb()
  const settings = getSettings({ ASSIZE_SMTP_URL: 'smtp://127.0.0.1:1' })
  put(db)
  let time = 0
  for (let i = 0; i < 20 && getMail(db)?.status === 'queued'; i++) {
    await runDueJobs(db, settings, 'send-mail', () => time)
    time = getJob(db)?.runAt ?? time
  }
  expect(getMail(db)).toMatchObject({
    status: 'failed',
    attempts: 8,
    trouble: expect.stringContaining('ESOCKET'),
  })
  expect(countEvents(db, 'mail failed')).toBe(1)
})

test('a link that opens an account leaves the outbox once its mail is sent', async () => {
  const db = makeDb()
  const { taken, settings } = await startServer([])
  put(db, composeInvitation({ email: 'new@ternharbour.example', name: 'Rurik <Tane>' }, 'q2Tsecret'))
  expect(getMail(db)?.text).toContain('/invitation/q2Tsecret')
  expect(getMail(db)?.html).toContain('Rurik &lt;Tane&gt;')
  await runDueJobs(db, settings, 'send-mail', () => 1)
  expect(taken[0]?.source).toContain('q2Tsecret')
  expect(JSON.stringify(getMail(db))).not.toContain('q2Tsecret')
})

test('a line break in a title cannot begin a header of its own', async () => {
  const db = makeDb()
  const { taken, settings } = await startServer([])
  put(db, { ...letter, subject: 'Kelp\r\nBcc: everyone@kelpbay.example' })
  await runDueJobs(db, settings, 'send-mail', () => 1)
  const [head = ''] = (taken[0]?.source ?? '').split('\r\n\r\n')
  expect(head).not.toMatch(/^Bcc:/m) // a header line of its own
  expect(taken[0]?.to).toEqual(['corin.inglis@kelpbay.example'])
})

test('the message id carries the sender’s domain', () => {
  expect(getDomain('Tern Harbour Core <desk@ternharbour.example>')).toBe('ternharbour.example')
  expect(getDomain('desk@ternharbour.example')).toBe('ternharbour.example')
  expect(getDomain('nobody')).toBe('localhost')
})

test('the local mail server keeps what it takes; the mailbox lists and shows it', async () => {
  const db = makeDb()
  const folder = makeFolder()
  const server = await startMailbox({ port: 0, folder })
  onTestFinished(() => new Promise<void>((resolve) => server.close(() => resolve())))
  const { port } = server.server.address() as AddressInfo
  put(db)
  await runDueJobs(db, getSettings({ ASSIZE_SMTP_URL: `smtp://127.0.0.1:${port}` }), 'send-mail', () => 1)
  const [first, ...more] = await listReceivedMails(folder)
  expect(more).toEqual([])
  expect(first).toMatchObject({ to: 'corin.inglis@kelpbay.example', subject: letter.subject })
  const body = await getReceivedMail(folder, first?.id ?? '')
  expect(body?.text.trim()).toBe(letter.text.trim())
  expect(body?.html).toContain('p &lt; .05 &amp; more.')
})

test.each(['../secrets', '..', '', '00000000000001-0123456789ab/../../x', '00000000000001-0123456789AB'])(
  'the id %j names no mail',
  async (id) => {
    expect(await getReceivedMail(makeFolder(), id)).toBeNull()
  },
)

test('a mailbox that does not exist yet is empty', async () => {
  expect(await listReceivedMails('/nowhere/at/all')).toEqual([])
})
