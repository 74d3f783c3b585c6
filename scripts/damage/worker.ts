import { makeCase } from './cases'
import { makeFixtures } from './fixtures'
import { takeIn } from './intake'

// One of the processes of the run: takes in the files it is told the numbers of.
const fixtures = await makeFixtures()
process.on('message', async ({ seed, number }: { seed: number; number: number }) => {
  const { format, damage, bytes } = makeCase(fixtures, seed, number)
  process.send?.({ number, format, damage, ...(await takeIn(format, bytes, fixtures.pdf)) })
})
process.send?.({ ready: true })
