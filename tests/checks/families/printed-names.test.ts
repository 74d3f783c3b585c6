import { expect, test } from 'vitest'
import { findPrintedNames } from '@/lib/checks/families/printed-names'
import { judgeManuscript, sayPairs } from '../../support/manuscript'

// All names and manuscripts are made up.

test('a name is shown as it is printed first', () => {
  const print = findPrintedNames(['20 °C', 'pH 7.5', 'UV light', 'the control group (n = 12)', 'A10'], '')
  expect(['20 °c', 'ph 7 5', 'uv light', 'control', 'a10'].map(print)).toEqual([
    '20 °C',
    'pH 7.5',
    'UV light',
    'control',
    'A10',
  ])
  expect(print('never printed')).toBe('never printed')
})

test('a capital that only begins a sentence goes, one that belongs to the name stays', () => {
  const names = ['Dense meadow', 'dense meadow', 'Arlen', 'Dunja', 'Slate', 'No cue', 'Mg']
  const print = findPrintedNames(
    names,
    'Ropes from Arlen were hung beside slate and Dunja with no cue, 3 mg.',
  )
  expect(['dense meadow', 'arlen', 'dunja', 'slate', 'no cue', 'mg'].map(print)).toEqual([
    'dense meadow',
    'Arlen',
    'Dunja',
    'slate',
    'no cue',
    'Mg',
  ])
})

test('a bare number or letter keeps the noun beside it', () => {
  const print = findPrintedNames(['group 1', 'site B'], '')
  expect(print('1')).toBe('group 1')
  expect(print('site b')).toBe('site B')
})

test('families and findings speak of groups as the manuscript prints them', () => {
  const told = judgeManuscript(`# Methods
    Rope strength was compared between the three sites Arlen, Dunja and Port Vael with t tests, Bonferroni-corrected for three comparisons. The p-values given are uncorrected. Differences with p below .05 were taken as significant.
    # Results
    ${sayPairs('rope strength', [
      ['Arlen', 'Dunja', 't(30) = 2.20', 'p = .036', true],
      ['Arlen', 'Port Vael', 't(30) = 3.90', 'p < .001', true],
      ['Dunja', 'Port Vael', 't(30) = 1.70', 'p = .099', false],
    ])}`)
  const finding = told.findings.find(({ rule }) => rule === 'call-not-upheld')
  expect(finding?.says).toContain('Arlen – Dunja')
  expect(finding?.asks).toContain('Arlen – Dunja')
})
