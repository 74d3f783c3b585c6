import type { ClaimedProcedure } from '../../vocabulary'

/**
 * How authors write the procedures, read on folded text. Rows are tried in this order and what one has taken is
 * hidden from the next, so that 'Benjamini–Hochberg' is never read as Hochberg nor 'Holm–Bonferroni' as Bonferroni.
 * `procedure` null: looks like a correction and is none. `hints`: letters, lower case, of which every text that a
 * form of the row can take holds at least one; a sentence without any of them is not searched.
 */
type Wording = { procedure: ClaimedProcedure | null; hints: readonly string[]; form: RegExp }

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

/** `hints` parted by blanks. */
const w = (procedure: ClaimedProcedure | null, hints: string, ...forms: string[]): Wording[] =>
  forms.map((form) => ({ procedure, hints: hints.split(' '), form: new RegExp(form, 'gi') }))

export const WORDINGS: readonly Wording[] = [
  // --- look like a correction, are none
  // 'Freeman–Tukey transformation', 'Tukey fences', 'Tukey biweight', 'Tukey ladder', "Tukey's boxplot", 'Tukey mean-difference'
  ...w(
    null,
    'key',
    String.raw`freeman${J}tukey`,
    String.raw`${TUKEY}\s?(?:style\s)?(?:fences?|biweight|bisquare|window|outliers?|box|lambda|ladder|depth|mean-difference|criterion for outliers|method for outliers|hinges|g-and-h|test for (?:non-?additivity|additivity))`,
  ),
  // 'Greenhouse–Geisser correction', 'Yates correction', 'Welch', 'continuity', 'Bessel', 'correction for sphericity'
  ...w(
    null,
    'geisser feldt yates continuity',
    String.raw`greenhouse${J}geisser`,
    String.raw`huynh${J}feldt`,
    String.raw`\byates`,
    String.raw`continuity[\s-]correct\w*`,
  ),
  // 'Turkey' the country or the bird: no test, post hoc or HSD beside it
  ...w(
    null,
    'turkey',
    String.raw`\bTurkey(?!'?s?\s?(?:-?\s?kramer|test|post|hsd|honest|multiple|range|pairwise|comparison))`,
  ),
  // --- false discovery rate, by name
  ...w('by', 'nja nji', String.raw`${BENJAMINI}${J}Y[eu]kut[ie]{2}l[iy]`),
  ...w('by', 'adjust correct procedure method', String.raw`\bBY[\s-](?:adjust|correct|procedure|method)\w*`),
  ...w(
    'bky',
    'nja nji stage bky',
    String.raw`${BENJAMINI}[,\s–-]*(?:and\s|&\s)?Krieger[,\s–-]*(?:and\s|&\s)?Y[eu]kut[ie]{2}l[iy]`,
    String.raw`two-?\s?stage (?:linear )?step-?\s?up`,
    String.raw`two-?\s?stage benjamini\S*(?:${J}hochberg)?`,
    String.raw`\bBKY\b`,
  ),
  ...w(
    'storey',
    'storey',
    String.raw`\bStorey(?:'s)?(?:${J}Tibshirani)?(?:\s(?:q-?\s?values?|method|procedure|FDR))?`,
  ),
  ...w(
    'bh',
    'nja nji bh b-h',
    String.raw`${BENJAMINI}\s?(?:,|${J})\s?(?:Y\.?\s?)?Ho(?:t)?ch?b[eu]rg(?:'s)?`,
    String.raw`\bB-?H[\s-](?:FDR|adjust|correct|procedure|method|step)\w*`,
    String.raw`\b(?:FDR|false discovery rate)\s?\(?\s?BH\b`,
    String.raw`\bBH\b(?=[^a-z]{0,3}(?:adjusted|corrected|FDR|p\b))`,
    String.raw`(?:method|adjust\w*|correct\w*|procedure)\s?\(\s?BH\s?\)`,
    String.raw`${BENJAMINI}(?![a-z])(?=[^.]{0,40}(?:FDR|false discovery|correct|adjust|procedure))`,
  ),
  // --- step-down and step-up relatives of Bonferroni
  ...w('holm-sidak', 'olm ölm', String.raw`${HOLM}${J}${SIDAK}`, String.raw`${SIDAK}${J}${HOLM}`),
  ...w('holm-sidak', 'step sequential', String.raw`(?:step-?\s?down|sequential(?:ly rejective)?)\s${SIDAK}`),
  ...w(
    'holm',
    'olm ölm sequential step',
    String.raw`${HOLM}${J}(?:sequential(?:ly rejective)?\s|step-?\s?down\s)?${BONFERRONI}`,
    String.raw`${BONFERRONI}${J}${HOLM}`,
    String.raw`sequential(?:ly)?(?:[\s-]rejective)?\s${BONFERRONI}`,
    String.raw`step-?\s?down\s${BONFERRONI}`,
    String.raw`(?:modified|sharpened|improved)\s${BONFERRONI}[^.]{0,30}\(?${HOLM}\)?`,
    String.raw`${HOLM}(?=[^.;]{0,60}\b(?:adjust|correct|method|procedure|test|step|p-?\s?values?|sequential|multiple|post|comparison|contrast|control|approach|pairwise|197))|(?:adjust|correct|method|procedure|step-?\s?down|following|according to|multiple)\w*[^.;]{0,50}?${HOLM}|\bp_?-?holm\b`,
  ),
  ...w('hommel', 'hommel', String.raw`(?:Simes${J})?\bHommel(?:'s)?\b`),
  // "Hochberg's GT2" is a test of all pairs with the studentised maximum modulus
  ...w(null, 'hochberg gt2', String.raw`\bHochberg(?:'s)?\sGT-?2`, String.raw`\bGT2\b`),
  ...w(
    'hochberg',
    'hochb step',
    String.raw`(?:Simes${J})?(?:truncated\s)?\bHochb[eu]rg(?:'s)?(?=[^.;]{0,60}\b(?:adjust|correct|method|procedure|step|p-?\s?values?|sequential|multiple|approach|test|198|for\s))|(?:adjust|correct|method|procedure|step-?\s?up|according to)\w*[^.;]{0,40}?\bHochb[eu]rg(?:'s)?\b`,
    String.raw`step-?\s?up\s${BONFERRONI}`,
    String.raw`(?:modified|sharpened|improved)\s${BONFERRONI}[^.]{0,20}\bHochberg`,
  ),
  ...w('sidak', 'dunn', String.raw`${DUNN}${J}${SIDAK}`),
  ...w('sidak', 'id ıd', String.raw`${SIDAK}`, String.raw`α_?\{?SID\b`),
  // --- ranges and many-to-one
  ...w(
    null,
    'dune dunne tamhane',
    String.raw`${DUNNETT}\s?(?:T-?\s?3|C)\b(?!\w)`,
    String.raw`\bTamhane\w*(?:'s)?(?:\sT-?2)?`,
  ),
  ...w('games-howell', 'game', String.raw`\bGames?\s?(?:${J})\s?Howell?(?:'s)?\b`),
  ...w('dunnett', 'dune dunne', String.raw`${DUNNETT}(?:${J}Hsu)?`),
  ...w(null, 'tukey', String.raw`\bTukey(?:'s)?[\s-]b\b`),
  ...w(
    'tukey',
    'key hsd honest',
    String.raw`${TUKEY}(?:${J}Kramer)?(?:\s?\(?HSD\)?)?`,
    String.raw`\bHSD\b(?=[^.;]{0,30}\b(?:test|post|p\b|procedure|compar))`,
    String.raw`honest(?:ly)?\s(?:significant|significance)\sdifferen\w+`,
  ),
  ...w('scheffe', 'hef', String.raw`\bS(?:ch|h)ef{1,2}(?:e|é|'e|e'|´e|ee)+(?:'s)?(?![a-z])`),
  ...w(
    'snk',
    'newman neuman snk s-nk sn-k s-n-k',
    String.raw`(?:Student${J})?\b(?:Newman|Neuman)${J}K(?:eul|uel)s(?:'s)?`,
    String.raw`\bS-?N-?K\b`,
  ),
  // 'Waller–Duncan' is another procedure; 'Duncan' alone may be an author
  ...w(null, 'waller', String.raw`Waller${J}Duncan`),
  ...w(
    'duncan',
    'duncan dmrt',
    String.raw`\bDuncan(?:'?s)?(?=\s?(?:'s\s)?(?:new\s|\((?!19|20)|multiple|post|test|range|rank|procedure|grouping|letters|comparison|method|at\s))`,
    String.raw`\bDMRT\b`,
  ),
  ...w(
    'lsd',
    'least lsd l.s.d.',
    String.raw`(?:\b(?:Fis(?:c)?her)(?:'s)?[\s-]+)?(?:\(?protected\)?\s)?\bleast[\s-]significan(?:t|ce)[\s-]difference`,
    String.raw`\bFis(?:c)?her(?:'s)?[\s-](?:protected\s)?P?LSD`,
    String.raw`\bP?LSD\b(?=[^a-z]{0,4}(?:test|post|method|procedure|comparison|0\.0|at\b|was|equiv|p\b|,|;|\.|multiple|value|$))`,
    String.raw`\bl\.s\.d\.`,
  ),
  // --- Bonferroni and Dunn
  ...w(
    'bonferroni',
    'roni ronni rni rnni bonf',
    String.raw`${DUNN}${J}${BONFERRONI}`,
    String.raw`${BONFERRONI}${J}${DUNN}`,
    String.raw`${BONFERRONI}`,
    String.raw`\bBonf\.(?=\s?(?:corr|adj|p))`,
    String.raw`\bp_?-?bonf\b`,
  ),
  ...w(
    'dunn',
    'dunn',
    String.raw`${DUNN}(?=[^.;]{0,40}\b(?:test|post|multiple|comparison|procedure|method|pairwise|correct|adjust)|\s?(?:[,;)]|$))`,
  ),
  // --- resampling and joint distribution
  ...w(
    'permutation',
    'permutation westfall threshold-free tfce',
    String.raw`(?:cluster-?\s?(?:based|level|mass|wise)?\s)?(?:non-?parametric\s)?permutation[\s-](?:based\s|derived\s)?(?:correct\w*|adjust\w*|multiple|max-?T|threshold|FWE\w*)`,
    String.raw`cluster-?\s?based (?:non-?parametric\s)?permutation`,
    String.raw`permutation[^.;]{0,80}(?:multiple (?:comparisons?|test)|family-?\s?wise|FWER?\b)`,
    String.raw`\bWestfall${J}Young`,
    String.raw`\bthreshold-free cluster enhancement|\bTFCE\b`,
  ),
  ...w(
    'single-step',
    'step max multivariate mvt simultaneous',
    String.raw`single-?\s?step\s(?:max-?\s?T|method|procedure|adjust\w*|multivariate|multiple|p-?\s?values?|tests?)|single-?\s?step(?=[^.;]{0,40}(?:adjust|multiple\b|p-?\s?value))`,
    String.raw`\bmax-?\s?T\b(?=[^.;]{0,40}\b(?:approach|adjust|correct|method|procedure))`,
    String.raw`multivariate[\s-]t[\s-](?:adjust|method|correct|distribution)\w*`,
    String.raw`\bmvt\b[\s-](?:adjust|method|correct)\w*`,
    String.raw`simultaneous (?:inference|tests?)[^.;]{0,60}\bjoint`,
  ),
  // --- false discovery rate without a name
  ...w(
    'fdr',
    'false fdr',
    String.raw`false[\s-](?:discovery|detection)[\s-]rates?(?:\s?\(FDR\))?`,
    String.raw`\bFDR\b`,
  ),
  ...w('fdr', 'q', String.raw`\bq-?\s?values?\b`),
  ...w('fdr', 'fdr', String.raw`\bp_?\(?FDR\)?`),
]

/** One mention of a procedure in a sentence. */
export type Mention = { procedure: ClaimedProcedure; start: number; end: number }

/** The procedures that a sentence (folded) names, in the order of the text, traps left out. */
export function findProcedures(sentence: string): Mention[] {
  const found: Mention[] = []
  const letters = sentence.toLowerCase()
  let rest = sentence
  for (const { procedure, hints, form } of WORDINGS) {
    if (!hints.some((hint) => letters.includes(hint))) continue
    for (const match of rest.matchAll(form)) {
      const start = match.index
      const end = start + match[0].length
      if (end === start) continue
      rest = rest.slice(0, start) + ' '.repeat(end - start) + rest.slice(end)
      if (procedure) found.push({ procedure, start, end })
    }
  }
  return found.sort((a, b) => a.start - b.start)
}
