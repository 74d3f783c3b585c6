import { expect, test } from 'vitest'
import { listScreens } from '@/components/shell/menu'
import { systemActor, type Role } from '@/lib/rules/roles'

const see = (...roles: Role[]) =>
  listScreens({ ...systemActor, kind: 'person', id: 'pe_1', roles }).map((screen) => screen.href)

test('the rail shows what the roles may open and nothing else', () => {
  expect(see('submitter')).toEqual(['/docket', '/hand-in', '/calculator'])
  expect(see('reviewer')).toEqual(['/docket', '/calculator', '/house-rules'])
  expect(see('editor')).toEqual(['/docket', '/calculator', '/figures', '/house-rules', '/people', '/record'])
  expect(see('administrator')).toEqual(['/calculator', '/people', '/record', '/mailbox'])
  expect(see()).toEqual([])
})

test('several roles see the union, once each', () => {
  expect(see('submitter', 'reviewer', 'editor', 'administrator')).toEqual([
    '/docket',
    '/hand-in',
    '/calculator',
    '/figures',
    '/house-rules',
    '/people',
    '/record',
    '/mailbox',
  ])
})
