import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, expect, test } from 'vitest'
import { audit, defaultHouseRules, writeAuditScript, writeFamilyScript } from '@/lib/checks'
import type { Audit } from '@/lib/checks/types'
import { readPdf } from '@/lib/intake/pdf/read-pdf'
import { readTableFile } from '@/lib/intake/table/read-table'
import * as stories from '@/scripts/demo/stories'
import { writeManuscript } from '@/scripts/demo/write-manuscript'
import { writeResults } from '@/scripts/demo/write-results'
import { makeFamily, makeReport } from '../support/audit'
import { runR, testWithR } from '../support/rscript'
import { makeSmallAudit } from '../support/small-audit'

// R computes again what an audit shows; the manuscripts are the demonstration's, whose numbers are invented.

const folder = mkdtempSync(join(tmpdir(), 'assize-scripts-'))
afterAll(() => rmSync(folder, { recursive: true, force: true }))

async function auditStory({ key, manuscript, results }: stories.Story): Promise<Audit> {
  const path = join(folder, `${key}.pdf`)
  writeFileSync(path, await writeManuscript(manuscript))
  const document = await readPdf(path)
  if (!results) return audit(document, null, defaultHouseRules)
  const table = join(folder, results.file)
  writeFileSync(table, writeResults(results))
  return audit(document, await readTableFile(table), defaultHouseRules)
}

// all but the one that stands for a protected file
const told = Object.values(stories).filter((story) => story !== stories.periwinkleShells)

for (const story of told) {
  testWithR(`R agrees with every number of the audit of ${story.key}`, async () => {
    expect(runR(writeAuditScript(await auditStory(story))).trim()).toBe('agrees')
  })
}

testWithR('R agrees with each family of an audit on its own', async () => {
  for (const story of [stories.hullCoatings, stories.seagrassSediment]) {
    const found = await auditStory(story)
    expect(found.families).not.toEqual([])
    for (const { id } of found.families) expect(runR(writeFamilyScript(found, id)).trim()).toBe('agrees')
  }
})

/** The audit with one number of its first family changed: R must notice. */
function tamper(found: Audit, change: (family: Audit['families'][number]) => void): string {
  const copy: Audit = structuredClone(found)
  const [family] = copy.families
  if (!family) throw new Error('the audit has no family')
  change(family)
  return writeAuditScript(copy)
}

testWithR('R names each number that is not what it computes, and ends with an error', async () => {
  const found = await auditStory(stories.kelpAttachment)
  const first = found.families[0]?.decisions[0]
  const wrong = [
    tamper(found, ({ decisions: [decision] }) => decision && (decision.adjusted[1] += 1e-6)),
    tamper(found, ({ decisions: [decision] }) => decision && (decision.significant = !decision.significant)),
    tamper(found, ({ decisions: [decision] }) => decision && (decision.survivesUpTo = 7777)),
    tamper(found, ({ fits }) => fits.push({ procedure: 'hommel', m: 3 })),
    tamper(found, ({ working }) => working?.tests[0]?.raw && (working.tests[0].raw[0] = 0.123)),
  ]
  expect(first).toBeDefined()
  const said = wrong.map((script) => runR(script.replace('quit(status = 1)', 'NULL')).trim())
  expect(said[0]).toMatch(/adjusted p, upper end \[1\]: shown .*, computed /)
  expect(said[1]).toMatch(/significant \(1\) or not \(0\) \[1\]/)
  expect(said[2]).toMatch(/kept up to m \[1\]: shown 7777/)
  expect(said[3]).toMatch(/fits: hommel 3 is shown, but does not fit/)
  expect(said[4]).toMatch(/raw p, lower end \[1\]: shown 0.123/)
  expect(said.every((text) => !text.includes('agrees'))).toBe(true)
  expect(() => runR(wrong[0] ?? '')).toThrow('Rscript ended with 1')
})

/** What could end a string or a comment of R, or is no text at all; from memory of R's grammar. */
const hostile = '")\nquit(status = 7) # \\" \\u \u0000 \ud800 {\r\n` χ² ≤ 10⁻⁵ 漢字 😀 %s %d'

testWithR('what a manuscript prints cannot reach R as code', () => {
  const report = makeReport('r1', 0.021)
  const audited: Audit = {
    ...makeSmallAudit(),
    document: { pages: 1, sha256: hostile, title: hostile },
    reports: [{ ...report, id: hostile, place: { ...report.place, quote: hostile } }],
    statistics: [],
    families: [
      makeFamily([{ ...report, id: hostile }], {
        label: hostile,
        working: {
          procedure: 'bonferroni',
          alpha: 0.05,
          groups: 0,
          sizes: [1],
          parts: [1],
          undone: { procedure: null, m: 1 },
          trusted: false,
          fitsUpTo: 0,
          tests: [
            {
              statistics: [],
              oneSided: false,
              witnesses: [{ id: hostile, is: 'raw' }],
              raw: [0.0205, 0.0215],
            },
          ],
        },
        decisions: [
          { report: hostile, called: true, adjusted: [0.0205, 0.0215], significant: true, survivesUpTo: 2 },
        ],
      }),
    ],
  }
  const script = writeAuditScript(audited)
  expect(/^[\x20-\x7e\n]*$/.test(script)).toBe(true)
  expect(runR(script).trim()).toBe('agrees')
})

test('an audit that was kept without its working says so, and leaves its families out', () => {
  const script = writeAuditScript({ ...makeSmallAudit(), families: [makeFamily([])] })
  expect(script).toContain('1 of the families were kept without how they were computed')
  expect(script).not.toContain('check_family(list(')
  expect(() => writeFamilyScript(makeSmallAudit(), 'f99')).toThrow(RangeError)
})
