import type { Metadata } from 'next'
import { cache } from 'react'
import { getDb } from '@/db/current'
import { getManuscript } from '@/db/queries/manuscript'
import { requireActor } from '@/lib/web/actor'

/** The manuscript of the address as the viewer may see it, or null; once a request. */
export const findManuscript = cache(async (manuscriptId: string) =>
  getManuscript(getDb(), await requireActor(), manuscriptId),
)

export async function manuscriptTitle(manuscriptId: string, screen?: string): Promise<Metadata> {
  const manuscript = await findManuscript(manuscriptId)
  const name = manuscript?.reference ?? manuscript?.title ?? 'Manuscript'
  return { title: screen ? `${screen}, ${name}` : name }
}
