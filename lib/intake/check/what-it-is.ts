import { open } from 'node:fs/promises'
import { fileTypeFromFile } from 'file-type'
import type { FileKind } from '@/lib/rules/words'

const remedies: Record<FileKind, string> = {
  manuscript: 'please save the manuscript as .docx or export it as PDF, and hand that in.',
  table: 'please save the results table as XLSX, CSV or TSV and hand that in.',
}

const formats: Record<string, string> = {
  pdf: 'a PDF',
  cfb: 'an older or password-protected Office file',
  docx: 'a Word document',
  xlsx: 'an Excel workbook',
  pptx: 'a presentation',
  odt: 'an OpenDocument text',
  ods: 'an OpenDocument spreadsheet',
  rtf: 'an RTF document',
  ps: 'a PostScript file',
  eps: 'a PostScript file',
  zip: 'a ZIP archive',
  gz: 'a compressed archive',
  'tar.gz': 'a compressed archive',
  rar: 'a compressed archive',
  '7z': 'a compressed archive',
}

/** One sentence that says what a file is by its content and what to do about it. */
export async function sayWhatItIs(path: string, kind: FileKind): Promise<string> {
  return sayInstead(await nameFormat(path), kind)
}

export function sayInstead(what: string, kind: FileKind): string {
  return `This file is ${what}, not ${kind === 'manuscript' ? 'a PDF or a Word document (.docx)' : 'a results table'}; ${remedies[kind]}`
}

async function nameFormat(path: string): Promise<string> {
  const type = await fileTypeFromFile(path)
  if (type) {
    const known = formats[type.ext]
    if (known) return known
    if (type.mime.startsWith('image/')) return `a picture (${type.ext.toUpperCase()})`
    if (type.mime.startsWith('video/') || type.mime.startsWith('audio/')) return 'a recording'
    return `of the kind ${type.ext.toUpperCase()}`
  }
  const head = await readHead(path, 1024)
  return head.includes(0) ? 'of an unknown kind' : nameText(head.toString('latin1'))
}

export const plainText = 'plain text'

/** What a text is by how it begins. */
export function nameText(text: string): string {
  const beginning = text
    .slice(0, 1024)
    .replace(/^\ufeff/, '')
    .trimStart()
    .toLowerCase()
  // The beginning of a web page: <!doctype html>, <html …>
  if (/^<(!doctype html|html|head|body)\b/.test(beginning)) return 'a web page'
  if (beginning.startsWith('<?xml') || beginning.startsWith('<svg')) return 'an XML file'
  if (beginning.startsWith('%!ps')) return 'a PostScript file'
  if (beginning.startsWith('{\\rtf')) return 'an RTF document'
  if (beginning.startsWith('%pdf-')) return 'a PDF'
  return plainText
}

export async function readHead(path: string, bytes: number): Promise<Buffer> {
  const handle = await open(path)
  try {
    const { buffer, bytesRead } = await handle.read(Buffer.alloc(bytes), 0, bytes, 0)
    return buffer.subarray(0, bytesRead)
  } finally {
    await handle.close()
  }
}

export async function readTail(path: string, bytes: number): Promise<Buffer> {
  const handle = await open(path)
  try {
    const { size } = await handle.stat()
    const from = Math.max(0, size - bytes)
    const { buffer, bytesRead } = await handle.read(Buffer.alloc(size - from), 0, size - from, from)
    return buffer.subarray(0, bytesRead)
  } finally {
    await handle.close()
  }
}
