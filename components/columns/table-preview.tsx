import type { TableDescription } from '@/lib/checks'
import type { NamedRole } from '@/lib/checks/vocabulary'
import { classes } from '../ui/classes'
import { Select } from '../ui/field'
import { letterOf, roleOptions, roleWords } from './role-words'

type TablePreviewProps = {
  table: TableDescription
  /** Tells it from the other tables of the file, for the screen reader. */
  name: string
  /** Left out where one may only look. */
  onRole?: (column: number, role: NamedRole) => void
}

/** Columns of words; all others are set as numbers. */
const ofWords = new Set<NamedRole>([
  'comparison',
  'group',
  'second-group',
  'outcome',
  'label',
  'unused',
  'call',
  'marks',
])

/** The first rows of one table with a list over each column that says what it holds. */
export function TablePreview({ table, name, onRole }: TablePreviewProps) {
  return (
    <div
      className="overflow-x-auto border border-rule bg-sheet"
      role="region"
      aria-label={`Columns of ${name}`}
      tabIndex={0}
    >
      <table className="tabular border-collapse text-left text-sm">
        <caption className="sr-only">{name}: the first rows, with what each column was taken for</caption>
        <thead>
          <tr className="align-top">
            {table.columns.map(({ column, header, role, named }) => (
              <th key={column} scope="col" className="min-w-52 border-b border-edge px-2 py-2 font-normal">
                <RoleChoice
                  label={`Column ${letterOf(column)}${header ? `, “${header}”` : ''}, holds`}
                  role={role}
                  {...(onRole ? { onRole: (next) => onRole(column, next) } : {})}
                />
                <span
                  className={classes('mt-1 block text-xs', named ? 'font-medium text-tide' : 'text-ink-soft')}
                >
                  {named ? 'named by hand' : 'as found'}
                </span>
                <span className="mt-1 block font-semibold">
                  <span className="mr-1.5 font-mono text-xs font-normal text-ink-soft">
                    {letterOf(column)}
                  </span>
                  {header || <span className="font-normal text-ink-soft">no head</span>}
                </span>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {table.sample.map((number, r) => (
            <tr key={number ?? r} className="border-b border-rule">
              {table.columns.map(({ column, role, cells }) => (
                <td
                  key={column}
                  className={classes(
                    'max-w-64 truncate px-2 py-1',
                    !ofWords.has(role) && 'text-right',
                    role === 'unused' && 'text-ink-soft',
                  )}
                >
                  {cells[r]}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
        <tfoot>
          <tr>
            {table.columns.map(({ column, role, reads, filled }) => (
              <td key={column} className="px-2 py-1.5 text-xs text-ink-soft">
                {role === 'unused' ? 'not read' : `${reads} of ${filled} read`}
              </td>
            ))}
          </tr>
        </tfoot>
      </table>
    </div>
  )
}

type RoleChoiceProps = { label: string; role: NamedRole; onRole?: (role: NamedRole) => void }

function RoleChoice({ label, role, onRole }: RoleChoiceProps) {
  if (!onRole) return <span className="block font-medium">{roleWords[role]}</span>
  return (
    <Select
      aria-label={label}
      value={role}
      options={roleOptions}
      onChange={(event) => {
        const chosen = roleOptions.find(({ value }) => value === event.target.value)
        if (chosen) onRole(chosen.value)
      }}
    />
  )
}
