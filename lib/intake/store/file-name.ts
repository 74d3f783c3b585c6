const longest = 200

/** A file's own name as it may be shown: no folder, no control or direction characters, at most 200 long. */
export function cleanFileName(given: string, otherwise: string): string {
  const own = given.normalize('NFC').split(/[/\\]/).at(-1) ?? ''
  const name = own
    // Control characters, and those that turn the direction of writing (they can disguise an ending).
    .replace(/[\p{Cc}\u200e\u200f\u202a-\u202e\u2066-\u2069\ufeff]/gu, '')
    .replace(/\s+/gu, ' ')
    .trim()
  // Names such as ".", "..".
  if (name === '' || /^\.+$/.test(name)) return otherwise
  return shorten(name)
}

function shorten(name: string): string {
  const letters = [...name]
  if (letters.length <= longest) return name
  // The ending, such as ".pdf".
  const ending = /\.[^.]{1,10}$/u.exec(name)?.[0] ?? ''
  return letters.slice(0, longest - [...ending].length).join('') + ending
}
