import NextAuth from 'next-auth'
import type { NextRequest } from 'next/server'
import { getAuthOptions } from '@/lib/web/auth-options'

type Context = { params: Promise<{ nextauth: string[] }> }

// The options are made at the request and not at import: building the application needs no secret.
async function handle(request: NextRequest, context: Context): Promise<Response> {
  const answer: unknown = await NextAuth(request, context as never, getAuthOptions())
  if (answer instanceof Response) return answer
  throw new TypeError('Sign-in gave no response.')
}

export { handle as GET, handle as POST }
