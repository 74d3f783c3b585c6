'use client'

import { parseAsString, useQueryStates } from 'nuqs'
import { PERSON_STATUSES, ROLES } from '@/lib/rules/roles'
import { Input, Select } from '../ui/field'

/** What narrows the list of people; stands in the address, the server draws the rest. */
export function PeopleFilter() {
  const [given, setGiven] = useQueryStates(
    {
      search: parseAsString.withDefault(''),
      role: parseAsString.withDefault(''),
      status: parseAsString.withDefault(''),
    },
    { shallow: false, throttleMs: 300 },
  )
  return (
    <search className="flex grow flex-wrap gap-2">
      <Input
        type="search"
        aria-label="Search name, address or affiliation"
        placeholder="Search"
        className="max-w-64 sm:w-64"
        value={given.search}
        onChange={(event) => void setGiven({ search: event.target.value })}
      />
      <Select
        aria-label="Role"
        className="max-w-40"
        value={given.role}
        empty="Any role"
        options={ROLES.map((role) => ({ value: role, label: role }))}
        onChange={(event) => void setGiven({ role: event.target.value })}
      />
      <Select
        aria-label="Account"
        className="max-w-40"
        value={given.status}
        empty="Any account"
        options={PERSON_STATUSES.map((status) => ({ value: status, label: status }))}
        onChange={(event) => void setGiven({ status: event.target.value })}
      />
    </search>
  )
}
