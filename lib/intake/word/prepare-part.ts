import { DOMParser, XMLSerializer } from '@xmldom/xmldom'
import { refuse } from '@/lib/rules/refusal'
import { damagedWord } from '../check/check-word'
import { childElements, firstChild, replaceBy, valueOf } from './elements'
import { writeEquation } from './equations'

/** What the reading copy leaves out, or takes one way of two. */
export type LeftOut = { pictures: number; embedded: number; changes: number }

/** Elements that only wrap text, which the converter would take out with all they hold. */
const wrappers = new Set(['w:fldSimple', 'w:dir', 'w:bdo'])
const taken = new Set(['w:ins', 'w:moveTo'])
const dropped = new Set(['w:del', 'w:moveFrom'])

/**
 * The XML of a part of the text, changed where the converter would lose or misread something: equations become
 * text, letters of the Symbol font are named as such, wrapped text is unwrapped, hidden text goes. Tracked
 * changes are taken as accepted.
 */
export function preparePart(xml: string, leftOut: LeftOut): string {
  // A document type could declare entities without end; no word processor writes one.
  if (/<!DOCTYPE/i.test(xml)) throw refuse('unreadable', damagedWord)
  const parser = new DOMParser({
    errorHandler: {
      warning: () => undefined,
      error: () => undefined,
      fatalError: () => {
        throw refuse('unreadable', damagedWord)
      },
    },
  })
  const document = parser.parseFromString(xml, 'text/xml') as Document | undefined
  if (!document?.documentElement) throw refuse('unreadable', damagedWord)
  // Without recursion: a hostile file nests without end.
  const open: Element[] = [document.documentElement]
  for (let element = open.pop(); element; element = open.pop())
    for (const next of change(element, leftOut).reverse()) open.push(next)
  return new XMLSerializer().serializeToString(document)
}

/** Changes an element and returns what is to be looked at next. */
function change(element: Element, leftOut: LeftOut): Element[] {
  const name = element.nodeName
  if (dropped.has(name)) {
    if (element.firstChild) leftOut.changes++
    return []
  }
  if (taken.has(name)) leftOut.changes++
  if (name === 'm:oMath') return put(element, writeEquation(element)).slice(0, 0)
  if (name === 'mc:AlternateContent') {
    const [first] = childElements(element)
    const chosen = firstChild(element, 'mc:Fallback') ?? first
    return put(element, chosen ? childElements(chosen) : [])
  }
  if (name === 'm:oMathPara' || wrappers.has(name))
    return put(
      element,
      childElements(element).filter((child) => !child.nodeName.endsWith('Pr')),
    )
  if (name === 'w:drawing' || name === 'w:pict' || name === 'w:object') return changeDrawing(element, leftOut)
  if (name === 'w:r') changeRun(element)
  return childElements(element)
}

function put(element: Element, others: Element[]): Element[] {
  replaceBy(element, others)
  return others
}

/** The text of a text box is kept; a picture or an embedded file leaves a word in its place. */
function changeDrawing(element: Element, leftOut: LeftOut): Element[] {
  const boxes = Array.from(element.getElementsByTagName('w:txbxContent'))
  if (boxes.length === 0) {
    const embedded = element.nodeName === 'w:object'
    if (embedded) leftOut.embedded++
    else leftOut.pictures++
    const word = element.ownerDocument.createElement('w:t')
    word.appendChild(element.ownerDocument.createTextNode(embedded ? '[embedded object]' : '[picture]'))
    return put(element, [word])
  }
  const pict = element.ownerDocument.createElement('w:pict')
  replaceBy(element, [pict])
  for (const box of boxes) pict.appendChild(box)
  return boxes
}

function changeRun(run: Element): void {
  const properties = firstChild(run, 'w:rPr')
  if (!properties) return
  if (firstChild(properties, 'w:vanish')) return replaceBy(run, [])
  const fonts = firstChild(properties, 'w:rFonts')
  if (fonts && valueOf(fonts, 'w:ascii') === 'Symbol')
    for (const text of childElements(run)) if (text.nodeName === 'w:t') nameSymbols(text)
}

/** Text in the Symbol font holds the font's own codes: "c" is drawn as χ. */
function nameSymbols(text: Element): void {
  const symbols = [...(text.textContent ?? '')].map((char) => {
    const symbol = text.ownerDocument.createElement('w:sym')
    const code = (char.codePointAt(0) ?? 0) & 0xff
    symbol.setAttribute('w:font', 'Symbol')
    symbol.setAttribute('w:char', code.toString(16).padStart(4, '0').toUpperCase())
    return symbol
  })
  replaceBy(text, symbols)
}
