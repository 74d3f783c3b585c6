import { DAMAGES } from './damages'
import { FORMATS, type makeFixtures, type Format } from './fixtures'
import { makeRandom } from './random'

export type DamagedFile = { number: number; format: Format; damage: string; bytes: Buffer }

/** File `number` of the run with this seed: the same bytes in every run. */
export function makeCase(
  fixtures: Awaited<ReturnType<typeof makeFixtures>>,
  seed: number,
  number: number,
): DamagedFile {
  const random = makeRandom(Math.imul(seed, 2_654_435_761) ^ (number * 7919))
  // Every damage in turn, its formats by chance.
  const { name, to, damage } = DAMAGES[number % DAMAGES.length] ?? DAMAGES[0]
  const format = to[random.below(to.length)] ?? FORMATS[0]
  return { number, format, damage: name, bytes: damage(fixtures, format, random) }
}
