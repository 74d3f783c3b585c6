import { randomBytes } from 'node:crypto'

const prefixes = {
  person: 'pe',
  session: 'se',
  link: 'li',
  manuscript: 'ms',
  round: 'ro',
  file: 'fi',
  audit: 'au',
  assignment: 'as',
  conflict: 'co',
  change: 'ch',
  point: 'pt',
  comment: 'cm',
  verdict: 've',
  letter: 'le',
  answer: 'an',
  mail: 'ma',
  job: 'jo',
} as const

/** A new id such as `ms_3f0c…`: its prefix says what it names, the rest is 96 random bits. */
export function newId(kind: keyof typeof prefixes): string {
  return `${prefixes[kind]}_${randomBytes(12).toString('hex')}`
}
