import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'
import { openSync } from 'fontkit'
import type PDFDocument from 'pdfkit'

type Doc = InstanceType<typeof PDFDocument>

const require = createRequire(import.meta.url)
const serif = join(dirname(require.resolve('@fontsource/source-serif-4/package.json')), 'files')
const sans = join(dirname(require.resolve('pdfjs-dist/package.json')), 'standard_fonts')

export type Look = { bold: boolean; italic: boolean }

/** Scripts in which the text face comes, the usual one first; what none has is set in a face with signs and more letters. */
const scripts = ['latin', 'latin-ext', 'greek', 'cyrillic', 'vietnamese'] as const

const sansNames: Record<string, string> = {
  regular: 'LiberationSans-Regular.ttf',
  bold: 'LiberationSans-Bold.ttf',
  italic: 'LiberationSans-Italic.ttf',
  'bold italic': 'LiberationSans-BoldItalic.ttf',
}

export type Faces = {
  /** Stretches of a text by the font that has their characters; a character that no font has becomes '□'. */
  split: (text: string, look: Look) => { font: string; text: string }[]
  widthOf: (text: string, look: Look, size: number) => number
}

/** The fonts of a reading copy; each is opened when it is first needed. */
export function openFaces(doc: Doc): Faces {
  const opened = new Set<string>()
  const covers = new Map<string, boolean>()
  const widths = new Map<string, number>()
  const fontsOf = (look: Look) => {
    const [weight, style] = [look.bold ? '700' : '400', look.italic ? 'italic' : 'normal']
    const name = [...(look.bold ? ['bold'] : []), ...(look.italic ? ['italic'] : [])].join(' ') || 'regular'
    return [
      ...scripts.map((script) => `source-serif-4-${script}-${weight}-${style}.woff`),
      sansNames[name] ?? 'LiberationSans-Regular.ttf',
    ]
  }
  const open = (font: string) => {
    if (!opened.has(font)) doc.registerFont(font, pathOf(font))
    opened.add(font)
    return doc.font(font)
  }
  const has = (font: string, char: string): boolean => {
    const key = `${font}|${char}`
    const known = covers.get(key)
    if (known !== undefined) return known
    const found = readFace(font).hasGlyphForCodePoint(char.codePointAt(0) ?? 0)
    covers.set(key, found)
    return found
  }
  const findFont = (char: string, look: Look) => fontsOf(look).find((font) => has(font, char))

  const split = (text: string, look: Look) => {
    const parts: { font: string; text: string }[] = []
    for (const char of text) {
      const font = findFont(char, look)
      const last = parts.at(-1)
      if (font && last?.font === font) last.text += char
      else if (font) parts.push({ font, text: char })
      else
        for (const part of splitCompatible(char, look)) {
          const before = parts.at(-1)
          if (before?.font === part.font) before.text += part.text
          else parts.push(part)
        }
    }
    return parts
  }
  /** "𝑝" is set as p, "ﬂ" as fl. */
  const splitCompatible = (char: string, look: Look): { font: string; text: string }[] => {
    const other = char.normalize('NFKC')
    const found = other === char ? undefined : findFont(other.charAt(0), look)
    return found ? [{ font: found, text: other }] : [{ font: 'LiberationSans-Regular.ttf', text: '□' }]
  }
  const widthOf = (text: string, look: Look, size: number) => {
    const key = `${look.bold ? 'b' : ''}${look.italic ? 'i' : ''}|${text}`
    let width = widths.get(key)
    if (width === undefined) {
      width = split(text, look).reduce(
        (sum, part) => sum + open(part.font).fontSize(1000).widthOfString(part.text),
        0,
      )
      widths.set(key, width)
    }
    return (width * size) / 1000
  }
  return {
    split: (text, look) => {
      const parts = split(text, look)
      for (const { font } of parts) open(font)
      return parts
    },
    widthOf,
  }
}

const faces = new Map<string, ReturnType<typeof readFace>>()

function readFace(name: string): { hasGlyphForCodePoint: (code: number) => boolean } {
  const known = faces.get(name)
  if (known) return known
  const file = openSync(pathOf(name))
  // A collection of fonts is none of ours.
  if (!('hasGlyphForCodePoint' in file)) throw new Error(`${name} holds no font`)
  faces.set(name, file)
  return file
}

function pathOf(name: string): string {
  return join(name.endsWith('.ttf') ? sans : serif, name)
}
