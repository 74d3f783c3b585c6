import { Lock, Mail, UserRound } from 'lucide-react'
import type { Audience } from '@/lib/rules/words'

export const audienceWords: Record<Audience, string> = {
  authors: 'for the authors',
  editor: 'for the editor',
  private: 'private',
}

const looks = {
  authors: { icon: Mail, look: 'border-tide bg-tide-wash text-tide-deep' },
  editor: { icon: UserRound, look: 'border-edge bg-sheet text-ink' },
  private: { icon: Lock, look: 'border-dashed border-edge bg-sunken text-ink' },
} as const

/** Who can read a comment: by word, sign and border, never by colour alone. */
export function AudienceMark({ audience }: { audience: Audience }) {
  const { icon: Icon, look } = looks[audience]
  return (
    <span
      className={`inline-flex h-5 items-center gap-1 rounded-sm border px-1.5 text-xs whitespace-nowrap ${look}`}
    >
      <Icon className="size-3" aria-hidden="true" />
      {audienceWords[audience]}
    </span>
  )
}
