import fc from 'fast-check'
import { expect, test } from 'vitest'
import { readValues } from '@/lib/checks/calculate/read-values'

const read = (text: string) =>
  readValues(text).entries.map(({ name, printed, low, high }) => ({ name, printed, low, high }))
const values = (text: string) => readValues(text).entries.map((entry) => entry.value)
const names = (text: string) => readValues(text).entries.map((entry) => entry.name)

test('bare values are read one a line, or separated by spaces, commas, semicolons, bars and tabs', () => {
  const three = [0.001, 0.008, 0.012]
  expect(values('0.001\n.008\r\n0.012\n')).toEqual(three)
  expect(values('.001 .008 0.012')).toEqual(three)
  expect(values('0.001,0.008, 0.012')).toEqual(three)
  expect(values('.001;.008 ; .012')).toEqual(three)
  expect(values('.001\t.008\t.012')).toEqual(three)
  expect(values('.001 | .008 | .012')).toEqual(three)
  expect(values('p-value\n0.001\n0.008\n0.012')).toEqual(three)
})

test('a decimal comma is told from a separating one', () => {
  expect(values('0,001\n0,008\n,012')).toEqual([0.001, 0.008, 0.012])
  expect(values('0,001; 0,008; 0,012')).toEqual([0.001, 0.008, 0.012])
  expect(values('1,000 0,5')).toEqual([1, 0.5])
  expect(values('1e-10,1e-9')).toEqual([1e-10, 1e-9])
  expect(values('0.5,0.01')).toEqual([0.5, 0.01])
})

test('each value stands for the interval of its rounding, and a relation for what it leaves open', () => {
  expect(read('.008')).toEqual([{ name: '', printed: '.008', low: 0.0075, high: 0.0085 }])
  expect(read('< 0.001')).toEqual([{ name: '', printed: '<0.001', low: 0, high: 0.001 }])
  expect(read('p > .20')).toMatchObject([{ low: 0.2, high: 1 }])
  expect(readValues('ns', { alpha: 0.01 }).entries).toMatchObject([{ low: 0.01, high: 1, relation: '>' }])
  expect(read('3.2e-5')).toMatchObject([{ low: 3.15e-5, high: 3.25e-5 }])
})

test('names stand before or after their value, with numbers and separators of their own', () => {
  expect(read('granite – slate 0.032')).toMatchObject([
    { name: 'granite – slate', low: 0.0315, high: 0.0325 },
  ])
  expect(names('A – B; 0.032\nB vs C: <.001\n0.2 C to D\nDose 1 0.4\nGene 7\t.03')).toEqual([
    'A – B',
    'B vs C',
    'C to D',
    'Dose 1',
    'Gene 7',
  ])
})

test('a statistic gives its p-value with the rounding of the statistic', () => {
  // R: 2 * pt(c(2.055, 2.05, 2.045), 28, lower.tail = FALSE)
  const [entry] = readValues('A – B; t(28) = 2.05').entries
  expect(entry).toMatchObject({ name: 'A – B', printed: 't(28) = 2.05', relation: '=' })
  expect(entry?.low).toBeCloseTo(0.04931582802, 10)
  expect(entry?.value).toBeCloseTo(0.04983393758, 10)
  expect(entry?.high).toBeCloseTo(0.05035685176, 10)
  // R: pf(3.60, 2, 38, lower.tail = FALSE); 2 * pt(.35 * sqrt(48 / (1 - .35^2)), 48, lower.tail = FALSE)
  expect(values('F(2, 38) = 3.60')[0]).toBeCloseTo(0.03700480111, 10)
  expect(values('r(48) = .35')[0]).toBeCloseTo(0.01271544514, 10)
  expect(values('z = −1.96')[0]).toBeCloseTo(0.049996, 5)
})

test('one-sided statistics keep their direction: the wrong tail is above one half', () => {
  const p = (sides: 'greater' | 'less') => readValues('t(28) = -2.05', { sides }).entries[0]?.value ?? NaN
  expect(p('less')).toBeCloseTo(0.02491696879, 10)
  expect(p('greater')).toBeCloseTo(1 - 0.02491696879, 10)
  const [entry] = readValues('t(28) = -2.05', { sides: 'greater' }).entries
  expect((entry?.low ?? 1) < (entry?.value ?? 0) && (entry?.value ?? 1) < (entry?.high ?? 0)).toBe(true)
})

test('a p-value and its statistic narrow each other, and a p-value beside an adjusted one is the raw one', () => {
  const [both] = readValues('A – B: t(28) = 2.05, p = .05').entries
  expect(both?.low).toBeCloseTo(0.04931582802, 10)
  expect(both?.high).toBeCloseTo(0.05035685176, 10)
  const [pair] = readValues('A – B: p = .008, adjusted p = .024').entries
  expect(pair).toMatchObject({ low: 0.0075, high: 0.0085, adjusted: { low: 0.0235, high: 0.0245 } })
})

test('a table is read by its header: names, raw and adjusted p, weights', () => {
  const text =
    'Comparison\tt\tp\tp adj (Bonferroni)\tweight\n"A, B" vs C\t2.1\t0.008\t0.024\t0.5\nA vs D\t1.1\t.2\t.6\t0.25\n'
  const found = readValues(text)
  expect(found.header).toEqual(['Comparison', 't', 'p', 'p adj (Bonferroni)', 'weight'])
  expect(found.columns).toEqual({ name: 0, value: 2, adjusted: 3, weight: 4 })
  expect(found.entries).toMatchObject([
    { line: 2, name: 'A, B vs C', printed: '0.008', adjusted: { printed: '0.024' }, weight: 0.5 },
    { line: 3, name: 'A vs D', printed: '.2', weight: 0.25 },
  ])
  expect(readValues(text, { columns: { value: 3, name: null } }).entries[0]).toMatchObject({
    name: '',
    value: 0.024,
  })
})

test('tables with commas, semicolons and decimal commas, and two columns of groups', () => {
  expect(
    readValues('outcome,P value\n"growth, wet",0.01\nlength,<0.001').entries.map((one) => one.name),
  ).toEqual(['growth, wet', 'length'])
  expect(values('group;p\na;0,01\nb;0,2')).toEqual([0.01, 0.2])
  expect(names('group 1,group 2,p\nrock,sand,0.01')).toEqual(['rock – sand'])
})

test('a column whose head says adjusted is told, as it would be corrected twice', () => {
  expect(readValues('pair,p adj\na,.01\nb,.02')).toMatchObject({ scale: 'adjusted', columns: { value: 1 } })
  expect(readValues('pair,p\na,.01\nb,.02').scale).not.toBe('adjusted')
  expect(readValues('.01 .02').scale).toBe('unknown')
})

test('a table of statistics needs their degrees of freedom', () => {
  expect(readValues('pair,t,df\na,2.05,28\nb,1.00,').entries).toHaveLength(1)
  expect(readValues('pair,t,df\na,2.05,28\nb,1.00,').unread).toMatchObject([{ line: 3 }])
})

test('what is no p-value is listed with its line and its reason, and nothing is lost', () => {
  const found = readValues('A 0.01\nB 1.2\nC -0.3\nD −0.3\nhello there\nNaN\n0.5 x 0.6\n1.5')
  expect(found.entries.map((one) => one.name)).toEqual(['A'])
  expect(found.unread.map((one) => one.line)).toEqual([2, 3, 4, 5, 6, 7, 8])
  expect(found.unread.every((one) => one.why !== '' && one.text !== '')).toBe(true)
  expect(readValues('U = 33').unread).toHaveLength(1)
  expect(readValues('t = 2.05').unread).toHaveLength(1)
})

test('numbers beyond the floating point stay intervals above zero', () => {
  expect(read('1e-400')).toMatchObject([{ low: 0, high: 1e-300 }])
  expect(read('0')).toMatchObject([{ low: 0, high: 0.5 }])
  expect(read('0.000')).toMatchObject([{ low: 0, high: 0.0005 }])
})

test('any text is read without a throw, and every entry is an interval in [0, 1]', () => {
  const pieces = fc.constantFrom(
    '0.03',
    ',',
    ';',
    '\t',
    '\n',
    'p = ',
    't(28) = ',
    '"',
    'name',
    '<',
    '-',
    '1e',
    '\u2212',
    ' ',
  )
  fc.assert(
    fc.property(
      fc.oneof(
        fc.string({ unit: 'grapheme' }),
        fc.array(pieces).map((all) => all.join('')),
      ),
      (text) => {
        for (const { low, high, value } of readValues(text).entries) {
          expect(low >= 0 && low <= high && high <= 1 && value >= 0 && value <= 1).toBe(true)
        }
      },
    ),
    { numRuns: 2000 },
  )
})

test('a megabyte is read whole: of numbers, of words, in one line or in many', () => {
  const number = '0.0123'
  const count = Math.floor(1_000_000 / (number.length + 1))
  const many = readValues(new Array<string>(count).fill(number).join('\n'))
  expect(many.entries).toHaveLength(100_000)
  expect(many.cut).toBe(count - 100_000)
  expect(readValues(new Array<string>(count).fill(number).join(' ')).cut).toBe(count - 100_000)
  expect(readValues('kelp '.repeat(200_000)).unread).toHaveLength(1)
  expect(readValues('kelp = p(\n'.repeat(100_000)).unread.at(-1)?.why).toMatch(/not looked at/)
})
