import { writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { expect, test } from 'vitest'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { layOut } from '@/lib/checks/text/lay-out'
import { auditFiles } from '@/lib/intake/audit-files'
import { readManuscript } from '@/lib/intake/read-manuscript'
import { defaultLimits } from '@/lib/intake/thread/run-thread'
import { writeManuscript } from '@/scripts/demo/write-manuscript'
import { makeFolder } from '../support/folder'
import { makePdf } from '../support/pdf'
import { makeScan, scanPages } from '../support/scan'

function put(bytes: Uint8Array): string {
  const path = join(makeFolder(), 'scan.pdf')
  writeFileSync(path, bytes)
  return path
}

const passage =
  'The tanks were lit for eight, twelve or sixteen hours a day, and the larvae were counted on the twelfth morning by a person who did not know the light. All three pairs of schedules were compared by t tests with a Bonferroni correction (m = 3, threshold .0167).'

/** Set in Source Serif at 10 points, as the demonstration's manuscripts are. */
const setPage = () =>
  writeManuscript({
    title: 'Light and settlement of oyster larvae',
    authors: 'Maren Holt',
    affiliation: 'Tern Harbour Marine Institute',
    runningHead: 'Light and settlement',
    layout: 'one column',
    lineNumbers: false,
    blocks: [
      { kind: 'heading', text: 'Methods' },
      { kind: 'paragraph', text: passage },
      { kind: 'heading', text: 'Results' },
      {
        kind: 'paragraph',
        text: 'Eight and sixteen hours differed significantly (t(28) = 3.12, p = .004), twelve and sixteen hours did not (t(28) = 2.31, p = .028), nor did eight and twelve hours (t(28) = 0.81, p = .425).',
      },
    ],
  })

const words = (text: string) =>
  text
    .replace(/[^\p{L}\p{N}.=<]+/gu, ' ')
    .trim()
    .split(' ')

test('a scanned page at 200 dots an inch, speckled and half a degree askew, is recognised word for word, or nearly', async () => {
  const scan = put(await makeScan(await setPage(), { askew: 0.5, speckles: 0.0004 }))
  const { document } = await readManuscript(scan)
  expect(document.pages.map((page) => page.recognised)).toEqual([true])
  const { prose } = layOut(document)
  const seen = new Set(words(prose.text))
  const missed = words(passage).filter((word) => !seen.has(word))
  expect(missed.length / words(passage).length).toBeLessThan(0.05)
  // In one paragraph and in order.
  expect(prose.text).toMatch(/counted on the twelfth morning by a person who did not know the light/)
})

test('numbers of a scanned page are reported with their place, marked, and never called a fault before they are checked', async () => {
  const original = await setPage()
  const scan = put(await makeScan(original))
  const seen: string[] = []
  const { audit } = await auditFiles(
    { manuscript: scan, table: null, rules: defaultHouseRules },
    { onProgress: (stage) => seen.push(stage) },
  )
  expect(seen).toContain('reading')
  expect(audit.reports.map(({ value }) => value)).toEqual([0.004, 0.028, 0.425])
  expect(audit.statistics.map(({ value }) => value)).toEqual([3.12, 2.31, 0.81])
  expect(audit.claims).toMatchObject([{ procedure: 'bonferroni', m: 3 }])
  // Where a number was recognised is where it was set, within about a character, whose widths are estimated.
  const { prose } = layOut((await readManuscript(put(original))).document)
  for (const { place } of audit.reports) {
    const printed = place.quote.slice(place.quote.lastIndexOf('.'))
    const at = prose.text.indexOf(printed)
    const [set] = prose.boxesOf(at, at + printed.length)
    const [box] = place.boxes
    for (const edge of [1, 2] as const)
      expect(Math.abs((set?.[edge] ?? 0) - (box?.[edge] ?? 0))).toBeLessThan(7)
  }
  expect(audit.findings.filter(({ severity }) => severity === 'major' || severity === 'minor')).toEqual([])
  expect(audit.findings.filter(({ rule }) => rule === 'unread-region')).toMatchObject([
    {
      severity: 'note',
      place: { page: 1 },
      says: 'Page 1 was recognised from its picture; check each number.',
    },
  ])
})

test('a scanned page among pages of text is recognised, the others are read as they are', async () => {
  const [picture] = await scanPages(await setPage())
  let page = 0
  const mixed = await makePdf({
    pages: [
      'Kelp held on to slate (p = .031) in the first week, and let go of it in the second week of the trial.',
      '',
    ],
    options: { size: 'A4', margin: 60 },
    draw: (doc) => {
      page++
      if (page === 2 && picture) doc.image(picture.png, 0, 0, { width: 595 })
    },
  })
  const { document } = await readManuscript(put(mixed))
  expect(document.pages.map(({ recognised = false }) => recognised)).toEqual([false, true])
  expect(layOut(document).prose.text).toContain('p = .031')
  expect(layOut(document).prose.text).toContain('p = .425')
})

test('a page turned by a quarter is recognised as it is shown', async () => {
  const [picture] = await scanPages(await setPage())
  const turned = await makePdf({
    pages: [''],
    options: { size: [841.89, 595.28], margin: 0 },
    draw: (doc) => {
      Object.assign(doc.page.dictionary.data, { Rotate: 90 })
      // The picture lies on its side in the file; the page is shown turned clockwise.
      doc
        .rotate(-90, { origin: [0, 0] })
        .image(picture?.png ?? Buffer.alloc(0), -595.28, 0, { width: 595.28 })
    },
  })
  const { document } = await readManuscript(put(turned))
  expect(document.pages[0]).toMatchObject({ rotation: 90, recognised: true })
  expect(layOut(document).prose.text).toContain('p = .425')
})

test('a page beyond the limits of recognition is named as unread', async () => {
  const pages = await makeScan(await setPage())
  const limits = { ...defaultLimits, recognition: { pages: 0, milliseconds: 1000 } }
  await expect(readManuscript(put(pages), limits)).rejects.toThrow('pictures of its pages and no text')
})

test('a drawing without words is not taken for text', async () => {
  const drawing = await makePdf({
    pages: [
      'All pairs were compared, and the bars of the figure show the means of the three groups with errors.',
      '',
    ],
    draw: (doc) =>
      void doc.rect(120, 300, 80, 200).rect(260, 250, 80, 250).rect(400, 380, 80, 120).fill('#446'),
  })
  const { document } = await readManuscript(put(drawing))
  expect(document.pages[1]?.recognised).toBeUndefined()
  expect(layOut(document).unread.map(({ page }) => page)).toEqual([2])
})
