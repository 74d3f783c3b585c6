/** What a manuscript or a form gave, as one line of Markdown that shows it as it is. */
export function escapeMarkdown(text: string): string {
  return (
    text
      .replace(/\s+/g, ' ')
      .trim()
      // Characters that begin something within a line: *emphasis*, _emphasis_, `code`, [link], ~~struck~~, <address>.
      .replace(/[\\`*_[\]~<]/g, '\\$&')
      // What begins a block at the start of a line: "# ", "> ", "- ", "+ ".
      .replace(/^[#>+-]/, '\\$&')
      // A number that would begin a list, such as "3. ".
      .replace(/^(\d+)([.)])(?=\s)/, '$1\\$2')
      // An entity such as &lt; that would be decoded.
      .replace(/&(?=#?\w+;)/g, '\\&')
  )
}
