import { cpSync, mkdirSync, rmSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'

const root = join(dirname(fileURLToPath(import.meta.url)), '..')
const from = join(root, 'node_modules', 'pdfjs-dist')
const to = join(root, 'public', 'pdfjs')

/** Places what the browser's PDF reader fetches while it works: its worker, character maps, fonts, decoders. Returns the exit status. */
export function copyPdfjs() {
  rmSync(to, { recursive: true, force: true })
  mkdirSync(to, { recursive: true })
  for (const folder of ['cmaps', 'standard_fonts', 'wasm', 'iccs']) {
    cpSync(join(from, folder), join(to, folder), { recursive: true })
  }
  cpSync(join(from, 'build', 'pdf.worker.min.mjs'), join(to, 'pdf.worker.min.mjs'))
  return 0
}

if (process.argv[1] === fileURLToPath(import.meta.url)) copyPdfjs()
