import { createHash, randomBytes } from 'node:crypto'
import { and, eq, gt, isNull } from 'drizzle-orm'
import type { Reader, Tx } from '@/db/client'
import { newId } from '@/db/ids'
import { mailedLinks, people } from '@/db/schema'
import { refuse } from '@/lib/rules/refusal'
import type { LinkPurpose } from '@/lib/rules/words'

const lasts: Record<LinkPurpose, number> = { invitation: 7 * 24 * 3_600_000, password: 3_600_000 }

/** Makes a link's token; the database keeps its hash alone, so the token must be mailed at once. */
export function createMailedLink(tx: Tx, personId: string, purpose: LinkPurpose, now: number): string {
  const token = randomBytes(32).toString('base64url')
  tx.insert(mailedLinks)
    .values({
      id: newId('link'),
      purpose,
      personId,
      tokenHash: hashToken(token),
      createdAt: now,
      expiresAt: now + lasts[purpose],
    })
    .run()
  return token
}

/** Whose link it is while it can be used; null afterwards. */
export function findMailedLink(db: Reader, token: string, purpose: LinkPurpose, now: number) {
  const found = db
    .select({ personId: people.id, name: people.name, email: people.email, status: people.status })
    .from(mailedLinks)
    .innerJoin(people, eq(people.id, mailedLinks.personId))
    .where(usable(token, purpose, now))
    .get()
  return found && found.status !== 'disabled' ? found : null
}

/** Refuses a link that was used, has expired or never was. */
export function requireMailedLink(db: Reader, token: string, purpose: LinkPurpose, now: number) {
  const found = findMailedLink(db, token, purpose, now)
  if (!found) throw refuse('invalid', 'This link was used or has expired; please ask for a new one.')
  return found
}

/** Uses a link up, and with it every other link of the same purpose that the person holds. */
export function takeMailedLink(tx: Tx, token: string, purpose: LinkPurpose, now: number) {
  const found = requireMailedLink(tx, token, purpose, now)
  tx.update(mailedLinks)
    .set({ usedAt: now })
    .where(
      and(
        eq(mailedLinks.personId, found.personId),
        eq(mailedLinks.purpose, purpose),
        isNull(mailedLinks.usedAt),
      ),
    )
    .run()
  return found
}

function usable(token: string, purpose: LinkPurpose, now: number) {
  return and(
    eq(mailedLinks.tokenHash, hashToken(token)),
    eq(mailedLinks.purpose, purpose),
    isNull(mailedLinks.usedAt),
    gt(mailedLinks.expiresAt, now),
  )
}

function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex')
}
