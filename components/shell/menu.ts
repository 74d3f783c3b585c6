import { may, type Permission } from '@/lib/rules/permissions'
import type { Actor } from '@/lib/rules/roles'

type Screen = { href: string; label: string; permission: Permission }

const screens: readonly Screen[] = [
  { href: '/docket', label: 'Docket', permission: 'docket.list' },
  { href: '/hand-in', label: 'Hand in', permission: 'draft.create' },
  { href: '/calculator', label: 'Calculator', permission: 'calculator.use' },
  { href: '/figures', label: 'Figures', permission: 'figures.read' },
  { href: '/house-rules', label: 'House rules', permission: 'house-rules.read' },
  { href: '/people', label: 'People', permission: 'people.list' },
  { href: '/record', label: 'Record', permission: 'record.read' },
  { href: '/mailbox', label: 'Mailbox', permission: 'mailbox.read' },
]

/** The screens of the rail that the table of permissions grants this actor, in their order. */
export function listScreens(actor: Actor): { href: string; label: string }[] {
  return screens.filter((screen) => may(actor, screen.permission)).map(({ href, label }) => ({ href, label }))
}
