/** Hands text to the browser as a file to keep; nothing goes to the server. */
export function saveFile(name: string, type: string, text: string): void {
  const url = URL.createObjectURL(new Blob([text], { type: `${type};charset=utf-8` }))
  const link = document.createElement('a')
  link.href = url
  link.download = name
  link.click()
  // The browser reads it after the click; a minute is more than it needs.
  setTimeout(() => URL.revokeObjectURL(url), 60_000)
}
