import { ButtonLink } from '../ui/button'
import { Notice } from '../ui/notice'

/** What stands where a mailed link no longer works. */
export function SpentLink({ invitation }: { invitation?: boolean }) {
  return (
    <>
      <h1 className="mb-4 text-xl font-semibold">This link no longer works</h1>
      <Notice tone="care">
        It was used or has expired.{' '}
        {invitation ? 'Whoever invited you can send a new one.' : 'You can ask for a new one.'}
      </Notice>
      <ButtonLink href={invitation ? '/sign-in' : '/forgot'} className="mt-4">
        {invitation ? 'Go to sign-in' : 'Ask for a new link'}
      </ButtonLink>
    </>
  )
}
