import type { SectionKind } from '../types'

/** Headings by their words, most telling first. `starts`: the words a heading begins with. */
const words: readonly [SectionKind, RegExp][] = [
  ['abstract', /^(?:abstract|summary|synopsis|structured abstract)\b/i],
  [
    'references',
    /^(?:references?(?: and notes| cited| list)?|bibliography|literature(?: cited)?|works cited)$/i,
  ],
  ['introduction', /^(?:introduction|background|background and (?:aims?|objectives?)|rationale)\b/i],
  [
    'methods',
    /^(?:(?:materials?|patients?|subjects?|participants?|animals?|design|experimental)(?:,? | and |, and )?(?:and |& )?(?:methods?|procedures?|section|design)?|methods?|methodology|method|statistical (?:analys[ei]s|methods?|considerations)|statistics|data analysis|participants?|procedure|study design|sample size)\b/i,
  ],
  ['results', /^(?:results?|findings|results and discussion)\b/i],
  [
    'discussion',
    /^(?:discussion|general discussion|conclusions?|concluding remarks|limitations|interpretation)\b/i,
  ],
  [
    'other',
    /^(?:acknowledge?ments?|funding|competing interests?|conflicts? of interests?|declarations?|author contributions?|authors['’] contributions?|data availability|availability of data|supplementary|supporting information|appendix|abbreviations|ethics|keywords?|key words|highlights|computational details)\b/i,
  ],
]

/** What a heading announces, or null where its words tell nothing. Numbering is ignored. */
export function kindOfHeading(text: string): SectionKind | null {
  const bare = stripNumber(text)
  const joined = /^(?:\p{Lu} ){3,}\p{Lu}$/u.test(bare) ? bare.replace(/ /g, '') : bare
  for (const [kind, pattern] of words) if (pattern.test(joined)) return kind
  return null
}

// "3.", "3.1.", "II.", "A.", "2 ", "1.2 "
const numbering = /^(?:(?:\d{1,2}(?:\.\d{1,2}){0,3}\.?|[IVX]{1,5}\.|[A-H]\.)\s+)/

export function stripNumber(text: string): string {
  return text
    .trim()
    .replace(numbering, '')
    .replace(/[.:—–-]+$/, '')
    .trim()
}

export function isNumbered(text: string): boolean {
  return numbering.test(text.trim())
}

/** Depth of a heading's number: 1 for "3.", 2 for "3.1"; letters count as 2; 0 where there is none. */
export function depthOf(text: string): number {
  const found = /^(?:(\d{1,2}(?:\.\d{1,2})*)\.?|([IVX]{1,5})\.|([A-H])\.)\s/.exec(text.trim())
  if (!found) return 0
  if (found[1]) return found[1].split('.').length
  return found[2] ? 1 : 2
}

// "Abstract—", "Abstract.", "ABSTRACT:", "Background:", "Methods."
const runIn = /^(abstract|summary|keywords?|key words|index terms)\s*[.:—–-]+\s*/i

/** A heading that runs into its paragraph: its text and the length it takes. */
export function readRunIn(text: string): { heading: string; length: number; kind: SectionKind } | null {
  const found = runIn.exec(text)
  if (!found) return null
  const heading = found[1] ?? ''
  const kind = /^(?:abstract|summary)/i.test(heading) ? 'abstract' : 'other'
  return { heading, length: found[0].length, kind }
}
