import { PERMISSIONS, type ManuscriptRelation } from '@/lib/rules/permissions'
import { ROLES, type Role } from '@/lib/rules/roles'

const begin = '<!-- access:begin -->'
const end = '<!-- access:end -->'

/** The permission table as Markdown, for DEVELOPERS.md. */
export function writeAccessTable(): string {
  const rows = Object.entries(PERMISSIONS).map(([permission, grants]) => {
    const byRole: Partial<Record<Role, readonly ManuscriptRelation[]>> = grants
    return `| ${permission} | ${ROLES.map((role) => byRole[role]?.join(', ') ?? '–').join(' | ')} |`
  })
  return [`| permission | ${ROLES.join(' | ')} |`, `| --- |${' --- |'.repeat(ROLES.length)}`, ...rows].join(
    '\n',
  )
}

/** Puts the table between its marks in a page. */
export function insertAccessTable(page: string): string {
  const before = page.slice(0, page.indexOf(begin) + begin.length)
  return `${before}\n\n${writeAccessTable()}\n\n${page.slice(page.indexOf(end))}`
}

/** What stands between the marks, with the padding of the formatter folded. */
export function readAccessTable(page: string): string {
  return page
    .slice(page.indexOf(begin) + begin.length, page.indexOf(end))
    .trim()
    .replace(/ +/g, ' ')
    .replace(/-{3,}/g, '---')
}
