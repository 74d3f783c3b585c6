import { appendRun, childElements, firstChild, valueOf } from './elements'

type Level = 'superscript' | 'subscript' | null
type Piece = { text: string; level: Level }

/** The parts of an equation that are properties, not content. */
// "m:rPr", "m:fPr", "m:ctrlPr"
const properties = /Pr$/

/**
 * An equation (Office Math) as text on one line, the way a statistic is typed: a fraction as a/b, roots as √(x),
 * exponents raised, indices lowered. Runs of the text take the equation's place.
 */
export function writeEquation(equation: Element): Element[] {
  const pieces = readPieces(equation, null)
  const document = equation.ownerDocument
  return pieces.map(({ text, level }) => appendRun(document, text, level))
}

function readPieces(element: Element, level: Level): Piece[] {
  const read = writers[element.nodeName]
  if (read) return read(element, level)
  return childElements(element)
    .filter((child) => !properties.test(child.nodeName))
    .flatMap((child) => readPieces(child, level))
}

const part = (element: Element, name: string, level: Level): Piece[] => {
  const found = firstChild(element, name)
  return found ? readPieces(found, level) : []
}
const plain = (text: string, level: Level): Piece => ({ text, level })
const raised = (level: Level): Level => level ?? 'superscript'
const lowered = (level: Level): Level => level ?? 'subscript'

/** In brackets where it is more than a name or a number. */
function enclose(pieces: Piece[], level: Level): Piece[] {
  const text = pieces.map((piece) => piece.text).join('')
  return /^[\p{L}\p{N}.]*$/u.test(text) ? pieces : [plain('(', level), ...pieces, plain(')', level)]
}

const writers: Record<string, (element: Element, level: Level) => Piece[]> = {
  'm:t': (e, level) => [plain(e.textContent ?? '', level)],
  'w:t': (e, level) => [plain(e.textContent ?? '', level)],
  'm:f': (e, level) => [
    ...enclose(part(e, 'm:num', level), level),
    plain('/', level),
    ...enclose(part(e, 'm:den', level), level),
  ],
  'm:sSup': (e, level) => [...part(e, 'm:e', level), ...part(e, 'm:sup', raised(level))],
  'm:sSub': (e, level) => [...part(e, 'm:e', level), ...part(e, 'm:sub', lowered(level))],
  'm:sSubSup': (e, level) => [
    ...part(e, 'm:e', level),
    ...part(e, 'm:sub', lowered(level)),
    ...part(e, 'm:sup', raised(level)),
  ],
  'm:rad': (e, level) => [plain('√', level), ...enclose(part(e, 'm:e', level), level)],
  'm:limLow': (e, level) => [...part(e, 'm:e', level), ...part(e, 'm:lim', lowered(level))],
  'm:nary': (e, level) => [
    plain(sign(e, 'm:naryPr', 'm:chr', '∫'), level),
    ...part(e, 'm:sub', lowered(level)),
    ...part(e, 'm:sup', raised(level)),
    ...part(e, 'm:e', level),
  ],
  'm:d': (e, level) => {
    const between = sign(e, 'm:dPr', 'm:sepChr', '|')
    const inside = childElements(e)
      .filter((child) => child.nodeName === 'm:e')
      .flatMap((child, i) => [...(i > 0 ? [plain(between, level)] : []), ...readPieces(child, level)])
    return [
      plain(sign(e, 'm:dPr', 'm:begChr', '('), level),
      ...inside,
      plain(sign(e, 'm:dPr', 'm:endChr', ')'), level),
    ]
  },
}

function sign(element: Element, propertiesName: string, name: string, otherwise: string): string {
  const holder = firstChild(element, propertiesName)
  const given = holder && firstChild(holder, name)
  return given ? (valueOf(given, 'm:val') ?? otherwise) : otherwise
}
