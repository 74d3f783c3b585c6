import { startMailbox } from '@/lib/mail/mailbox-server'
import { log } from '@/lib/log'
import { getSettings } from '@/lib/settings'

const { mailbox, mailboxPort } = getSettings()
if (!mailbox) throw new Error('ASSIZE_MAILBOX is not set; it names the folder in which mails are kept.')

const server = await startMailbox({ port: mailboxPort, folder: mailbox })
log.info({ port: mailboxPort }, 'local mail server')
const stop = () => server.close(() => process.exit(0))
process.on('SIGTERM', stop).on('SIGINT', stop)
