import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { record } from '@/db/schema'
import { makeManuscript, makeWorld } from '../support/world'

test('a line of the record can be neither changed nor deleted', () => {
  const { db, ...world } = makeWorld()
  makeManuscript({ db, ...world }, 'received')
  const all = () => db.select().from(record).all()
  const before = all()
  expect(before.length).toBeGreaterThan(0)
  const only = eq(record.sequence, before[0]?.sequence ?? 0)
  expect(() => db.update(record).set({ actorName: 'Nobody' }).where(only).run()).toThrow('append-only')
  expect(() => db.delete(record).where(only).run()).toThrow('append-only')
  expect(all()).toEqual(before)
})

test('the record holds no word of a manuscript, a letter, a comment or a remark', () => {
  const world = makeWorld()
  makeManuscript(world, 'closed')
  const all = JSON.stringify(world.db.select().from(record).all())
  for (const word of ['Kelp', 'kelp', 'granite', 'Dear authors', 'careful paper', 'Bonferroni']) {
    expect(all).not.toContain(word)
  }
})
