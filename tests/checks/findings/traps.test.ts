import { expect, test } from 'vitest'
import {
  judgeManuscript,
  listFindings,
  listOutcomes,
  sayPairs,
  type Judgement,
} from '../../support/manuscript'
import { claim, kelp, level, tellPairs } from './kelp'

// What looks like a fault and is none. Each manuscript is made up and correct: notes at most.

function graver(told: Judgement): string[] {
  return listFindings(told).filter((each) => !each.startsWith('note'))
}

test('Bonferroni values at .05 that are right hold', () => {
  const told = judgeManuscript(kelp(claim, tellPairs({ print: 'bonferroni', called: [2, 4] })))
  expect(listOutcomes(told)).toEqual(['holds'])
  expect(graver(told)).toEqual([])
})

test('raw values at a lowered level that is rounded down hold', () => {
  const told = judgeManuscript(kelp(level, tellPairs({ print: 'raw', called: [2, 4] })))
  expect(listOutcomes(told)).toEqual(['holds'])
  expect(graver(told)).toEqual([])
})

test('.0167 for .05/3 is ordinary rounding', () => {
  const told = judgeManuscript(`# Methods
    The three pairs of coatings were compared with t tests; with Bonferroni's correction for three comparisons p < .0167 (.05/3) was regarded as significant.
    # Results
    ${sayPairs('drag', [
      ['Silicone', 'copper', 't(36) = 0.52', 'p = .606', false],
      ['Silicone', 'epoxy', 't(36) = 3.31', 'p = .002', true],
      ['Copper', 'epoxy', 't(36) = 2.84', 'p = .007', true],
    ])}`)
  expect(listOutcomes(told)).toEqual(['holds'])
  expect(graver(told)).toEqual([])
})

test('one planned comparison calls for no correction', () => {
  const told = judgeManuscript(`# Methods
    Growth was the primary outcome; lighting was compared with control by a t test.
    # Results
    Growth differed significantly between lighting and control (t(36) = 2.43, p = .020).`)
  expect(told.families).toEqual([])
  expect(told.findings).toEqual([])
})

test('an overall test is no member of the family of pairs', () => {
  const told = judgeManuscript(
    kelp(
      claim,
      `Substrates differed in attachment strength (F(3, 36) = 4.38, p = .010). ${tellPairs({ print: 'bonferroni', called: [2, 4] })}`,
    ),
  )
  expect(told.families[0]?.m).toMatchObject({ printed: 6, due: 6 })
  expect(graver(told)).toEqual([])
})

test('baseline and assumption checks are no members', () => {
  const told = judgeManuscript(
    kelp(
      claim,
      `${tellPairs({ print: 'bonferroni', called: [2, 4] })} Initial values were alike in all groups (all p > .05). Residuals did not depart from the normal distribution (W = 0.969, p = .34).`,
    ),
  )
  expect(told.families[0]?.m.printed).toBe(6)
  expect(graver(told)).toEqual([])
})

test('the abstract repeats a result and is no further test', () => {
  const source = kelp(claim, tellPairs({ print: 'bonferroni', called: [2, 4] }))
  const told = judgeManuscript(
    source.replace(
      'four substrates.',
      'four substrates. Granite and plastic differed significantly (adjusted p = .013).',
    ),
  )
  expect(told.families[0]?.m.printed).toBe(6)
  expect(graver(told)).toEqual([])
})

test('Tukey values are already adjusted and are held against .05', () => {
  const told = judgeManuscript(
    kelp(
      'All pairs of the four substrates were compared by the Tukey test.',
      tellPairs({ print: ['.954', '.089', '.011', '.218', '.036', '.680'], called: [2, 4] }),
    ),
  )
  expect(listOutcomes(told)).toEqual(['holds'])
  expect(graver(told)).toEqual([])
})

test('Dunnett values against one control count one comparison a group', () => {
  const told = judgeManuscript(`# Methods
    Three hatchery lamps were compared with darkness by Dunnett's test.
    # Results
    ${sayPairs('settlement', [
      ['Red lamp', 'darkness', 't(36) = 1.45', 'p = .346', false],
      ['Blue lamp', 'darkness', 't(36) = 2.71', 'p = .027', true],
      ['White lamp', 'darkness', 't(36) = 3.31', 'p = .006', true],
    ])}`)
  expect(told.families[0]?.m.due).toBe(3)
  expect(listOutcomes(told)).toEqual(['holds'])
  expect(graver(told)).toEqual([])
})

test('the least significant difference with three groups after a significant overall test is right', () => {
  const told = judgeManuscript(`# Methods
    Three coatings were compared by analysis of variance followed by Fisher's least significant difference test.
    # Results
    Coatings differed in drag (F(2, 36) = 5.90, p = .006). ${sayPairs('drag', [
      ['Silicone', 'copper', 't(36) = 0.52', 'p = .606', false],
      ['Silicone', 'epoxy', 't(36) = 3.31', 'p = .002', true],
      ['Copper', 'epoxy', 't(36) = 2.43', 'p = .020', true],
    ])}`)
  expect(listOutcomes(told)).toEqual(['holds'])
  expect(graver(told)).toEqual([])
})

test('Holm values that are carried forward and capped are right', () => {
  const told = judgeManuscript(
    kelp(
      'All six pairs of substrates were compared with t tests, and p values were adjusted by the method of Holm. Adjusted values below .05 were regarded as significant.',
      tellPairs({ print: ['.606', '.081', '.013', '.170', '.037', '.540'], called: [2, 4] }),
    ),
  )
  expect(listOutcomes(told)).toEqual(['holds'])
  expect(graver(told)).toEqual([])
})

test('a false discovery rate that is called one is right', () => {
  const told = judgeManuscript(
    kelp(
      'The false discovery rate over the six pairs was controlled at 5% by the Benjamini-Hochberg procedure; adjusted values below .05 were regarded as significant.',
      tellPairs({ print: ['.606', '.040', '.013', '.085', '.022', '.324'], called: [1, 2, 4] }),
    ),
  )
  expect(listOutcomes(told)).toEqual(['holds'])
  expect(graver(told)).toEqual([])
})

test('a sphericity correction explains a larger p with the printed df', () => {
  const told = judgeManuscript(`# Methods
    Sleep was compared by repeated-measures analysis of variance with the Greenhouse-Geisser correction.
    # Results
    Noise affected sleep onset (F(2, 38) = 3.60, p = .062).`)
  expect(graver(told)).toEqual([])
})

test('Welch degrees of freedom that are not printed explain a slightly larger p', () => {
  const told = judgeManuscript(`# Methods
    Groups were compared by Welch's t test.
    # Results
    Lighting and control differed in growth (t(38) = 2.10, p = .047).`)
  expect(graver(told)).toEqual([])
})

test('a statistic whose rounding straddles the level is not held against its p', () => {
  for (const p of ['.050', '.049'])
    expect(
      graver(
        judgeManuscript(`# Results
      Lighting and control were compared in growth (t(28) = 2.05, p = ${p}).`),
      ),
    ).toEqual([])
})

test('one-sided tests that are declared are judged one-sided', () => {
  const told = judgeManuscript(`# Methods
    Lighting was tested for superiority over control with one-sided t tests.
    # Results
    Lighting exceeded control in growth (t(36) = 2.43, p = .010).`)
  expect(graver(told)).toEqual([])
})

test('F with one numerator df and t of the same contrast are one test', () => {
  const told = judgeManuscript(
    kelp(
      claim,
      `${tellPairs({ print: 'bonferroni', called: [2, 4] })} Granite and plastic differed significantly in attachment strength (F(1, 36) = 10.96, adjusted p = .013).`,
    ),
  )
  expect(told.families[0]?.m.printed).toBe(6)
  expect(graver(told)).toEqual([])
})

test('two experiments are two families', () => {
  const told = judgeManuscript(`# Methods
    In Experiment 1 the three pairs of coatings were compared with t tests and Bonferroni-adjusted for three comparisons. In Experiment 2 the three pairs of lamps were compared with t tests and Bonferroni-adjusted for three comparisons. Adjusted values below .05 were regarded as significant.
    # Results
    ## Experiment 1
    ${sayPairs('drag', [
      ['Silicone', 'copper', 't(36) = 0.52', 'p = 1.000', false],
      ['Silicone', 'epoxy', 't(36) = 3.31', 'p = .006', true],
      ['Copper', 'epoxy', 't(36) = 2.84', 'p = .022', true],
    ])}
    ## Experiment 2
    ${sayPairs('settlement', [
      ['Red lamp', 'blue lamp', 't(36) = 1.45', 'p = .467', false],
      ['Red lamp', 'white lamp', 't(36) = 2.71', 'p = .031', true],
      ['Blue lamp', 'white lamp', 't(36) = 0.88', 'p = 1.000', false],
    ])}`)
  expect(listOutcomes(told)).toEqual(['holds', 'holds'])
  expect(told.families.map(({ m }) => m.due)).toEqual([3, 3])
  expect(graver(told)).toEqual([])
})

const behaviours = (lead: string) => `# Methods
    Four behaviours of tidal-pool snails were correlated with depth. ${lead}
    # Results
    Sinking was significantly correlated with depth (r(34) = .57, p < .001). Grazing was not significantly correlated with depth (r(34) = .13, p = .450). Molting was significantly correlated with depth (r(34) = .41, p = .013). Hiding was not significantly correlated with depth (r(34) = -.02, p = .908).`

test('tests that are declared exploratory get a note at most', () => {
  const told = judgeManuscript(
    behaviours('All analyses are exploratory, and no adjustment for multiplicity was made.'),
  )
  expect(graver(told)).toEqual([])
})

test('co-primary outcomes that must all succeed need no correction', () => {
  const told = judgeManuscript(`# Methods
    Growth and survival were co-primary endpoints; both had to be significant at .05.
    # Results
    Lighting and control differed significantly in growth (t(36) = 2.43, p = .020). They differed significantly in survival (t(36) = 2.21, p = .034).`)
  expect(graver(told)).toEqual([])
})

test('a hierarchy that stops where it should is right at the full level', () => {
  const told = judgeManuscript(`# Methods
    Endpoints were tested hierarchically in the prespecified order grip strength, pain and swelling, each at .05.
    # Results
    Splint and control differed significantly in grip strength (t(36) = 3.31, p = .002). They differed significantly in pain (t(36) = 2.43, p = .020). They did not differ significantly in swelling (t(36) = 1.45, p = .156).`)
  expect(graver(told)).toEqual([])
})

test('planned contrasts that are claimed one by one get a note at most', () => {
  const told = judgeManuscript(
    kelp(
      'Two planned contrasts were tested with t tests.',
      tellPairs({ print: 'raw', called: [2, 4], only: [2, 4] }),
    ),
  )
  expect(graver(told)).toEqual([])
})

test('a planned m above the comparisons shown is not held against the authors', () => {
  const told = judgeManuscript(
    kelp(
      'All pairs of the four substrates were compared with t tests and Bonferroni-corrected for six comparisons; the significant ones are reported. Adjusted values below .05 were regarded as significant.',
      tellPairs({ print: 'bonferroni', called: [2, 4], only: [2, 4] }),
    ),
  )
  expect(told.families[0]?.m).toMatchObject({ printed: 2, due: 6 })
  expect(graver(told)).toEqual([])
})

test('bounds instead of values are judged as bounds', () => {
  const told = judgeManuscript(
    kelp(claim, tellPairs({ print: ['> .999', '.121', '.013', '.339', '< .05', '> .999'], called: [2, 4] })),
  )
  expect(listOutcomes(told)).toEqual(['holds'])
  expect(graver(told)).toEqual([])
})

test('covariate-adjusted estimates are no corrected p-values', () => {
  const told = judgeManuscript(`# Methods
    Growth was compared by analysis of covariance, adjusted for shell length.
    # Results
    Growth adjusted for shell length differed significantly between lighting and control (t(36) = 2.43, p = .020).`)
  expect(told.findings).toEqual([])
})

test('a p-value of another study is no result of this one', () => {
  const told = judgeManuscript(`# Introduction
    An earlier study reported a difference between red and blue lamps (t(20) = 2.43, p = .500).
    # Results
    Lighting and control differed significantly in growth (t(36) = 2.43, p = .020).`)
  expect(told.findings).toEqual([])
})

test('several uncorrected tests whose calls all stand by Holm get a note', () => {
  const told = judgeManuscript(
    behaviours('')
      .replace('p = .013', 'p = .300')
      .replace('.41', '.18')
      .replace('Molting was', 'Molting was not'),
  )
  expect(graver(told)).toEqual([])
})

test('a results file with unadjusted values does not contradict adjusted values in the text', () => {
  const told = judgeManuscript(kelp(claim, tellPairs({ print: 'bonferroni', called: [2, 4] })), {
    results: `comparison;t;df;p
      granite - slate;0.52;36;0.606
      granite - concrete;2.43;36;0.020
      granite - plastic;3.31;36;0.002
      slate - concrete;1.97;36;0.057
      slate - plastic;2.84;36;0.007
      concrete - plastic;1.12;36;0.270`,
  })
  expect(told.families[0]?.m.printed).toBe(6)
  expect(graver(told)).toEqual([])
})

test('the order of two groups and the sign of the statistic do not tell tests apart', () => {
  const told = judgeManuscript(kelp(claim, tellPairs({ print: 'bonferroni', called: [2, 4] })), {
    results: `comparison;t;df;p adj
      slate - granite;-0.52;36;1.000
      concrete - granite;-2.43;36;0.121
      plastic - granite;-3.31;36;0.013
      concrete - slate;-1.97;36;0.339
      plastic - slate;-2.84;36;0.044
      plastic - concrete;-1.12;36;1.000`,
  })
  expect(told.families[0]?.m.printed).toBe(6)
  expect(graver(told)).toEqual([])
})

test('that printed values are uncorrected is no denial of the lowered level they are held against', () => {
  const told = judgeManuscript(
    kelp(
      `${level} Uncorrected P values of attachment strength on granite, slate, concrete and plastic are given.`,
      tellPairs({ print: 'raw', called: [2, 4] }),
    ),
  )
  expect(listOutcomes(told)).toEqual(['holds'])
  expect(graver(told)).toEqual([])
})
