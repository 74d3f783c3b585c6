import { expect, test } from 'vitest'
import { makeSteps } from '@/components/manuscripts/state-steps'
import { STATES, type State } from '@/lib/rules/states'

const manuscript = (state: State) => ({
  state,
  stateSince: 900,
  receivedAt: 100,
  assignment: {
    id: 'as_1',
    reviewer: { id: null, name: 'Reviewer 1' },
    status: 'accepted' as const,
    dueAt: 999,
    offeredAt: 300,
    answeredAt: 400,
  },
  verdict: null,
  round: 1,
  progress: { finishedAt: 200 },
})

test('what lies behind has its date, the present step the date of the state, the rest none', () => {
  const steps = makeSteps(manuscript('in review'))
  expect(steps.map((step) => [step.label, step.status, step.at])).toEqual([
    ['received', 'done', 100],
    ['audited', 'done', 200],
    ['assigned', 'done', 300],
    ['in review', 'now', 900],
    ['verdict drafted', 'to come', null],
    ['returned', 'to come', null],
    ['closed', 'to come', null],
  ])
})

test('an audit that is stuck stands in the place of the audit', () => {
  expect(makeSteps(manuscript('stuck')).find((step) => step.status === 'now')?.label).toBe('stuck')
})

test('a withdrawn manuscript goes no further', () => {
  expect(makeSteps(manuscript('withdrawn')).map((step) => step.label)).toEqual(['received', 'withdrawn'])
})

test('every state but the draft has one present step', () => {
  for (const state of STATES.filter((one) => one !== 'draft')) {
    expect(makeSteps(manuscript(state)).filter((step) => step.status === 'now')).toHaveLength(1)
  }
  expect(makeSteps(manuscript('draft'))).toEqual([])
})
