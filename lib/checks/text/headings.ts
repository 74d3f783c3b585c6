import type { SectionKind } from '../types'

/** Headings by their words. A heading is known whole, so that a title that begins so is none. */
const words: readonly [SectionKind, RegExp][] = [
  ['abstract', /^(?:(?:structured |extended )?abstract|summary|synopsis)$/i],
  [
    'references',
    /^(?:references?(?: and notes| cited| list)?|bibliography|literature(?: cited)?|works cited|cited literature)$/i,
  ],
  [
    'introduction',
    /^(?:(?:general )?introduction(?: and .+)?|backgrounds?(?: and (?:aims?|objectives?|purpose|rationale))?|rationale|aims?|objectives?|purpose)$/i,
  ],
  [
    'methods',
    /^(?:(?:general |data and |materials?,? (?:and|&) |patients?,? (?:and|&) |subjects?,? (?:and|&) |participants?,? (?:and|&) |animals?,? (?:and|&) |experimental |study |research |statistical |data |design and |sources and |statistical analysis )?(?:methods?|methodology|materials|design|procedures?|section|analys[ei]s|participants?|patients|subjects|setup|considerations|set-up)(?: and (?:materials?|procedures?|design|participants|patients|analys[ei]s|measures?|data|statistics))?|statistics|experimental|sample size(?: .+)?|randomi[sz]ation|data collection|statistical .{1,40}|computational details|outcome measures?|outcomes|procedure|measures)$/i,
  ],
  [
    'results',
    /^(?:(?:main |experimental |empirical )?results?(?: (?:and|&) (?:discussion|analysis|interpretation))?|findings)$/i,
  ],
  [
    'discussion',
    /^(?:(?:general |overall )?discussion(?: and .+)?|(?:summary and )?conclusions?(?: and .+)?|concluding remarks|limitations|strengths and limitations|interpretation)$/i,
  ],
  [
    'other',
    /^(?:acknowledge?ments?|funding(?: .+)?|(?:declaration of )?(?:competing|conflicts? of) interests?(?: statement)?|conflicts? of interest|declarations?|(?:authors?['’]?s? )?contributions?|credit .+|(?:data|code) (?:availability|accessibility)(?: statement)?|availability of .+|supplement(?:ary|al) .+|supporting information|appendi(?:x|ces)(?: .+)?|(?:list of )?abbreviations|ethics .+|ethical .+|consent .+|keywords?|key words|index terms|highlights|publisher['’]s note|figure legends?|figures?|tables?|disclosures?)$/i,
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
const runIn =
  /^(abstract|summary|keywords?|key words|index terms|acknowledge?ments?|funding|data availability)\s*[.:—–-]+\s*(?=\S)/i

/** A heading that runs into its paragraph: its text and the length it takes. */
export function readRunIn(text: string): { heading: string; length: number; kind: SectionKind } | null {
  const found = runIn.exec(text.slice(0, 60))
  if (!found) return null
  const heading = found[1] ?? ''
  const kind = /^(?:abstract|summary)/i.test(heading) ? 'abstract' : 'other'
  return { heading, length: found[0].length, kind }
}
