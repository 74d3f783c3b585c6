import { writeFile } from 'node:fs/promises'
import { parseArgs } from 'node:util'
import { audit } from '@/lib/checks/audit'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { writeAuditScript } from '@/lib/checks/r-script/audit-script'
import { layOut } from '@/lib/checks/text/lay-out'
import { readManuscript } from '@/lib/intake/read-manuscript'
import { readTableFile } from '@/lib/intake/table/read-table'
import { printAudit } from '@/lib/letters/print-audit'
import { isRefusal } from '@/lib/rules/refusal'

const usage =
  'usage: npm run --silent audit -- [--json | --r] [--alpha 0.05] [--copy pages.pdf] manuscript.pdf|.docx [results.csv|.tsv|.xlsx]'

try {
  process.exitCode = await run(process.argv.slice(2))
} catch (error) {
  console.error(error instanceof Error ? error.message : String(error))
  process.exitCode = 1
}

async function run(args: string[]): Promise<number> {
  const { values, positionals } = parseArgs({
    args,
    allowPositionals: true,
    options: {
      json: { type: 'boolean' },
      text: { type: 'boolean' },
      r: { type: 'boolean' },
      alpha: { type: 'string' },
      // where the pages of a Word document are written, which the report's page numbers are those of
      copy: { type: 'string' },
    },
  })
  const [manuscript, results] = positionals
  const alpha = values.alpha === undefined ? defaultHouseRules.alpha : Number(values.alpha)
  if (!manuscript || positionals.length > 2 || !(alpha > 0 && alpha < 1)) {
    console.error(usage)
    return 1
  }
  const read = await readOrSay(manuscript, (path) => readManuscript(path))
  if (!read) return 2
  const { document, readingCopy } = read
  if (values.copy !== undefined && readingCopy) await writeFile(values.copy, readingCopy)
  if (values.text) {
    await print(pagesOf(layOut(document).prose))
    return 0
  }
  const table = results ? await readOrSay(results, readTableFile) : null
  if (results && !table) return 2
  const result = audit(document, table, { ...defaultHouseRules, alpha })
  await print(
    values.r ? writeAuditScript(result) : values.json ? JSON.stringify(result, null, 1) : printAudit(result),
  )
  return 0
}

async function readOrSay<T>(path: string, read: (path: string) => Promise<T>): Promise<T | null> {
  try {
    return await read(path)
  } catch (error) {
    const missing = error instanceof Error && 'code' in error && error.code === 'ENOENT'
    if (!missing && !isRefusal(error)) throw error
    console.error(`${path}: ${missing ? 'There is no such file; please check the path.' : error.message}`)
    return null
  }
}

function pagesOf(prose: ReturnType<typeof layOut>['prose']): string {
  let page = 0
  let offset = 0
  const lines: string[] = []
  for (const paragraph of prose.text.split('\n\n')) {
    const on = prose.pageOf(offset)
    if (on !== page) lines.push(`--- page ${on} ---`)
    page = on
    lines.push(paragraph, '')
    offset += paragraph.length + 2
  }
  return lines.join('\n')
}

function print(text: string): Promise<void> {
  return new Promise((resolve, reject) =>
    process.stdout.write(`${text}\n`, (error) => (error ? reject(error) : resolve())),
  )
}
