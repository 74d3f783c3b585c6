import { strToU8, zipSync, type Zippable } from 'fflate'

const namespaces =
  'xmlns:w="http://schemas.openxmlformats.org/wordprocessingml/2006/main" xmlns:m="http://schemas.openxmlformats.org/officeDocument/2006/math" xmlns:r="http://schemas.openxmlformats.org/officeDocument/2006/relationships" xmlns:mc="http://schemas.openxmlformats.org/markup-compatibility/2006" xmlns:v="urn:schemas-microsoft-com:vml" xmlns:wp="http://schemas.openxmlformats.org/drawingml/2006/wordprocessingDrawing" xmlns:a="http://schemas.openxmlformats.org/drawingml/2006/main" xmlns:pic="http://schemas.openxmlformats.org/drawingml/2006/picture"'
const kind = 'application/vnd.openxmlformats-officedocument.wordprocessingml'
const relations = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships'

type Given = {
  /** The XML inside the document's body. */
  body: string
  footnotes?: Record<number, string>
  /** More parts, or others in the place of these. */
  parts?: Zippable
}

/** A real Word document, by the parts that every word processor writes. */
export function makeWord({ body, footnotes = {}, parts = {} }: Given): Buffer {
  const notes = Object.entries(footnotes)
    .map(([id, xml]) => `<w:footnote w:id="${id}">${xml}</w:footnote>`)
    .join('')
  return Buffer.from(
    zipSync({
      '[Content_Types].xml': strToU8(
        `<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/><Default Extension="xml" ContentType="application/xml"/><Override PartName="/word/document.xml" ContentType="${kind}.document.main+xml"/><Override PartName="/word/styles.xml" ContentType="${kind}.styles+xml"/><Override PartName="/word/numbering.xml" ContentType="${kind}.numbering+xml"/><Override PartName="/word/footnotes.xml" ContentType="${kind}.footnotes+xml"/></Types>`,
      ),
      '_rels/.rels': strToU8(
        `<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships"><Relationship Id="rId1" Type="${relations}/officeDocument" Target="word/document.xml"/></Relationships>`,
      ),
      'word/_rels/document.xml.rels': strToU8(
        `<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships">${['styles', 'numbering', 'footnotes'].map((name, i) => `<Relationship Id="rId${i + 1}" Type="${relations}/${name}" Target="${name}.xml"/>`).join('')}</Relationships>`,
      ),
      'word/styles.xml': strToU8(
        `<w:styles ${namespaces}>${['Title', 'heading 1', 'heading 2'].map((name) => `<w:style w:type="paragraph" w:styleId="${name.replace('heading ', 'Heading')}"><w:name w:val="${name}"/></w:style>`).join('')}</w:styles>`,
      ),
      'word/numbering.xml': strToU8(
        `<w:numbering ${namespaces}><w:abstractNum w:abstractNumId="1"><w:lvl w:ilvl="0"><w:numFmt w:val="decimal"/></w:lvl></w:abstractNum><w:num w:numId="1"><w:abstractNumId w:val="1"/></w:num></w:numbering>`,
      ),
      'word/footnotes.xml': strToU8(`<w:footnotes ${namespaces}>${notes}</w:footnotes>`),
      'word/document.xml': strToU8(
        `<?xml version="1.0" encoding="UTF-8" standalone="yes"?><w:document ${namespaces}><w:body>${body}<w:sectPr/></w:body></w:document>`,
      ),
      ...parts,
    }),
  )
}

const escape = (text: string) => text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;')

/** A run of text; `properties` is the XML of its look. */
export function wordRun(text: string, properties = ''): string {
  return `<w:r>${properties === '' ? '' : `<w:rPr>${properties}</w:rPr>`}<w:t xml:space="preserve">${escape(text)}</w:t></w:r>`
}

/** A paragraph of text or of the XML of runs; `style` is "Title", "Heading1", … */
export function wordParagraph(content: string, style = ''): string {
  const inner = content.startsWith('<w:') || content.startsWith('<m:') ? content : wordRun(content)
  return `<w:p>${style === '' ? '' : `<w:pPr><w:pStyle w:val="${style}"/></w:pPr>`}${inner}</w:p>`
}

export const raised = '<w:vertAlign w:val="superscript"/>'
export const lowered = '<w:vertAlign w:val="subscript"/>'
export const italic = '<w:i/>'

export function wordTable(rows: string[][]): string {
  const cell = (text: string) => `<w:tc>${wordParagraph(text)}</w:tc>`
  return `<w:tbl>${rows.map((row) => `<w:tr>${row.map(cell).join('')}</w:tr>`).join('')}</w:tbl>`
}
