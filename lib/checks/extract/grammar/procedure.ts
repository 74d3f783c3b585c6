import type { ClaimedProcedure } from '../../vocabulary'

/**
 * How authors write the procedures, read on folded text. Rows are tried in this order and what one has taken is
 * hidden from the next, so that 'Benjamini–Hochberg' is never read as Hochberg nor 'Holm–Bonferroni' as Bonferroni.
 * `procedure` null: looks like a correction and is none.
 */
type Wording = { procedure: ClaimedProcedure | null; form: RegExp }

/** Hyphen, dash, slash, space or nothing between two parts of a name. */
const J = String.raw`[\s/–-]*(?:and\s|&\s)?`

/** 'Bonferroni' and its misspellings: Bonferonni, bonforoni, Bonferoni, Benferroni, Bonfferoni, Bon-ferroni. */
const BONFERRONI = String.raw`\b(?:Bon|Ben)-?\s?f{1,2}[eo]r{1,2}o?n{1,2}i(?:'?s)?(?![a-z]*ni\b)`
/** Holm, Holm's, Holms, Hölm; not 'Holmes' nor 'Holme Lake'. */
const HOLM = String.raw`\bH[oö]lm(?:'s|s'|s|e)?\b`
/** Šidák, Sidak, Sidack, Siddak; damaged: Sˇida´k, ˇSid´ak, S ˇ idák. */
const SIDAK = String.raw`(?:ˇ\s?)?[SŠ]\s?ˇ?\s?[iı]dd?\s?'?[aáàâ]\s?'?[ck]{1,2}(?:'s)?\b`
const BENJAMINI = String.raw`\bB[ei]nj[ai]min[i]?(?:'s)?`
const TUKEY = String.raw`\b(?:T\s?u(?:c|r)?key|Tuckey|Turkey)(?:'?s)?\b`
const DUNNETT = String.raw`\b(?:Dun{1,2}et{1,2})(?:'?s)?\b`
const DUNN = String.raw`\bDunn(?:'s|s')?\b`

const w = (procedure: ClaimedProcedure | null, ...forms: string[]): Wording[] =>
  forms.map((form) => ({ procedure, form: new RegExp(form, 'gi') }))

export const WORDINGS: readonly Wording[] = [
  // --- look like a correction, are none
  // 'Freeman–Tukey transformation', 'Tukey fences', 'Tukey biweight', 'Tukey ladder', "Tukey's boxplot", 'Tukey mean-difference'
  ...w(
    null,
    String.raw`freeman${J}tukey`,
    String.raw`${TUKEY}\s?(?:style\s)?(?:fences?|biweight|bisquare|window|outliers?|box|lambda|ladder|depth|mean-difference|criterion for outliers|method for outliers|hinges|g-and-h|test for (?:non-?additivity|additivity))`,
  ),
  // 'Greenhouse–Geisser correction', 'Yates correction', 'Welch', 'continuity', 'Bessel', 'correction for sphericity'
  ...w(
    null,
    String.raw`greenhouse${J}geisser`,
    String.raw`huynh${J}feldt`,
    String.raw`\byates`,
    String.raw`continuity[\s-]correct\w*`,
  ),
  // 'Turkey' the country or the bird: no test, post hoc or HSD beside it
  ...w(
    null,
    String.raw`\bTurkey(?!'?s?\s?(?:-?\s?kramer|test|post|hsd|honest|multiple|range|pairwise|comparison))`,
  ),
  // --- false discovery rate, by name
  ...w(
    'by',
    String.raw`${BENJAMINI}${J}Y[eu]kut[ie]{2}l[iy]`,
    String.raw`\bBY[\s-](?:adjust|correct|procedure|method)\w*`,
  ),
  ...w(
    'bky',
    String.raw`${BENJAMINI}[,\s–-]*(?:and\s|&\s)?Krieger[,\s–-]*(?:and\s|&\s)?Y[eu]kut[ie]{2}l[iy]`,
    String.raw`two-?\s?stage (?:linear )?step-?\s?up`,
    String.raw`two-?\s?stage benjamini\S*(?:${J}hochberg)?`,
    String.raw`\bBKY\b`,
  ),
  ...w('storey', String.raw`\bStorey(?:'s)?(?:${J}Tibshirani)?(?:\s(?:q-?\s?values?|method|procedure|FDR))?`),
  ...w(
    'bh',
    String.raw`${BENJAMINI}\s?(?:,|${J})\s?(?:Y\.?\s?)?Ho(?:t)?ch?b[eu]rg(?:'s)?`,
    String.raw`\bB-?H[\s-](?:FDR|adjust|correct|procedure|method|step)\w*`,
    String.raw`\b(?:FDR|false discovery rate)\s?\(?\s?BH\b`,
    String.raw`\bBH\b(?=[^a-z]{0,3}(?:adjusted|corrected|FDR|p\b))`,
    String.raw`(?:method|adjust\w*|correct\w*|procedure)\s?\(\s?BH\s?\)`,
    String.raw`${BENJAMINI}(?![a-z])(?=[^.]{0,40}(?:FDR|false discovery|correct|adjust|procedure))`,
  ),
  // --- step-down and step-up relatives of Bonferroni
  ...w(
    'holm-sidak',
    String.raw`${HOLM}${J}${SIDAK}`,
    String.raw`${SIDAK}${J}${HOLM}`,
    String.raw`(?:step-?\s?down|sequential(?:ly rejective)?)\s${SIDAK}`,
  ),
  ...w(
    'holm',
    String.raw`${HOLM}${J}(?:sequential(?:ly rejective)?\s|step-?\s?down\s)?${BONFERRONI}`,
    String.raw`${BONFERRONI}${J}${HOLM}`,
    String.raw`sequential(?:ly)?(?:[\s-]rejective)?\s${BONFERRONI}`,
    String.raw`step-?\s?down\s${BONFERRONI}`,
    String.raw`(?:modified|sharpened|improved)\s${BONFERRONI}[^.]{0,30}\(?${HOLM}\)?`,
    String.raw`${HOLM}(?=[^.;]{0,60}\b(?:adjust|correct|method|procedure|test|step|p-?\s?values?|sequential|multiple|post|comparison|contrast|control|approach|pairwise|197))|(?:adjust|correct|method|procedure|step-?\s?down|following|according to|multiple)\w*[^.;]{0,50}?${HOLM}|\bp_?-?holm\b`,
  ),
  ...w('hommel', String.raw`(?:Simes${J})?\bHommel(?:'s)?\b`),
  // "Hochberg's GT2" is a test of all pairs with the studentised maximum modulus
  ...w(null, String.raw`\bHochberg(?:'s)?\sGT-?2`, String.raw`\bGT2\b`),
  ...w(
    'hochberg',
    String.raw`(?:Simes${J})?(?:truncated\s)?\bHochb[eu]rg(?:'s)?(?=[^.;]{0,60}\b(?:adjust|correct|method|procedure|step|p-?\s?values?|sequential|multiple|approach|test|198|for\s))|(?:adjust|correct|method|procedure|step-?\s?up|according to)\w*[^.;]{0,40}?\bHochb[eu]rg(?:'s)?\b`,
    String.raw`step-?\s?up\s${BONFERRONI}`,
    String.raw`(?:modified|sharpened|improved)\s${BONFERRONI}[^.]{0,20}\bHochberg`,
  ),
  ...w('sidak', String.raw`${DUNN}${J}${SIDAK}`, String.raw`${SIDAK}`, String.raw`α_?\{?SID\b`),
  // --- ranges and many-to-one
  ...w(null, String.raw`${DUNNETT}\s?(?:T-?\s?3|C)\b(?!\w)`, String.raw`\bTamhane\w*(?:'s)?(?:\sT-?2)?`),
  ...w('games-howell', String.raw`\bGames?\s?(?:${J})\s?Howell?(?:'s)?\b`),
  ...w('dunnett', String.raw`${DUNNETT}(?:${J}Hsu)?`),
  ...w(null, String.raw`\bTukey(?:'s)?[\s-]b\b`),
  ...w(
    'tukey',
    String.raw`${TUKEY}(?:${J}Kramer)?(?:\s?\(?HSD\)?)?`,
    String.raw`\bHSD\b(?=[^.;]{0,30}\b(?:test|post|p\b|procedure|compar))`,
    String.raw`honest(?:ly)?\s(?:significant|significance)\sdifferen\w+`,
  ),
  ...w('scheffe', String.raw`\bS(?:ch|h)ef{1,2}(?:e|é|'e|e'|´e|ee)+(?:'s)?(?![a-z])`),
  ...w(
    'snk',
    String.raw`(?:Student${J})?\b(?:Newman|Neuman)${J}K(?:eul|uel)s(?:'s)?`,
    String.raw`\bS-?N-?K\b`,
  ),
  // 'Waller–Duncan' is another procedure; 'Duncan' alone may be an author
  ...w(null, String.raw`Waller${J}Duncan`),
  ...w(
    'duncan',
    String.raw`\bDuncan(?:'?s)?(?=\s?(?:'s\s)?(?:new\s|\((?!19|20)|multiple|post|test|range|rank|procedure|grouping|letters|comparison|method|at\s))`,
    String.raw`\bDMRT\b`,
  ),
  ...w(
    'lsd',
    String.raw`(?:\b(?:Fis(?:c)?her)(?:'s)?[\s-]+)?(?:\(?protected\)?\s)?\bleast[\s-]significan(?:t|ce)[\s-]difference`,
    String.raw`\bFis(?:c)?her(?:'s)?[\s-](?:protected\s)?P?LSD`,
    String.raw`\bP?LSD\b(?=[^a-z]{0,4}(?:test|post|method|procedure|comparison|0\.0|at\b|was|equiv|p\b|,|;|\.|multiple|value|$))`,
    String.raw`\bl\.s\.d\.`,
  ),
  // --- Bonferroni and Dunn
  ...w(
    'bonferroni',
    String.raw`${DUNN}${J}${BONFERRONI}`,
    String.raw`${BONFERRONI}${J}${DUNN}`,
    String.raw`${BONFERRONI}`,
    String.raw`\bBonf\.(?=\s?(?:corr|adj|p))`,
    String.raw`\bp_?-?bonf\b`,
  ),
  ...w(
    'dunn',
    String.raw`${DUNN}(?=[^.;]{0,40}\b(?:test|post|multiple|comparison|procedure|method|pairwise|correct|adjust)|\s?(?:[,;)]|$))`,
  ),
  // --- resampling and joint distribution
  ...w(
    'permutation',
    String.raw`(?:cluster-?\s?(?:based|level|mass|wise)?\s)?(?:non-?parametric\s)?permutation[\s-](?:based\s|derived\s)?(?:correct\w*|adjust\w*|multiple|max-?T|threshold|FWE\w*)`,
    String.raw`cluster-?\s?based (?:non-?parametric\s)?permutation`,
    String.raw`permutation[^.;]{0,80}(?:multiple (?:comparisons?|test)|family-?\s?wise|FWER?\b)`,
    String.raw`\bWestfall${J}Young`,
    String.raw`\bthreshold-free cluster enhancement|\bTFCE\b`,
  ),
  ...w(
    'single-step',
    String.raw`single-?\s?step\s(?:max-?\s?T|method|procedure|adjust\w*|multivariate|multiple|p-?\s?values?|tests?)|single-?\s?step(?=[^.;]{0,40}(?:adjust|multiple\b|p-?\s?value))`,
    String.raw`\bmax-?\s?T\b(?=[^.;]{0,40}\b(?:approach|adjust|correct|method|procedure))`,
    String.raw`multivariate[\s-]t[\s-](?:adjust|method|correct|distribution)\w*`,
    String.raw`\bmvt\b[\s-](?:adjust|method|correct)\w*`,
    String.raw`simultaneous (?:inference|tests?)[^.;]{0,60}\bjoint`,
  ),
  // --- false discovery rate without a name
  ...w(
    'fdr',
    String.raw`false[\s-](?:discovery|detection)[\s-]rates?(?:\s?\(FDR\))?`,
    String.raw`\bFDR\b`,
    String.raw`\bq-?\s?values?\b`,
    String.raw`\bp_?\(?FDR\)?`,
  ),
]

/** One mention of a procedure in a sentence. */
export type Mention = { procedure: ClaimedProcedure; start: number; end: number }

/** The procedures that a sentence (folded) names, in the order of the text, traps left out. */
export function findProcedures(sentence: string): Mention[] {
  const found: Mention[] = []
  let rest = sentence
  for (const { procedure, form } of WORDINGS)
    for (const match of rest.matchAll(form)) {
      const start = match.index
      const end = start + match[0].length
      if (end === start) continue
      rest = rest.slice(0, start) + ' '.repeat(end - start) + rest.slice(end)
      if (procedure) found.push({ procedure, start, end })
    }
  return found.sort((a, b) => a.start - b.start)
}
