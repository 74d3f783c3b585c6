'use client'

import { signOut } from 'next-auth/react'

export function SignOut() {
  return (
    <button
      type="button"
      className="text-tide hover:underline"
      onClick={() => void signOut({ callbackUrl: '/sign-in' })}
    >
      Sign out
    </button>
  )
}
