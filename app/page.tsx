import { redirect } from 'next/navigation'
import { listScreens } from '@/components/shell/menu'
import { requireActor } from '@/lib/web/actor'

/** Sends everyone to the first screen that their roles open. */
export default async function Home() {
  const [first] = listScreens(await requireActor())
  redirect(first?.href ?? '/account')
}
