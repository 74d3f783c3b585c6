import { expect, test } from 'vitest'
import { judgeManuscript, listFindings, listOutcomes, sayPairs } from '../../support/manuscript'
import { claim, kelp, level, tellPairs } from './kelp'

// Numbers Fn are the situations of the list of faults that the rules were drawn up from; all manuscripts are made up.

test('raw values held against .05 under a Bonferroni claim are not upheld', () => {
  const told = judgeManuscript(
    kelp(
      'The six pairs of substrates were compared with t tests and Bonferroni correction for the six comparisons. Differences with p below .05 were taken as significant.',
      tellPairs({ print: 'raw', called: [1, 2, 4] }),
    ),
  )
  expect(listOutcomes(told)).toEqual(['fails'])
  expect(listFindings(told)).toContain('major call-not-upheld')
  const finding = told.findings.find(({ rule }) => rule === 'call-not-upheld')
  expect(finding?.says).toContain('concrete – granite (printed p = .020): 0.12 to 0.123')
  expect(finding?.says).not.toContain('0.0128')
})

test('the number of groups instead of the number of pairs is an undercounted family', () => {
  const told = judgeManuscript(
    kelp(
      'All pairs of the four substrates were compared with t tests. As there were four substrates, the level was Bonferroni-corrected to .05/4 = .0125.',
      tellPairs({
        print: ['.606', '.011', '.002', '.057', '.007', '.270'],
        called: [1, 2, 4],
        statistics: false,
      }),
    ),
  )
  expect(listOutcomes(told)).toEqual(['fails'])
  expect(told.families[0]?.m.due).toBe(6)
  expect(listFindings(told)).toEqual(['major call-not-upheld', 'major family-undercounted'].sort())
})

test('an undercounted family on which no call depends is minor', () => {
  const told = judgeManuscript(
    kelp(
      'All pairs of the four substrates were compared with t tests. For four comparisons the level was Bonferroni-corrected to .05/4 = .0125.',
      tellPairs({ print: 'raw', called: [2, 4] }),
    ),
  )
  expect(listFindings(told)).toEqual(['minor family-undercounted'])
})

test('a level rounded up above the quotient is found, and is major where a call rests on it', () => {
  const told = judgeManuscript(
    kelp(
      'All six pairs were compared with t tests. For six comparisons the Bonferroni-corrected level was .05/6 = .01.',
      tellPairs({
        print: ['.606', '.009', '.002', '.057', '.007', '.270'],
        called: [1, 2, 4],
        statistics: false,
      }),
    ),
  )
  expect(listFindings(told)).toContain('major threshold-rounded-up')
})

test('values called adjusted that equal the unadjusted ones are found', () => {
  const told = judgeManuscript(kelp(claim, tellPairs({ print: 'raw', called: [1, 2, 4] })))
  expect(listOutcomes(told)).toEqual(['fails'])
  expect(listFindings(told)).toContain('major adjustment-absent')
})

test('adjusted values held against the lowered level are corrected twice', () => {
  const told = judgeManuscript(
    kelp(
      'The six p values were multiplied by six (Bonferroni), and an adjusted p value below the Bonferroni-corrected level of .05/6 = .0083 was regarded as significant.',
      tellPairs({ print: 'bonferroni', called: [] }),
    ),
  )
  expect(listFindings(told)).toContain('minor corrected-twice')
  expect(listFindings(told)).toContain('major call-understated')
})

test('Bonferroni values under the name of Holm are named for what they are', () => {
  const told = judgeManuscript(
    kelp(
      'All six pairs of substrates were compared with t tests, and p values were adjusted by the method of Holm. Adjusted values below .05 were regarded as significant.',
      tellPairs({ print: 'bonferroni', called: [2, 4] }),
    ),
  )
  const finding = told.findings.find(({ rule }) => rule === 'procedure-differs')
  expect(finding?.says).toContain('Bonferroni')
  expect(listOutcomes(told)).toEqual(['holds'])
})

test('a product above 1 and an adjusted value below its unadjusted one are found', () => {
  const told = judgeManuscript(
    kelp(claim, tellPairs({ print: ['3.636', '.121', '.013', '.339', '.002', '1.620'], called: [2, 4] })),
  )
  expect(listFindings(told)).toContain('minor adjusted-above-one')
  expect(listFindings(told)).toContain('minor adjusted-below-raw')
})

test('all were compared, three are reported and counted', () => {
  const told = judgeManuscript(
    kelp(
      'All four substrates were compared with each other. Bonferroni-corrected p values (m = 3) are given for the three comparisons of interest.',
      tellPairs({ print: ['1', '.061', '.006', '.170', '.022', '.810'], called: [2, 4], only: [0, 2, 4] }),
    ),
  )
  expect(told.families[0]?.m.due).toBe(6)
  expect(listFindings(told)).toEqual(['question comparisons-missing', 'minor family-undercounted'].reverse())
})

const correlations = [
  ['Sinking', 'r(34) = .57, p < .001', true],
  ['Grazing', 'r(34) = .13, p = .450', false],
  ['Molting', 'r(34) = .41, p = .013', true],
  ['Hiding', 'r(34) = -.02, p = .908', false],
  ['Clinging', 'r(34) = .28, p = .098', false],
] as const
const snails = correlations
  .map(
    ([name, shown, called]) =>
      `${name} was ${called ? '' : 'not '}significantly correlated with depth (${shown}).`,
  )
  .join(' ')

test('five tests at the full level that are said to hold the family-wise error are a major point', () => {
  const told = judgeManuscript(`# Methods
    Each of five behaviours of tidal-pool snails was correlated with depth. No correction was made; each test was made at the 5% level, so that the family-wise error rate is held at 5%.
    # Results
    ${snails}`)
  expect(listOutcomes(told)).toEqual(['uncorrected'])
  expect(listFindings(told)).toEqual(['major no-correction'])
})

test('several tests without a word on multiplicity are a question', () => {
  const told = judgeManuscript(`# Methods
    Each of five behaviours of tidal-pool snails was correlated with depth.
    # Results
    ${snails}`)
  expect(listOutcomes(told)).toEqual(['uncorrected'])
  expect(listFindings(told)).toEqual(['question no-correction'])
})

test('a false discovery rate procedure that is said to hold the family-wise rate', () => {
  const told = judgeManuscript(
    kelp(
      'To control the family-wise error rate at 5%, p values of all six pairs were adjusted by the Benjamini-Hochberg procedure; adjusted values below .05 were regarded as significant.',
      tellPairs({ print: ['.606', '.040', '.013', '.085', '.022', '.324'], called: [1, 2, 4] }),
    ),
  )
  expect(listOutcomes(told)).toEqual(['fails'])
  expect(listFindings(told)).toContain('major error-rate-mixed')
})

test('a p that does not follow from its statistic is minor, and major across the level', () => {
  const same = judgeManuscript(`# Results
    Gull noise and control differed in sleep onset (t(36) = 2.84, p = .001).`)
  expect(listFindings(same)).toEqual(['minor p-differs-from-statistic'])
  const across = judgeManuscript(`# Results
    Lighting affected settlement (F(4, 40) = 1.69, p = .027).`)
  expect(listFindings(across)).toEqual(['major p-differs-from-statistic'])
})

test('values that follow only one-sided are named so, once for the family', () => {
  const told = judgeManuscript(
    `# Methods
    Hatchery lighting and control were compared on four outcomes with t tests; the Bonferroni-corrected level was .05/4 = .0125.
    # Results
    Lighting and control differed significantly in growth (t(36) = 3.31, p = .0011). They differed significantly in settlement (t(36) = 2.43, p = .0101). They did not differ significantly in survival (t(36) = 1.45, p = .0779). They did not differ significantly in shell length (t(36) = 0.88, p = .1923).`,
  )
  expect(listOutcomes(told)).toEqual(['fails'])
  expect(listFindings(told).filter((each) => each.includes('one-sided'))).toEqual([
    'major one-sided-unstated',
  ])
})

test('text and results file that differ for one comparison are found there', () => {
  const told = judgeManuscript(kelp(claim, tellPairs({ print: 'bonferroni', called: [2, 4] })), {
    results: `comparison;t;df;p adj
      granite - slate;0.52;36;1.000
      granite - concrete;2.43;36;0.121
      granite - plastic;3.31;36;0.013
      slate - concrete;1.97;36;0.539
      slate - plastic;2.84;36;0.044
      concrete - plastic;1.12;36;1.000`,
  })
  const found = told.findings.filter(({ rule }) => rule === 'text-table-differ')
  expect(found.map(({ severity }) => severity)).toEqual(['minor'])
  expect(found[0]?.says).toContain('slate')
})

test('a p that the printed digits cannot decide is a question, with what would decide it', () => {
  const told = judgeManuscript(
    kelp(
      level,
      tellPairs({
        print: ['.606', '.020', '.002', '.057', '.008', '.270'],
        called: [2, 4],
        statistics: false,
      }),
    ),
  )
  expect(listOutcomes(told)).toEqual(['undecidable'])
  expect(listFindings(told)).toEqual(['question undecided-by-rounding'])
  expect(told.findings[0]?.says).toContain('decimal')
})

test('a call against its own adjusted p is not upheld, or understated', () => {
  const told = judgeManuscript(kelp(claim, tellPairs({ print: 'bonferroni', called: [0, 4] })))
  expect(listFindings(told)).toEqual(['major call-not-upheld', 'major call-understated'])
})

const curd = (first: string, second: string) => `# Methods
    The three settings of hull coating were compared in pairs for drag and for fouling. p values were Bonferroni corrected.
    # Results
    ## Drag
    ${first}
    ## Fouling
    ${second}`

test('a correction within or across outcomes that matters is a question, and the m stays open', () => {
  const told = judgeManuscript(
    curd(
      sayPairs('drag', [
        ['Silicone', 'copper', 't(27) = 1.19', 'p = .733', false],
        ['Silicone', 'epoxy', 't(27) = 3.88', 'p = .002', true],
        ['Copper', 'epoxy', 't(27) = 2.68', 'p = .037', true],
      ]),
      sayPairs('fouling', [
        ['Silicone', 'copper', 't(27) = 0.96', 'p = 1.000', false],
        ['Silicone', 'epoxy', 't(27) = 1.84', 'p = .230', false],
        ['Copper', 'epoxy', 't(27) = 2.81', 'p = .027', true],
      ]),
    ),
  )
  expect(told.families.map(({ m }) => m.due)).toEqual([null])
  expect(listOutcomes(told)).toEqual(['undecidable'])
  expect(listFindings(told)).toEqual(['question family-unclear'])
})

test('a correction without a name is a question', () => {
  const told = judgeManuscript(
    kelp(
      'All six pairs were compared with t tests; p values were corrected for multiple comparisons.',
      tellPairs({ print: 'bonferroni', called: [2, 4] }),
    ),
  )
  expect(listFindings(told)).toContain('question procedure-unnamed')
  expect(listFindings(told).filter((each) => /major|minor/.test(each))).toEqual([])
})

test('the least significant difference with four groups does not hold the family-wise rate', () => {
  const told = judgeManuscript(
    kelp(
      "All six pairs were compared with Fisher's least significant difference test, which controls the family-wise error rate.",
      tellPairs({ print: 'raw', called: [1, 2, 4] }),
    ),
  )
  expect(listFindings(told)).toContain('minor procedure-does-not-control')
})

test('testing past the first failure of a stated order is found', () => {
  const told = judgeManuscript(`# Methods
    Endpoints were tested hierarchically in the prespecified order grip strength, pain and swelling, each at .05.
    # Results
    Splint and control differed significantly in grip strength (t(36) = 3.31, p = .002). They did not differ significantly in pain (t(36) = 1.45, p = .156). They differed significantly in swelling (t(36) = 2.43, p = .020).`)
  expect(listFindings(told)).toEqual(['major order-broken'])
})

test('p = .000 is a minor point', () => {
  const told = judgeManuscript(`# Results
    Gull noise and control differed significantly in sleep onset (t(36) = 8.10, p = .000).`)
  expect(listFindings(told)).toEqual(['minor p-out-of-range'])
})
