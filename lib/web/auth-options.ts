import type { NextAuthOptions } from 'next-auth'
import Credentials from 'next-auth/providers/credentials'
import { getDb } from '@/db/current'
import { getActorOfSession } from '@/db/queries/actor'
import type { Db } from '@/db/client'
import { sessionMilliseconds } from '@/lib/desk/open-session'
import { revokeSession } from '@/lib/desk/revoke-session'
import { signInPerson, signInPersonInput, type Client } from '@/lib/desk/sign-in-person'
import { isRefusal } from '@/lib/rules/refusal'
import { getSettings, type Settings } from '@/lib/settings'
import { log } from '@/lib/log'
import { logUnknown } from './problem'

/* eslint-disable @typescript-eslint/consistent-type-definitions -- declaration merging works with an interface alone */
declare module 'next-auth' {
  interface Session {
    sessionId?: string
  }
  interface User {
    sessionId?: string
  }
}
declare module 'next-auth/jwt' {
  interface JWT {
    sessionId?: string
  }
}
/* eslint-enable @typescript-eslint/consistent-type-definitions */

/**
 * Sign-in by e-mail and password. The cookie is an encrypted token that carries the id of a row in `sessions`
 * and nothing else; whether that row still counts is asked at every request (`getActor`).
 */
export function getAuthOptions(db: Db = getDb(), settings: Settings = getSettings()): NextAuthOptions {
  if (!settings.secret) throw new Error('ASSIZE_SECRET is not set; sign-in needs it to seal its cookie.')
  // The library takes its address from the environment alone.
  process.env.NEXTAUTH_URL = settings.url
  return {
    secret: settings.secret,
    useSecureCookies: settings.url.startsWith('https://'),
    session: { strategy: 'jwt', maxAge: sessionMilliseconds / 1000 },
    pages: { signIn: '/sign-in', error: '/sign-in', signOut: '/sign-in' },
    providers: [
      Credentials({
        name: 'e-mail and password',
        credentials: { email: { type: 'email' }, password: { type: 'password' } },
        authorize: (given, request) => authorize(db, given, getClient(request.headers)),
      }),
    ],
    callbacks: {
      jwt: ({ token, user }) => ({ sessionId: user ? user.sessionId : token.sessionId }),
      session: ({ session, token }) => ({ expires: session.expires, sessionId: token.sessionId }),
    },
    events: {
      signOut: ({ token }) => {
        const actor = token.sessionId ? getActorOfSession(db, token.sessionId, Date.now()) : null
        if (actor?.sessionId) revokeSession(db, actor, { sessionId: actor.sessionId }, Date.now())
      },
    },
    logger: {
      error: (code) => log.error({ code }, 'sign-in'),
      warn: (code) => log.warn({ code }, 'sign-in'),
      debug: () => undefined,
    },
  }
}

async function authorize(db: Db, given: unknown, client: Client) {
  const input = signInPersonInput.safeParse(given)
  if (!input.success) throw new Error('Please give your e-mail address and your password.')
  try {
    const { personId, sessionId } = await signInPerson(db, client, input.data, Date.now())
    return { id: personId, sessionId }
  } catch (error) {
    if (isRefusal(error)) throw error
    // The message of what is thrown here is shown to the person.
    throw new Error(`Signing in failed; please report the number ${logUnknown(error)}.`, { cause: error })
  }
}

/** The address that the nearest proxy (or the server itself) wrote last. */
export function getClient(headers: Record<string, unknown> = {}): Client {
  const forwarded = typeof headers['x-forwarded-for'] === 'string' ? headers['x-forwarded-for'] : ''
  const agent = typeof headers['user-agent'] === 'string' ? headers['user-agent'] : ''
  return { address: forwarded.split(',').at(-1)?.trim() ?? '', agent }
}
