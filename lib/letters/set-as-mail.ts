/** Styles of a mail: those of the desk's letters, in fonts that a mail program has. */
const style = `
body { margin: 0; padding: 24px 16px; background: #f7f4ed; color: #17242c; font: 16px/1.5 'Source Serif 4', Georgia, serif; }
main { max-width: 620px; margin: 0 auto; padding: 24px 32px; background: #fffdf8; border: 1px solid #d8d2c4; }
h1, h2 { margin: 28px 0 8px; font-size: 18px; line-height: 1.3; }
h3 { margin: 24px 0 6px; font-size: 16px; line-height: 1.3; }
p { margin: 0 0 12px; }
blockquote { margin: 0 0 12px; padding-left: 14px; border-left: 2px solid #b9b19f; color: #46535a; }
a { color: #0b5563; }
`

/** A fragment of HTML as a whole page for a mail program: one column, readable on a telephone, nothing loaded. */
export function setAsMail(subject: string, html: string): string {
  const title = subject.replaceAll('&', '&amp;').replaceAll('<', '&lt;')
  return [
    '<!doctype html>',
    '<html lang="en"><head><meta charset="utf-8">',
    '<meta name="viewport" content="width=device-width, initial-scale=1">',
    `<title>${title}</title><style>${style}</style></head>`,
    `<body><main>${html}</main></body></html>`,
  ].join('\n')
}
