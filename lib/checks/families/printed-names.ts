import { normaliseName } from './names'

/**
 * Leads a normal form (see `normaliseName`) to the name as the manuscript prints it: its first printing among `names`,
 * without article and closing noun. A capital that only begins a sentence or a cell goes where the same name is
 * printed without it, among the names or in `prose`. A form that is none of the names stays as it is.
 */
export function findPrintedNames(names: readonly string[], prose: string): (form: string) => string {
  const printings = new Map<string, string[]>()
  for (const name of names) {
    const form = normaliseName(name)
    const printed = printings.get(form) ?? []
    printings.set(form, printed)
    printed.push(trimName(name))
  }
  const found = new Map<string, string>()
  return (form) => {
    const known = found.get(form)
    if (known !== undefined) return known
    const all = printings.get(form) ?? []
    const shown = all[0] === undefined ? form : withoutCapital(all[0], all, prose)
    found.set(form, shown)
    return shown
  }
}

/** The name without what does not belong to it; a bare number or letter keeps the noun beside it, "group 1". */
function trimName(name: string): string {
  const whole = name.replace(/\s+/g, ' ').trim()
  const bare = whole
    // a bracketed remark behind it: "control (n = 12)"
    .replace(/\s*\([^)]*\)$/, '')
    // an article before it, a noun of groups behind it, signs around it: "the control group*"
    .replace(/[“”"'*†‡.,;:\s]+$/, '')
    .replace(/(?<=\S\s.*|\p{L}{2,})\s+(?:groups?|condition|arm)$/iu, '')
    .replace(/^[“”"'*†‡,;:\s]+/, '')
    .replace(/^(?:[Tt]he|an?)\s+(?=\S)/, '')
  return bare === '' ? whole : bare
}

function withoutCapital(name: string, all: readonly string[], prose: string): string {
  // a capital before small letters: "Dense meadow", "No cue", and neither "A10" nor "UV" nor "Mg"
  if (!/^\p{Lu}\p{Ll}(?:\p{Ll}|\s)/u.test(name)) return name
  const lowered = `${name.charAt(0).toLowerCase()}${name.slice(1)}`
  return all.includes(lowered) || holdsWord(prose, lowered) ? lowered : name
}

function holdsWord(text: string, word: string): boolean {
  for (let at = text.indexOf(word); at >= 0; at = text.indexOf(word, at + 1)) {
    const around = `${text.charAt(at - 1)} ${text.charAt(at + word.length)}`
    if (!/[\p{L}\d]/u.test(around)) return true
  }
  return false
}
