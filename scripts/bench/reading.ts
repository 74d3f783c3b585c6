/**
 * Prints how long a paper takes to be read and audited, beside the bare extraction of its text by the same reader of
 * PDFs in the same process, and beside `pdftotext` where it is installed. Papers are made here: two columns, tables,
 * statistics in sentences. Also a results table of 20,000 rows. One process after another: nothing is measured twice.
 */
import { spawnSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs'
import { median } from 'simple-statistics'
import { audit } from '@/lib/checks/audit'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { readPages } from '@/lib/intake/pdf/open-document'
import { readTableFile } from '@/lib/intake/table/read-table'
import { writeManuscript, type Block } from '@/scripts/demo/write-manuscript'

const rounds = 3

/** Sections until the paper has its pages; every second one has a table of all pairs. */
async function writePaper(pages: number): Promise<Buffer> {
  const section = (i: number): Block[] => [
    { kind: 'heading', text: i === 0 ? 'Methods' : `Results of week ${i}` },
    {
      kind: 'paragraph',
      text: `Tanks were stocked in week ${i} and counted each morning by the same person, and the counts were entered twice and compared at the end, so that a slip of the pen could be mended while the sheet was still at hand. All six pairs of surfaces were compared by t tests with a Bonferroni correction (m = 6). `.repeat(
        3,
      ),
    },
    {
      kind: 'paragraph',
      text: [1, 2, 3, 4]
        .map(
          (j) =>
            `Slate and rope differed significantly in trait ${i}-${j} (t(38) = ${(2 + ((i * 7 + j) % 20) / 10).toFixed(2)}, p = .0${10 + ((i + j * 3) % 40)}), while shell and rope did not (t(38) = 1.${10 + j}, p = .2${10 + j}).`,
        )
        .join(' '),
    },
    ...(i % 2 === 0
      ? [
          {
            kind: 'table' as const,
            caption: `Table ${i / 2 + 1}. Pairwise comparisons of the four surfaces.`,
            header: ['Comparison', 't(38)', 'p', 'Adjusted p'],
            rows: [
              'Slate – rope',
              'Slate – shell',
              'Slate – wood',
              'Rope – shell',
              'Rope – wood',
              'Shell – wood',
            ].map((pair, j) => [pair, `${j}.4${j}`, `.02${j}`, `.1${j}2`]),
          },
        ]
      : []),
  ]
  // About three sections fill a page of two columns.
  return writeManuscript({
    title: 'Attachment of kelp to four surfaces',
    authors: 'Maren Holt',
    affiliation: 'Tern Harbour Marine Institute',
    runningHead: 'Attachment of kelp',
    layout: 'two columns',
    lineNumbers: false,
    blocks: Array.from({ length: Math.round(pages * 2.02) }, (_, i) => section(i)).flat(),
  })
}

async function extract(bytes: Uint8Array): Promise<number> {
  const loading = getDocument({ data: new Uint8Array(bytes), verbosity: 0 })
  const pdf = await loading.promise
  for (let number = 1; number <= pdf.numPages; number++) await (await pdf.getPage(number)).getTextContent()
  await loading.destroy()
  return pdf.numPages
}

function readWhole(bytes: Uint8Array) {
  return readPages(new Uint8Array(bytes), {
    maxPages: 2000,
    recognition: { pages: 0, milliseconds: 0 },
    onPage: () => undefined,
    onRecognise: () => undefined,
  })
}

type Times = { pages: number; bare: number; reading: number; judging: number; bytes: number }

/** Milliseconds of processor time: other work on the machine does not count. */
async function measure<T>(work: () => Promise<T> | T): Promise<{ value: T; ms: number }> {
  const start = process.cpuUsage()
  const value = await work()
  const { user, system } = process.cpuUsage(start)
  return { value, ms: (user + system) / 1000 }
}

async function timePaper(bytes: Uint8Array): Promise<Times> {
  const all: Times[] = []
  for (let i = 0; i < rounds; i++) {
    const bare = await measure(() => extract(bytes))
    const reading = await measure(() => readWhole(bytes))
    const judging = await measure(() => audit(reading.value, null, defaultHouseRules))
    all.push({
      pages: bare.value,
      bare: bare.ms,
      reading: reading.ms,
      judging: judging.ms,
      bytes: process.memoryUsage().rss,
    })
  }
  // The first round warms the engine up, which a worker's thread does not get: it is printed, not dropped.
  const first = all[0]
  if (first)
    console.log(
      `${String(first.pages).padStart(5)} pages cold: text ${first.bare.toFixed(0)} ms, read ${first.reading.toFixed(0)}, audited ${first.judging.toFixed(0)}`,
    )
  const middle = (key: keyof Times) => median(all.map((one) => one[key]))
  return {
    pages: middle('pages'),
    bare: middle('bare'),
    reading: middle('reading'),
    judging: middle('judging'),
    bytes: Math.max(...all.map((one) => one.bytes)),
  }
}

function timePdftotext(path: string): string {
  const start = performance.now()
  const { status } = spawnSync('pdftotext', ['-layout', path, '-'])
  return status === 0 ? `${(performance.now() - start).toFixed(0)} ms (wall)` : 'not installed'
}

const folder = mkdtempSync(join(tmpdir(), 'assize-bench-'))
const asked = process.argv.slice(2).map(Number)
try {
  for (const size of asked.length > 0 ? asked : [5, 12, 60, 300]) {
    const bytes = await writePaper(size)
    const path = join(folder, `${size}.pdf`)
    writeFileSync(path, bytes)
    const { pages, bare, reading, judging, bytes: memory } = await timePaper(bytes)
    const share = ((reading + judging) / bare).toFixed(2)
    console.log(
      `${String(pages).padStart(5)} pages: text ${bare.toFixed(0)} ms, read ${reading.toFixed(0)}, audited ${judging.toFixed(0)}; whole = ${share} × text; pdftotext ${timePdftotext(path)}; at most ${(memory / 1e6).toFixed(0)} MB`,
    )
  }
  const rows = Array.from(
    { length: 20_000 },
    (_, i) => `trait ${i % 500},${i % 40} vs control,${(i % 300) / 100},38,0.${String(1000 + (i % 8999))}`,
  )
  const table = join(folder, 'results.csv')
  writeFileSync(table, ['outcome,comparison,t,df,p', ...rows].join('\n'))
  const small = await readWhole(await writePaper(2))
  const { ms } = await measure(async () => audit(small, await readTableFile(table), defaultHouseRules))
  console.log(`20,000 rows of results: ${ms.toFixed(0)} ms`)
} finally {
  rmSync(folder, { recursive: true, force: true })
}
