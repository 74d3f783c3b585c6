import { spawnSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { test } from 'vitest'

/** Whether this machine can run R; without it the tests that need it are skipped, and say so once a file. */
export const hasR = spawnSync('Rscript', ['--version']).status === 0

if (!hasR) process.stdout.write('skipped: Rscript is not installed, so nothing is held against R here\n')

/** A test that is skipped where Rscript is missing. */
export const testWithR = test.skipIf(!hasR)

/** Runs an R script from a file and gives what it printed; throws with R's own words where it fails. */
export function runR(script: string): string {
  const folder = mkdtempSync(join(tmpdir(), 'assize-r-'))
  try {
    const file = join(folder, 'script.R')
    writeFileSync(file, script)
    const { status, stdout, stderr } = spawnSync('Rscript', ['--vanilla', file], {
      encoding: 'utf8',
      maxBuffer: 1 << 28,
      cwd: folder,
    })
    if (status !== 0) throw new Error(`Rscript ended with ${status}: ${stderr}`)
    return stdout
  } finally {
    rmSync(folder, { recursive: true, force: true })
  }
}
