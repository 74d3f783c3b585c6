import { createHash, randomBytes } from 'node:crypto'
import { access, mkdir, rename, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { build } from 'esbuild'

const entry = fileURLToPath(new URL('./thread.ts', import.meta.url))
const root = fileURLToPath(new URL('../../../', import.meta.url))
const folder = join(root, 'node_modules', '.cache', 'assize')

let made: Promise<string> | undefined

/**
 * Path of the thread's code as one plain JavaScript file, made once a process. A thread that had to load
 * TypeScript by itself would take seconds before it opens the PDF; packages stay outside the bundle.
 */
export function getThreadFile(): Promise<string> {
  made ??= bundleThread()
  return made
}

async function bundleThread(): Promise<string> {
  const { outputFiles } = await build({
    entryPoints: [entry],
    absWorkingDir: root,
    bundle: true,
    write: false,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    packages: 'external',
    sourcemap: 'inline',
    logLevel: 'silent',
  })
  const code = outputFiles[0]?.contents ?? new Uint8Array()
  const path = join(folder, `thread-${createHash('sha256').update(code).digest('hex').slice(0, 24)}.mjs`)
  if (await exists(path)) return path
  await mkdir(folder, { recursive: true })
  const temporary = `${path}.${randomBytes(6).toString('hex')}`
  await writeFile(temporary, code)
  await rename(temporary, path)
  return path
}

async function exists(path: string): Promise<boolean> {
  try {
    await access(path)
    return true
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return false
    throw error
  }
}
