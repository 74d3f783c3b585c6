import { ButtonLink } from '@/components/ui/button'
import { EmptyState } from '@/components/ui/empty-state'
import { Mark } from '@/components/ui/mark'

export const metadata = { title: 'Nothing here' }

export default function NotFound() {
  return (
    <main className="mx-auto max-w-xl px-6 py-24">
      <Mark className="size-10" />
      <h1 className="mt-6 text-xl font-semibold">Nothing here</h1>
      <EmptyState
        action={
          <ButtonLink href="/" variant="primary">
            Go to the docket
          </ButtonLink>
        }
      >
        There is nothing at this address that you can open.
      </EmptyState>
    </main>
  )
}
