'use client'

import { Ellipsis } from 'lucide-react'
import type { PersonRow } from '@/db/queries/people'
import { IconButton } from '../ui/icon-button'
import { Menu, type MenuItem } from '../ui/menu'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { Tag } from '../ui/tag'

type PeopleTableProps = {
  people: readonly PersonRow[]
  ownId: string
  mayChange: boolean
  onChange: (person: PersonRow) => void
  onInviteAgain: (person: PersonRow) => void
  onStatus: (person: PersonRow, status: 'active' | 'disabled') => void
}

export function PeopleTable(props: PeopleTableProps) {
  return (
    <Table caption="People" stacks>
      <Thead>
        <Tr>
          <Th>Name</Th>
          <Th>Roles</Th>
          <Th>E-mail address</Th>
          <Th>Affiliation</Th>
          <Th>Account</Th>
          {props.mayChange ? (
            <Th>
              <span className="sr-only">What one can do</span>
            </Th>
          ) : null}
        </Tr>
      </Thead>
      <Tbody>
        {props.people.map((person) => (
          <Tr key={person.id}>
            <RowTh className="font-medium">
              {person.name}
              {person.expertise ? (
                <span className="block text-xs font-normal text-ink-soft max-md:hidden">
                  {person.expertise}
                </span>
              ) : null}
            </RowTh>
            <Td label="Roles">{person.roles.join(', ')}</Td>
            <Td label="E-mail" className="break-all">
              {person.email}
            </Td>
            <Td label="Affiliation">{person.affiliation || '–'}</Td>
            <Td label="Account">
              <Tag
                tone={
                  person.status === 'disabled'
                    ? 'fails'
                    : person.status === 'invited'
                      ? 'undecidable'
                      : 'plain'
                }
              >
                {person.status}
              </Tag>
            </Td>
            {props.mayChange ? (
              <Td className="text-right max-md:absolute max-md:top-1 max-md:right-0">
                <Menu
                  trigger={
                    <IconButton label={`What to do with ${person.name}`}>
                      <Ellipsis />
                    </IconButton>
                  }
                  items={listItems(person, props)}
                />
              </Td>
            ) : null}
          </Tr>
        ))}
      </Tbody>
    </Table>
  )
}

function listItems(person: PersonRow, props: PeopleTableProps): MenuItem[] {
  const own = person.id === props.ownId
  return [
    { label: 'Change…', onSelect: () => props.onChange(person) },
    ...(person.status === 'invited'
      ? [{ label: 'Send the invitation again', onSelect: () => props.onInviteAgain(person) }]
      : []),
    ...(person.status === 'disabled'
      ? [{ label: 'Let in again', onSelect: () => props.onStatus(person, 'active') }]
      : [
          {
            label: 'Disable',
            danger: true,
            disabled: own,
            onSelect: () => props.onStatus(person, 'disabled'),
          },
        ]),
  ]
}
