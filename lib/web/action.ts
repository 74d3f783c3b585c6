import { unstable_rethrow } from 'next/navigation'
import type { z } from 'zod'
import type { Db } from '@/db/client'
import { getDb } from '@/db/current'
import type { Actor } from '@/lib/rules/roles'
import { getActor } from './actor'
import { parse, readForm } from './parse'
import { toProblem } from './problem'

export type ActionResult<T> =
  { ok: true; value: T } | { ok: false; message: string; fields: Record<string, string> }

/**
 * Makes a server action out of a command: reads a form or an object by the command's schema, asks who acts and
 * turns refusals into a message and field errors. Next.js itself refuses actions that come from another site.
 */
export function action<S extends z.ZodType, T>(
  schema: S,
  command: (db: Db, actor: Actor, input: z.output<S>, now: number) => T | Promise<T>,
) {
  return (given: FormData | z.input<S>): Promise<ActionResult<T>> =>
    answer(async () => {
      const actor = await getActor()
      if (!actor) return signedOut
      const input = parse(schema, given instanceof FormData ? readForm(given) : given)
      return { ok: true, value: await command(getDb(), actor, input, Date.now()) }
    })
}

/** The same for whoever is not signed in: an invitation, a forgotten password. */
export function publicAction<S extends z.ZodType, T>(
  schema: S,
  command: (db: Db, input: z.output<S>, now: number) => T | Promise<T>,
) {
  return (given: FormData | z.input<S>): Promise<ActionResult<T>> =>
    answer(async () => {
      const input = parse(schema, given instanceof FormData ? readForm(given) : given)
      return { ok: true, value: await command(getDb(), input, Date.now()) }
    })
}

const signedOut = { ok: false as const, message: 'Please sign in again.', fields: {} }

/** Runs the work and turns what it throws into an answer; Next.js's own signals (redirect) pass. */
export async function answer<T>(work: () => Promise<ActionResult<T>>): Promise<ActionResult<T>> {
  try {
    return await work()
  } catch (error) {
    unstable_rethrow(error)
    const { detail, fields } = toProblem(error)
    return { ok: false, message: detail, fields }
  }
}
