import type { Token } from 'markdown-it'

const width = 76

/** A line's beginning: `first` on the first line within the frame, `rest` on every other. */
type Frame = { first: string; rest: string; count: number | null; begun: boolean }

/** Markdown's tokens as plain text of at most 76 columns, for the part of a mail that shows no HTML. */
export function renderText(tokens: readonly Token[]): string {
  const lines: string[] = []
  const frames: Frame[] = []
  let heading = false
  const write = (text: string, kept = false) => {
    const rest = frames.map((frame) => frame.rest).join('')
    const first = frames.map((frame) => (frame.begun ? frame.rest : frame.first)).join('')
    // An empty line belongs to what goes on, not to the quotation or item that begins after it.
    const between = frames.filter((frame) => frame.begun).map((frame) => frame.rest)
    for (const frame of frames) frame.begun = true
    const room = Math.max(20, width - rest.length)
    const rows = text.split('\n').flatMap((line) => (kept ? [line] : wrap(line, room)))
    if (lines.length > 0) lines.push(between.join('').trimEnd())
    lines.push(...rows.map((row, i) => ((i === 0 ? first : rest) + row).trimEnd()))
    return rows
  }
  for (const token of tokens) {
    switch (token.type) {
      case 'heading_open':
        heading = true
        break
      case 'heading_close':
        heading = false
        break
      case 'blockquote_open':
        frames.push({ first: '> ', rest: '> ', count: null, begun: false })
        break
      case 'bullet_list_open':
      case 'ordered_list_open':
        frames.push({ first: '', rest: '', count: Number(token.attrGet('start') ?? 1), begun: false })
        break
      case 'list_item_open':
        frames.push(openItem(frames.at(-1), token.markup))
        break
      case 'blockquote_close':
      case 'bullet_list_close':
      case 'ordered_list_close':
      case 'list_item_close':
        frames.pop()
        break
      case 'hr':
        write('-'.repeat(20))
        break
      case 'fence':
      case 'code_block':
        write(token.content.trimEnd().replace(/^/gm, '    '), true)
        break
      case 'inline': {
        const rows = write(renderInline(token.children ?? []))
        if (heading) lines.push('-'.repeat(Math.max(...rows.map((row) => row.length))))
        break
      }
    }
  }
  return `${lines.join('\n').trim()}\n`
}

function openItem(list: Frame | undefined, markup: string): Frame {
  // A bullet's markup is "-", "+" or "*"; a numbered item's is the character after its number.
  if (!list || list.count === null || /[-+*]/.test(markup))
    return { first: '- ', rest: '  ', count: null, begun: false }
  const label = `${list.count}${markup} `
  list.count += 1
  return { first: label, rest: ' '.repeat(label.length), count: null, begun: false }
}

function renderInline(tokens: readonly Token[]): string {
  let text = ''
  let link: { href: string; start: number } | null = null
  for (const token of tokens) {
    if (token.type === 'softbreak') text += ' '
    else if (token.type === 'hardbreak') text += '\n'
    else if (token.type === 'link_open') {
      link = { href: String(token.attrGet('href') ?? ''), start: text.length }
    } else if (token.type === 'link_close') {
      if (link && text.slice(link.start) !== link.href) text += ` (${link.href})`
      link = null
    } else text += token.content
  }
  return text
}

function wrap(text: string, room: number): string[] {
  const rows: string[] = []
  for (const word of text.split(' ')) {
    const last = rows.at(-1)
    if (last !== undefined && last.length + 1 + word.length <= room) rows[rows.length - 1] = `${last} ${word}`
    else rows.push(word)
  }
  return rows
}
