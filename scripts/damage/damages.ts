import { strFromU8, strToU8, unzipSync, zipSync } from 'fflate'
import type { Format } from './fixtures'
import type { Random } from './random'

type Fixtures = Record<Format, Buffer>
type Damage = {
  name: string
  to: readonly Format[]
  damage: (fixtures: Fixtures, format: Format, random: Random) => Buffer
}

const all = ['pdf', 'docx', 'xlsx', 'csv'] as const
const zipped = ['docx', 'xlsx'] as const

/** A text put into another at a random place. */
function insert(bytes: Buffer, what: Buffer, random: Random): Buffer {
  const at = random.below(bytes.length)
  return Buffer.concat([bytes.subarray(0, at), what, bytes.subarray(at)])
}

/** Changes the text of one part of a zipped file. */
function changePart(bytes: Buffer, part: RegExp, change: (text: string) => string): Buffer {
  const parts = unzipSync(bytes)
  for (const [name, content] of Object.entries(parts))
    if (part.test(name)) parts[name] = strToU8(change(strFromU8(content)))
  return Buffer.from(zipSync(parts))
}

const mainPart: Record<(typeof zipped)[number], RegExp> = {
  docx: /^word\/document\.xml$/,
  xlsx: /^xl\/worksheets\/sheet1\.xml$/,
}
const partOf = (format: Format) => (format === 'xlsx' ? mainPart.xlsx : mainPart.docx)

/** Writes a number of a PDF as another of the same length, so that nothing else moves. */
function replaceNumber(bytes: Buffer, random: Random, by: (digits: number) => string): Buffer {
  const text = bytes.toString('latin1')
  const numbers = [...text.matchAll(/\b\d{1,6}\b/g)]
  const chosen = numbers[random.below(Math.max(1, numbers.length))]
  if (!chosen) return bytes
  return Buffer.from(
    text.slice(0, chosen.index) + by(chosen[0].length) + text.slice(chosen.index + chosen[0].length),
    'latin1',
  )
}

const bombs = new Map<string, Buffer>()

/** A part that unpacks to so many megabytes of zeros; made once, for making it takes longer than refusing it. */
function makeBomb(bytes: Buffer, format: Format, name: string, megabytes: number): Buffer {
  const key = `${format} ${name} ${megabytes}`
  const known = bombs.get(key)
  if (known) return known
  const parts = { ...unzipSync(bytes), [name]: new Uint8Array(megabytes * 1024 * 1024) }
  const made = Buffer.from(zipSync(parts, { level: 1 }))
  bombs.set(key, made)
  return made
}

export const DAMAGES: readonly [Damage, ...Damage[]] = [
  {
    name: 'bits flipped',
    to: all,
    damage: (fixtures, format, random) => {
      const bytes = Buffer.from(fixtures[format])
      for (let i = 0; i <= random.below(20); i++) {
        const at = random.below(bytes.length)
        bytes[at] = (bytes[at] ?? 0) ^ (1 << random.below(8))
      }
      return bytes
    },
  },
  {
    name: 'cut off',
    to: all,
    damage: (fixtures, format, random) => fixtures[format].subarray(0, random.below(fixtures[format].length)),
  },
  {
    name: 'cut off, its end put back',
    to: ['pdf'],
    damage: (fixtures, _format, random) =>
      Buffer.concat([
        fixtures.pdf.subarray(0, random.below(fixtures.pdf.length)),
        Buffer.from('\nstartxref\n9\n%%EOF\n'),
      ]),
  },
  {
    name: 'a stretch written twice',
    to: all,
    damage: (fixtures, format, random) => {
      const bytes = fixtures[format]
      const from = random.below(bytes.length)
      return insert(bytes, bytes.subarray(from, from + random.below(2000)), random)
    },
  },
  {
    name: 'a stretch of zeros',
    to: all,
    damage: (fixtures, format, random) => {
      const bytes = Buffer.from(fixtures[format])
      const from = random.below(bytes.length)
      return bytes.fill(0, from, Math.min(bytes.length, from + random.below(500)))
    },
  },
  {
    name: 'another object spliced in',
    to: ['pdf'],
    damage: (fixtures, _format, random) =>
      insert(
        fixtures.pdf,
        Buffer.from(
          random.one([
            '\n5 0 obj\n<< /Type /Pages /Kids [5 0 R] /Count 1 /Parent 5 0 R >>\nendobj\n',
            '\n7 0 obj\n<< /Type /Page /Contents [7 0 R 7 0 R] >>\nendobj\n',
            `\n8 0 obj\n${'['.repeat(20_000)}\nendobj\n`,
            `\n9 0 obj\n${'<< /A '.repeat(5_000)}\nendobj\n`,
            '\n4 0 obj\n<< /Length 99999999 /Filter [/FlateDecode /FlateDecode /ASCIIHexDecode] >>\nstream\nxx\nendstream\nendobj\n',
          ]),
        ),
        random,
      ),
  },
  {
    name: 'a reference that leads to itself',
    to: ['pdf'],
    damage: (fixtures, _format, random) => {
      const text = fixtures.pdf.toString('latin1')
      const references = [...text.matchAll(/\b(\d+) 0 R\b/g)]
      const [a, b] = [
        references[random.below(references.length)],
        references[random.below(references.length)],
      ]
      if (!a || !b) return fixtures.pdf
      const put = (b[1] ?? '').padStart((a[1] ?? '').length, '0').slice(0, (a[1] ?? '').length)
      return Buffer.from(text.slice(0, a.index) + put + text.slice(a.index + put.length), 'latin1')
    },
  },
  {
    name: 'a huge number',
    to: ['pdf'],
    damage: (fixtures, _format, random) =>
      replaceNumber(fixtures.pdf, random, (digits) => '9'.repeat(digits)),
  },
  {
    name: 'a number that is none',
    to: ['pdf'],
    damage: (fixtures, _format, random) =>
      replaceNumber(fixtures.pdf, random, (digits) => random.one(['-', '.', 'e', ' ']).repeat(digits)),
  },
  {
    name: 'another ending',
    to: all,
    damage: (fixtures, _format, random) => fixtures[random.one(all)],
  },
  {
    name: 'nests without end',
    to: zipped,
    damage: (fixtures, format, random) => {
      const depth = 500 + random.below(20_000)
      return changePart(fixtures[format], partOf(format), (text) =>
        text.replace(
          format === 'docx' ? '<w:p>' : '<row',
          `${'<w:sdt><w:sdtContent>'.repeat(depth)}${random.one(['', '</w:sdtContent></w:sdt>'.repeat(depth)])}$&`,
        ),
      )
    },
  },
  {
    name: 'its XML broken',
    to: zipped,
    damage: (fixtures, format, random) =>
      changePart(fixtures[format], random.one([/\.xml$/, /\.rels$/, partOf(format)]), (text) => {
        const at = random.below(text.length)
        return (
          text.slice(0, at) +
          random.one(['<', '>', '&', '"', '\u0000', '<w:tbl>', '</w:p>', '&#xD800;']) +
          text.slice(at)
        )
      }),
  },
  {
    name: 'entities that grow',
    to: zipped,
    damage: (fixtures, format) =>
      changePart(fixtures[format], partOf(format), (text) =>
        text.replace(
          /^(<\?xml[^>]*>)?/,
          '$1<!DOCTYPE x [<!ENTITY a "aaaaaaaaaa"><!ENTITY b "&a;&a;&a;&a;&a;&a;&a;&a;"><!ENTITY c "&b;&b;&b;&b;&b;&b;">]>',
        ),
      ),
  },
  {
    name: 'a part missing',
    to: zipped,
    damage: (fixtures, format, random) => {
      const parts = unzipSync(fixtures[format])
      const names = Object.keys(parts)
      delete parts[names[random.below(names.length)] ?? '']
      return Buffer.from(zipSync(parts))
    },
  },
  {
    name: 'unpacks without end',
    to: zipped,
    damage: (fixtures, format, random) => {
      const name = random.one(['word/document.xml', 'xl/worksheets/sheet1.xml', 'media/picture.png'])
      return makeBomb(fixtures[format], format, name, random.one([45, 310]))
    },
  },
  {
    name: 'numbers and formulas without sense',
    to: ['xlsx'],
    damage: (fixtures, _format, random) =>
      changePart(fixtures.xlsx, mainPart.xlsx, (text) =>
        text.replaceAll(/<c r="([A-Z]+)2"[^>]*>.*?<\/c>/g, (_cell, column: string) =>
          random.one([
            `<c r="${column}2"><v>1e400</v></c>`,
            `<c r="${column}2"><v>-1.7e308</v></c>`,
            `<c r="${column}2"><f>A1+${column}2</f></c>`,
            `<c r="${column}2" t="e"><v>#REF!</v></c>`,
            `<c r="${column}2" t="s"><v>99999999</v></c>`,
            `<c r="XFD1048576"><v>0.01</v></c>`,
          ]),
        ),
      ),
  },
  {
    name: 'a million rows',
    to: ['csv'],
    damage: (_fixtures, _format, random) =>
      Buffer.from(`a,p\n${random.one(['x,.02\n', ',\n', '\n', '"a\n'])}`.padEnd(6_000_000, 'x,.02\n')),
  },
  {
    name: 'cells without sense',
    to: ['csv'],
    damage: (fixtures, _format, random) =>
      Buffer.from(
        fixtures.csv
          .toString()
          .split(',')
          .map((cell) =>
            random.below(3) > 0
              ? cell
              : random.one([
                  '1e999',
                  '-0',
                  'NaN',
                  '=1+1',
                  '"',
                  '""""',
                  ','.repeat(2000),
                  '9'.repeat(5000),
                  '< .'.repeat(3000),
                  'p'.repeat(20_000),
                  '(((((('.repeat(2000),
                  '\u202e.05',
                ]),
          )
          .join(','),
      ),
  },
]
