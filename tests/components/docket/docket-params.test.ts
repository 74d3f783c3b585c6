import { expect, test } from 'vitest'
import {
  isNarrowed,
  loadDocketParams,
  serializeDocketParams,
  toDocketFilter,
  toDocketQuery,
} from '@/components/docket/docket-params'
import { docketFilter } from '@/lib/rules/docket'

const load = (search: string) => loadDocketParams(new URLSearchParams(search))

test('an empty address asks for the first page, newest first', () => {
  expect(toDocketFilter(load(''), ['editor'])).toEqual({
    states: [],
    search: '',
    mine: false,
    sort: 'received',
    direction: 'desc',
    page: 1,
    pageSize: 50,
  })
})

test('a reviewer finds the most urgent first, and so does who looks at their own reviews', () => {
  expect(toDocketFilter(load(''), ['reviewer'])).toMatchObject({ sort: 'due', direction: 'asc' })
  expect(toDocketFilter(load('as=reviewer'), ['reviewer', 'editor'])).toMatchObject({
    as: 'reviewer',
    sort: 'due',
    direction: 'asc',
  })
})

test('what the address says of the order goes before the habit of the role', () => {
  const filter = toDocketFilter(load('sort=title&direction=desc'), ['reviewer'])
  expect(filter).toMatchObject({ sort: 'title', direction: 'desc' })
})

test('a part that one does not have is not asked for', () => {
  expect(toDocketFilter(load('as=editor'), ['submitter'])).not.toHaveProperty('as')
})

test('what the address cannot mean is left out, and a page below one is the first', () => {
  const filter = toDocketFilter(load('states=ready,lost&outcome=maybe&due=never&page=-3'), ['editor'])
  expect(filter).toMatchObject({ states: ['ready'], page: 1 })
  expect(filter).not.toHaveProperty('outcome')
  expect(filter).not.toHaveProperty('due')
})

test('states with a space in their name survive the way through the address', () => {
  const address = serializeDocketParams('/docket', { states: ['in review', 'verdict drafted'] })
  expect(load(address.split('?')[1] ?? '').states).toEqual(['in review', 'verdict drafted'])
})

test('the query string is read by the schema of the docket as the filter that it came from', () => {
  const filter = toDocketFilter(
    load(
      'states=ready,in%20review&outcome=fails&due=this%20week&mine=true&search=kelp%20%26%20oyster&page=3',
    ),
    ['editor'],
  )
  const query = new URLSearchParams(toDocketQuery(filter))
  const read = Object.fromEntries(
    [...query.keys()].map((name) => [
      name,
      query.getAll(name).length > 1 ? query.getAll(name) : query.get(name),
    ]),
  )
  expect(docketFilter.parse(read)).toEqual(filter)
})

test('a single state is read by the schema too', () => {
  const filter = toDocketFilter(load('states=stuck'), ['editor'])
  const read = Object.fromEntries(new URLSearchParams(toDocketQuery(filter)))
  expect(docketFilter.parse(read).states).toEqual(['stuck'])
})

test('order and page narrow nothing; state, search, outcome, due date and "mine" do', () => {
  expect(isNarrowed(load('sort=title&page=2&as=editor'))).toBe(false)
  for (const search of ['states=ready', 'search=x', 'outcome=holds', 'due=overdue', 'mine=true']) {
    expect(isNarrowed(load(search))).toBe(true)
  }
})
