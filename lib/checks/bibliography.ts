/** How far a point is verified: read in an excerpt of the source, read as others quote it, or from memory. */
export type Verification = 'verified in excerpt' | 'second hand' | 'from memory'

export type Reference = { key: string; text: string; status: Verification }

const list: readonly Reference[] = [
  ref('sampl', 'Lang TA, Altman DG. SAMPL guidelines. Int J Nurs Stud 2015;52:5–9.', 'verified in excerpt'),
  ref(
    'consort-2010',
    'Schulz KF, Altman DG, Moher D. CONSORT 2010 statement. BMJ 2010;340:c332.',
    'verified in excerpt',
  ),
  ref('strobe', 'von Elm E, et al. The STROBE statement. Lancet 2007;370:1453–7.', 'verified in excerpt'),
  ref(
    'jars-quant',
    'Appelbaum M, et al. Journal article reporting standards for quantitative research. Am Psychol 2018;73:3–25.',
    'verified in excerpt',
  ),
  ref(
    'apa-7',
    'Publication Manual of the American Psychological Association, 7th ed., 6.32–6.45.',
    'verified in excerpt',
  ),
  ref(
    'asa-2016',
    'Wasserstein RL, Lazar NA. The ASA statement on p-values. Am Stat 2016;70:129–33.',
    'verified in excerpt',
  ),
  ref(
    'ich-e9',
    'ICH E9. Statistical principles for clinical trials. 1998, sections 2.2.5 and 5.6.',
    'from memory',
  ),
  ref('fda-2022', 'FDA. Multiple endpoints in clinical trials: guidance for industry. 2022.', 'second hand'),
  ref(
    'bender-lange',
    'Bender R, Lange S. Adjusting for multiple testing: when and how? J Clin Epidemiol 2001;54:343–9.',
    'verified in excerpt',
  ),
  ref(
    'rothman',
    'Rothman KJ. No adjustments are needed for multiple comparisons. Epidemiology 1990;1:43–6.',
    'second hand',
  ),
  ref(
    'cook-farewell',
    'Cook RJ, Farewell VT. Multiplicity considerations in the design and analysis of clinical trials. J R Stat Soc A 1996;159:93–110.',
    'verified in excerpt',
  ),
  ref('dunn', 'Dunn OJ. Multiple comparisons among means. J Am Stat Assoc 1961;56:52–64.', 'from memory'),
  ref(
    'holm',
    'Holm S. A simple sequentially rejective multiple test procedure. Scand J Stat 1979;6:65–70.',
    'from memory',
  ),
  ref(
    'benjamini-hochberg',
    'Benjamini Y, Hochberg Y. Controlling the false discovery rate. J R Stat Soc B 1995;57:289–300.',
    'from memory',
  ),
  ref(
    'dunnett',
    'Dunnett CW. A multiple comparison procedure for comparing several treatments with a control. J Am Stat Assoc 1955;50:1096–121.',
    'from memory',
  ),
  ref(
    'tukey',
    'Tukey JW. The problem of multiple comparisons. 1953 (unpublished manuscript).',
    'from memory',
  ),
  ref(
    'hayter',
    'Hayter AJ. The maximum familywise error rate of Fisher’s least significant difference test. J Am Stat Assoc 1986;81:1000–4.',
    'from memory',
  ),
  ref(
    'marcus-peritz-gabriel',
    'Marcus R, Peritz E, Gabriel KR. On closed testing procedures with special reference to ordered analysis of variance. Biometrika 1976;63:655–60.',
    'from memory',
  ),
]

function ref(key: string, text: string, status: Verification): Reference {
  return { key, text, status }
}

/** Published guidance that findings may cite, by key. */
export const bibliography: ReadonlyMap<string, Reference> = new Map(list.map((entry) => [entry.key, entry]))
