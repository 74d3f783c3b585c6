// What demo, dev and verify share. Plain Node: it runs right after `git clone`, before anything is installed.
import { spawn, spawnSync } from 'node:child_process'
import { createHash, randomBytes } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'

export const root = dirname(dirname(fileURLToPath(import.meta.url)))
const bin = (name) => join(root, 'node_modules', '.bin', name)

export function say(text) {
  console.log(text)
}

/** Runs a command to its end with its output shown; returns its exit status. */
export function run(command, args, env = {}) {
  const result = spawnSync(command, args, { cwd: root, stdio: 'inherit', env: { ...process.env, ...env } })
  return result.status ?? 1
}

export function runBin(name, args, env = {}) {
  return run(bin(name), args, env)
}

export function must(what, status) {
  if (status === 0) return
  console.error(`${what} ended with status ${status}.`)
  process.exit(status)
}

export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number)
  if (major === 20 && minor >= 19) return
  console.error(`Assize needs Node 20.19 or a later 20; this is ${process.versions.node}.`)
  process.exit(1)
}

/** `npm ci`, unless what is installed comes from this very lock file. */
export function install() {
  const stamp = join(root, 'node_modules', '.assize-lock')
  const lock = createHash('sha256')
    .update(readFileSync(join(root, 'package-lock.json')))
    .digest('hex')
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === lock) return 0
  const status = run('npm', ['ci', '--no-audit', '--no-fund'])
  if (status === 0) writeFileSync(stamp, lock)
  return status
}

/** The secret that signs cookies, made once and kept beside the data. */
export function keepSecret(folder) {
  mkdirSync(folder, { recursive: true })
  const path = join(folder, 'secret')
  if (!existsSync(path)) writeFileSync(path, randomBytes(32).toString('hex'), { mode: 0o600 })
  return readFileSync(path, 'utf8')
}

/** The environment of an installation whose data live in `folder` and which answers on `port`. */
export function environment(folder, port, mailPort) {
  return {
    ASSIZE_DATABASE: process.env.ASSIZE_DATABASE ?? join(folder, 'assize.db'),
    ASSIZE_UPLOADS: process.env.ASSIZE_UPLOADS ?? join(folder, 'uploads'),
    ASSIZE_URL: process.env.ASSIZE_URL ?? `http://localhost:${port}`,
    ASSIZE_SECRET: process.env.ASSIZE_SECRET ?? keepSecret(folder),
    ...(process.env.ASSIZE_SMTP_URL
      ? {}
      : {
          ASSIZE_SMTP_URL: `smtp://127.0.0.1:${mailPort}`,
          ASSIZE_MAILBOX: join(folder, 'mailbox'),
          ASSIZE_MAILBOX_PORT: String(mailPort),
        }),
    ASSIZE_LOG_LEVEL: process.env.ASSIZE_LOG_LEVEL ?? 'warn',
    NEXT_TELEMETRY_DISABLED: '1',
  }
}

/**
 * Starts the web server, the worker and, where no real mail server is named, the local SMTP fake. All end
 * together: when one stops, the others are stopped too.
 */
export function startAll(mode, port, env) {
  const start = (name, args) =>
    spawn(bin(name), args, { cwd: root, stdio: 'inherit', env: { ...process.env, ...env } })
  const children = [
    start('next', [mode, '-p', String(port)]),
    start('tsx', ['scripts/worker.ts']),
    ...(env.ASSIZE_MAILBOX ? [start('tsx', ['scripts/mailbox.ts'])] : []),
  ]
  let stopping = false
  const stop = (status) => {
    if (stopping) return
    stopping = true
    for (const child of children) child.kill('SIGTERM')
    setTimeout(() => process.exit(status), 4000).unref()
    Promise.all(
      children.map((child) => child.exitCode ?? new Promise((done) => child.on('exit', done))),
    ).then(() => process.exit(status))
  }
  for (const child of children) child.on('exit', (code) => stop(code ?? 0))
  process.on('SIGINT', () => stop(0))
  process.on('SIGTERM', () => stop(0))
}

/** Waits until the web server answers its health route. */
export async function untilHealthy(port, seconds = 90) {
  for (let i = 0; i < seconds * 2; i++) {
    try {
      const answer = await fetch(`http://localhost:${port}/api/health`)
      if (answer.ok) return true
    } catch (error) {
      if (error?.cause?.code !== 'ECONNREFUSED') throw error
    }
    await new Promise((done) => setTimeout(done, 500))
  }
  return false
}
