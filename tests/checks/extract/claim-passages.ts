import type { ReadClaim, SectionKind } from '@/lib/checks/types'

/** Golden passages for claims: invented sentences, and the claims that they make. */
export type ClaimPassage = { text: string; section: SectionKind; expect: Partial<Wanted>[] }
type Wanted = Pick<ReadClaim, 'procedure' | 'm' | 'alpha' | 'threshold' | 'groups' | 'errorRate'> & {
  design: ReadClaim['scope']['design']
  control: string | null
}

const methods = (text: string, ...expect: Partial<Wanted>[]): ClaimPassage => ({
  text,
  section: 'methods',
  expect,
})
const within = (section: SectionKind, text: string, ...expect: Partial<Wanted>[]): ClaimPassage => ({
  text,
  section,
  expect,
})

export const CLAIM_PASSAGES: readonly ClaimPassage[] = [
  // Bonferroni
  methods('Pairwise t tests were made with Bonferroni correction for six comparisons.', {
    procedure: 'bonferroni',
    m: 6,
    design: 'all-pairs',
  }),
  methods('We used Bonferroni’s method.', { procedure: 'bonferroni', m: null }),
  methods('ANOVA was followed by Bonferonni’s post test.', { procedure: 'bonferroni' }),
  methods('P values were Bonferroni-adjusted for 15 tests.', { procedure: 'bonferroni', m: 15 }),
  methods('p values were multiplied by 6.', { procedure: 'bonferroni', m: 6 }),
  methods('The p-values were Bonferroni-corrected by multiplying each of them by six.', {
    procedure: 'bonferroni',
    m: 6,
  }),
  methods('P-values were corrected by multiplying by the number of comparisons (six).', {
    procedure: 'bonferroni',
    m: 6,
  }),
  methods('α was set at .05/6 = .0083 for each contrast.', {
    procedure: 'bonferroni',
    m: 6,
    alpha: 0.05,
    threshold: 0.0083,
  }),
  methods('The significance level was Bonferroni-corrected to .05/4 = .0125.', {
    procedure: 'bonferroni',
    m: 4,
    alpha: 0.05,
    threshold: 0.0125,
  }),
  methods('The level for each of the six comparisons was set by Bonferroni’s rule to 0.05/6, i.e., 0.01.', {
    procedure: 'bonferroni',
    m: 6,
    threshold: 0.01,
  }),
  methods('By Bonferroni’s rule P < 0.0083 (0.05/6) was required.', {
    procedure: 'bonferroni',
    m: 6,
    threshold: 0.0083,
  }),
  methods('As there were five media, the level was lowered to 0.05/5 = 0.01.', {
    procedure: 'bonferroni',
    m: 5,
    threshold: 0.01,
    groups: 5,
  }),
  methods('A difference was significant at P < 0.0125 after correction for four tests.', {
    procedure: 'bonferroni',
    m: 4,
    threshold: 0.0125,
  }),
  methods('An adjusted alpha of 0.0167 (0.05/3) was used.', {
    procedure: 'bonferroni',
    m: 3,
    alpha: 0.05,
    threshold: 0.0167,
  }),
  methods('Comparisons used a Bonferroni-corrected level of significance of 0.05/6.', {
    procedure: 'bonferroni',
    m: 6,
    alpha: 0.05,
  }),
  methods('The alpha level of 0.05 was divided by the number of tests (n = 8).', {
    procedure: 'bonferroni',
    m: 8,
  }),
  methods('Dunn–Bonferroni post hoc tests followed the Kruskal–Wallis test.', { procedure: 'bonferroni' }),
  methods('Dunn’s test with Bonferroni correction was used.', { procedure: 'bonferroni' }),
  methods('A Bonferroni-corrected threshold of P < 1.7 × 10−4 (0.05/300) was applied.', {
    procedure: 'bonferroni',
    m: 300,
    threshold: 0.00017,
  }),
  within('results', 'After Bonferroni correction the difference was no longer significant (p = .08).', {
    procedure: 'bonferroni',
  }),
  within(
    'abstract',
    'Several pairwise differences were significant at the 5% level after Bonferroni correction.',
    { procedure: 'bonferroni' },
  ),
  // step-wise
  methods('p values of the six pairwise comparisons were adjusted with the step-down method of Holm.', {
    procedure: 'holm',
    m: 6,
  }),
  methods('These five P-values were adjusted with Holm’s step-down procedure and compared with 0.05.', {
    procedure: 'holm',
    m: 5,
    threshold: 0.05,
  }),
  methods('We applied the Holm–Bonferroni correction.', { procedure: 'holm' }),
  methods('A sequentially rejective Bonferroni test was used.', { procedure: 'holm' }),
  methods('The sequential Bonferroni procedure (Holm, 1979) was applied to the ten outcomes.', {
    procedure: 'holm',
    m: 10,
  }),
  methods('Step-down Bonferroni adjustment was used.', { procedure: 'holm' }),
  methods('Pairwise Wilcoxon tests were Holm-adjusted.', { procedure: 'holm' }),
  methods('Holm-Sidak post hoc tests were used.', { procedure: 'holm-sidak' }),
  methods('Sidak’s multiple comparisons test was used.', { procedure: 'sidak' }),
  methods('Dunn–Šidák corrected p-values are given.', { procedure: 'sidak' }),
  methods('Comparisons were Sˇida´k adjusted.', { procedure: 'sidak' }),
  methods('Hochberg’s step-up procedure was applied to the two primary endpoints.', {
    procedure: 'hochberg',
    m: 2,
  }),
  methods('A step-up Bonferroni procedure was used.', { procedure: 'hochberg' }),
  methods('Hommel-adjusted p-values are given.', { procedure: 'hommel' }),
  // false discovery rate
  methods('P values were adjusted by the Benjamini–Hochberg procedure over 80 regions.', {
    procedure: 'bh',
    m: 80,
  }),
  methods('The Benjamini and Hochberg method controlled the false discovery rate at 5%.', {
    procedure: 'bh',
    errorRate: 'fdr',
    alpha: 0.05,
  }),
  methods('We used BH-adjusted p-values.', { procedure: 'bh' }),
  methods('Benjamini-Hochburg correction was applied.', { procedure: 'bh' }),
  methods(
    'To control the family-wise error rate at 5%, p-values were adjusted by the Benjamini–Hochberg procedure.',
    { procedure: 'bh', errorRate: 'fwer' },
  ),
  methods('The Benjamini–Yekutieli procedure was used because tests depend on each other.', {
    procedure: 'by',
  }),
  methods('The two-stage linear step-up procedure of Benjamini, Krieger and Yekutieli was used.', {
    procedure: 'bky',
  }),
  methods('Storey’s q-values were computed.', { procedure: 'storey' }),
  methods('P values were FDR-corrected.', { procedure: 'fdr' }),
  methods('The false discovery rate was controlled at q < 0.05.', { procedure: 'fdr', errorRate: 'fdr' }),
  methods('Pairwise Dunn’s tests with False Discovery Rate corrected p values were made.', {
    procedure: 'fdr',
  }),
  // ranges and many-to-one
  methods('All pairs of grades were compared with Tukey’s honestly significant difference procedure.', {
    procedure: 'tukey',
    design: 'all-pairs',
  }),
  methods('One-way ANOVA was followed by Tukey HSD post hoc tests.', { procedure: 'tukey' }),
  methods('The Tukey–Kramer method was used for the four groups.', { procedure: 'tukey', groups: 4 }),
  methods('ANOVA with Tuckey’s test was used.', { procedure: 'tukey' }),
  methods('Turkey’s post hoc test was applied.', { procedure: 'tukey' }),
  methods(
    'Each additive was compared with the untreated control by Dunnett’s test, which controls the family-wise error over the four comparisons.',
    { procedure: 'dunnett', m: 4, errorRate: 'fwer', design: 'many-to-one', control: 'untreated control' },
  ),
  methods('The comparisons were made by ANOVA followed by Dunnet’s test.', { procedure: 'dunnett' }),
  methods('Games–Howell tests were used as variances differed.', { procedure: 'games-howell' }),
  methods('Scheffé’s test was used for all contrasts.', { procedure: 'scheffe' }),
  methods('Means were separated with Scheff´e’s procedure.', { procedure: 'scheffe' }),
  methods('Kruskal–Wallis tests were followed by Dunn’s multiple comparisons test.', { procedure: 'dunn' }),
  methods('Fisher’s protected least significant difference was used.', { procedure: 'lsd' }),
  methods(
    'Differences were tested by the least significant difference method, and p<0.05 was considered significant.',
    { procedure: 'lsd', alpha: 0.05 },
  ),
  methods('LSD post hoc tests were made.', { procedure: 'lsd' }),
  methods('Duncan’s multiple range test separated the means.', { procedure: 'duncan' }),
  methods('Duncan multiple rank test was performed.', { procedure: 'duncan' }),
  methods('The Student–Newman–Keuls test was used.', { procedure: 'snk' }),
  methods('Adjusted p-values come from a single-step max-T approach.', { procedure: 'single-step' }),
  methods('We used cluster-based permutation tests to correct for multiple comparisons.', {
    procedure: 'permutation',
  }),
  methods(
    'ANOVA was followed by Tukey’s test for all pairs and by Dunnett’s test against the vehicle.',
    { procedure: 'tukey' },
    { procedure: 'dunnett' },
  ),
  // nothing, or no name
  methods('No adjustment for multiple comparisons was made.', { procedure: 'none' }),
  methods('P values were not adjusted for multiplicity.', { procedure: 'none' }),
  methods('All P values are nominal.', { procedure: 'none' }),
  methods('Tests were made without correction for multiple testing.', { procedure: 'none' }),
  methods('No Bonferroni correction was applied.', { procedure: 'none' }),
  methods('Each test was made at the 5% level, so that any false positive finding is held at 5%.', {
    procedure: 'none',
    errorRate: 'fwer',
  }),
  within('discussion', 'We did not correct for multiple comparisons, as the study was exploratory.', {
    procedure: 'none',
  }),
  methods('Values were corrected for multiple comparisons.', { procedure: 'unspecified' }),
  methods('All p-values in this report are corrected in this manner.', { procedure: 'unspecified' }),
  // none of these is a claim of correction
  methods('Data were Freeman–Tukey transformed before analysis.'),
  methods('Outliers were found with Tukey fences.'),
  methods('The Greenhouse–Geisser correction was used where sphericity failed.'),
  methods('Dunnett’s T3 was used as variances differed.'),
  methods('Odds ratios were adjusted for age and sex.'),
  methods('The samples came from Turkey.'),
  methods('Wall volume was nest area multiplied by 1.5 mm.'),
  methods('Mice were given LSD by injection.'),
  within('introduction', 'The Bonferroni correction is simple and widely used [3].'),
  within('introduction', 'Smith et al. applied the Holm procedure to ten outcomes [4].'),
  within('discussion', 'A Bonferroni correction would have been too strict.'),
  within('discussion', 'Corrections such as Bonferroni or Holm differ in strictness.'),
  within('discussion', 'The Bonferroni method is often conservative.'),
  within(
    'discussion',
    'Smith and colleagues (2010) reported that the effect survived a Bonferroni correction.',
  ),
  within('references', 'Holm S. A simple sequentially rejective multiple test procedure. 1979; 6: 65–70.'),
  within('references', 'Benjamini Y, Hochberg Y. Controlling the false discovery rate. 1995; 57: 289–300.'),
  // further phrasings, misspelt ones among them
  methods('P values were multiplied by 6.', { procedure: 'bonferroni' }),
  methods('Bonferroni post hoc tests were used.', { procedure: 'bonferroni' }),
  methods('α was set at .05/6 = .0083 for the six pairs.', { procedure: 'bonferroni' }),
  methods('The significance level was lowered to 0.008 (0.05/6).', { procedure: 'bonferroni' }),
  methods('Results were significant at p < 0.0125 after correction for four tests.', {
    procedure: 'bonferroni',
  }),
  methods('The Bonferroni–Dunn procedure was used for all pairs.', { procedure: 'bonferroni' }),
  methods('Pairs were compared with Dunn–Bonferroni tests.', { procedure: 'bonferroni' }),
  methods('A Bonferonni correction was made.', { procedure: 'bonferroni' }),
  methods('A bonforoni correction was made.', { procedure: 'bonferroni' }),
  methods('A Bon-ferroni correction was made.', { procedure: 'bonferroni' }),
  methods('A Bonf. correction was made.', { procedure: 'bonferroni' }),
  methods('Holm–Bonferroni correction was used.', { procedure: 'holm' }),
  methods('The sequentially rejective Bonferroni procedure was used.', { procedure: 'holm' }),
  methods('P values were corrected by step-down Bonferroni.', { procedure: 'holm' }),
  methods('The sequential Bonferroni procedure (Holm, 1979) was used.', { procedure: 'holm' }),
  methods('Holms correction was used.', { procedure: 'holm' }),
  methods('Comparisons were Dunn–Šidák corrected.', { procedure: 'sidak' }),
  methods("Sidak's multiple comparisons test was used.", { procedure: 'sidak' }),
  methods('Adjustment for multiple comparisons: Sidak.', { procedure: 'sidak' }),
  methods('The Holm-Sidak post hoc test was used.', { procedure: 'holm-sidak' }),
  methods('P values were adjusted by Hochberg’s step-up procedure.', { procedure: 'hochberg' }),
  methods('Hochberg (1988) adjustment was used for the two primary endpoints.', { procedure: 'hochberg' }),
  methods('The Benjamini and Hochberg procedure was used.', { procedure: 'bh' }),
  methods('P values were BH-adjusted.', { procedure: 'bh' }),
  methods('The false discovery rate was controlled at q = .05.', { procedure: 'fdr' }),
  methods('FDR-corrected p-values are given.', { procedure: 'fdr' }),
  methods('The Benjamini–Yekutieli procedure was used.', { procedure: 'by' }),
  methods('The two-stage procedure of Benjamini, Krieger and Yekutieli was used.', { procedure: 'bky' }),
  methods("Storey's q-values were computed.", { procedure: 'storey' }),
  methods('The Benjamini-Hochburg procedure was used.', { procedure: 'bh' }),
  methods('The Benjimini–Hochberg procedure was used.', { procedure: 'bh' }),
  methods("Tukey's HSD was used for all pairs.", { procedure: 'tukey' }),
  methods('Means were compared with Tukey’s honestly significant difference.', { procedure: 'tukey' }),
  methods('Tukey–Kramer tests followed.', { procedure: 'tukey' }),
  methods('Post hoc comparisons were Tukey-adjusted.', { procedure: 'tukey' }),
  methods("Tuckey's test was used for all pairs.", { procedure: 'tukey' }),
  methods('ANOVA was followed by Turkey’s post hoc test.', { procedure: 'tukey' }),
  methods("Dunnett's test compared each dose with the vehicle.", { procedure: 'dunnett' }),
  methods("Dunnet's post hoc test compared each dose with the control.", { procedure: 'dunnett' }),
  methods('Doses were compared with control by Dunnett’s many-to-one test.', { procedure: 'dunnett' }),
  methods("Fisher's LSD was used for all pairs.", { procedure: 'lsd' }),
  methods('Means were separated by protected least significant difference.', { procedure: 'lsd' }),
  methods('Scheffé post hoc tests were used.', { procedure: 'scheffe' }),
  methods('Means were compared by the Scheffe procedure.', { procedure: 'scheffe' }),
  methods('Student–Newman–Keuls tests were used.', { procedure: 'snk' }),
  methods('Means were compared by Newman-Kuels.', { procedure: 'snk' }),
  methods("Duncan's multiple range test was used.", { procedure: 'duncan' }),
  methods('DMRT was used to separate means.', { procedure: 'duncan' }),
  methods('Games–Howell post hoc tests were used.', { procedure: 'games-howell' }),
  methods('Welch ANOVA was followed by Games & Howell comparisons.', { procedure: 'games-howell' }),
  methods("Kruskal–Wallis tests were followed by Dunn's test.", { procedure: 'dunn' }),
  methods('Pairwise Mann–Whitney tests were Holm-corrected.', { procedure: 'holm' }),
  methods('Pairwise Wilcoxon tests with Bonferroni correction followed.', { procedure: 'bonferroni' }),
  methods('Cluster-based permutation tests were used.', { procedure: 'permutation' }),
  methods('No adjustment for multiplicity was made.', { procedure: 'none' }),
  methods('P values are nominal and were not adjusted for multiple comparisons.', { procedure: 'none' }),
  methods('Results were not corrected for multiple testing.', { procedure: 'none' }),
  methods('We did not correct for multiple comparisons because they were planned.', { procedure: 'none' }),
  methods('All p values are uncorrected.', { procedure: 'none' }),
  methods('All values were corrected for multiple comparisons.', { procedure: 'unspecified' }),
  methods('P values were adjusted where appropriate.', { procedure: 'unspecified' }),
  within('results', 'The effect did not survive Bonferroni correction (p = .12).', {
    procedure: 'bonferroni',
  }),
  within('results', 'The effect remained after Holm correction (p = .012).', { procedure: 'holm' }),
  within('results', 'Bonferroni-corrected comparisons showed that A exceeded B (p = .01).', {
    procedure: 'bonferroni',
  }),
  within('results', 'Tukey post hoc tests showed that A exceeded B (p = .01).', { procedure: 'tukey' }),
  methods('Data were checked with Tukey boxplots.'),
  methods('A Bonferroni-type inequality bounds the probability.'),
  methods('The level was Bonferroni-corrected for the number of outcomes (10), giving p < .005.', {
    procedure: 'bonferroni',
  }),
  methods('Statistical significance was set at .0125 (.05 divided by 4).', { procedure: 'bonferroni' }),
  methods('We used a Bonferroni-corrected threshold of P < 1.7 × 10−4 (0.05/300).', {
    procedure: 'bonferroni',
  }),
  methods('Post hoc tests used a Bonferroni-adjusted alpha level of .0125 per test (.05/4).', {
    procedure: 'bonferroni',
  }),
  methods('Correction for multiple testing was by FDR (Benjamini–Hochberg), q < .1.', { procedure: 'bh' }),
  // the number that the correction is for, not that of the pairs before it
  methods(
    'All six pairs of lights were compared with t tests, and p values were Bonferroni-corrected for three comparisons.',
    { procedure: 'bonferroni', m: 3 },
  ),
  methods('The fifteen pairs were compared, with Holm adjustment for the five planned contrasts.', {
    procedure: 'holm',
    m: 5,
  }),
]
