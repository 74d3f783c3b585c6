import { randomBytes } from 'node:crypto'
import { createWriteStream } from 'node:fs'
import { mkdir, rename, rm } from 'node:fs/promises'
import { join } from 'node:path'
import { pipeline } from 'node:stream/promises'
import { SMTPServer } from 'smtp-server'

type Options = { port: number; folder: string; host?: string }

/** A mail server for one's own machine: it takes every mail, delivers none and keeps each as a file. */
export function startMailbox({ port, folder, host = '127.0.0.1' }: Options): Promise<SMTPServer> {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    size: 25 * 1024 * 1024,
    onData: (stream, _session, done) => {
      keep(stream, folder).then(
        () => done(),
        (error: Error) => done(error),
      )
    },
  })
  return new Promise((resolve, reject) => {
    server.on('error', reject)
    server.listen(port, host, () => resolve(server))
  })
}

/** A file appears under its name only when it is whole. The name begins with the time, so that it sorts. */
async function keep(stream: NodeJS.ReadableStream, folder: string): Promise<void> {
  await mkdir(folder, { recursive: true })
  const id = `${Date.now().toString().padStart(14, '0')}-${randomBytes(6).toString('hex')}`
  const partial = join(folder, `${id}.part`)
  try {
    await pipeline(stream, createWriteStream(partial, { flags: 'wx', mode: 0o600 }))
    await rename(partial, join(folder, `${id}.eml`))
  } finally {
    await rm(partial, { force: true })
  }
}
