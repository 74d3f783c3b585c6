import { emptyInput, type CalculatorInput } from './calculator-input'

/** Invented: holdfasts of juvenile kelp on four substrates, all six pairs, as a manuscript might print them. */
export const kelpValues: CalculatorInput = {
  ...emptyInput,
  values: [
    'granite – slate\t.62',
    'granite – concrete\t.01',
    'granite – oyster shell\t<.001',
    'slate – concrete\t.019',
    'slate – oyster shell\t.002',
    'concrete – oyster shell\tt(36) = 1.39',
  ].join('\n'),
  groupCount: '4',
}

/** The same trial as the rows of its groups. */
export const kelpGroups: CalculatorInput = {
  ...emptyInput,
  mode: 'groups',
  groups: [
    'substrate\tn\tmean\tSD',
    'granite\t10\t41.2\t5.9',
    'slate\t10\t38.7\t6.4',
    'concrete\t10\t33.1\t5.2',
    'oyster shell\t10\t29.4\t6.1',
  ].join('\n'),
}
