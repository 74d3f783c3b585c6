import type { Db } from '@/db/client'
import { getDb } from '@/db/current'
import { refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { getSettings, type Settings } from '@/lib/settings'
import { getActor } from './actor'
import { answerProblem, makeProblem, toProblem } from './problem'

/** What a handler is given; a test gives its own. */
export type Surroundings = { db: Db; settings: Settings; actor: Actor | null; now: number }

export type RouteCall<P> = {
  request: Request
  params: P
  actor: Actor
  db: Db
  settings: Settings
  now: number
}

type Answer = Response | object | undefined | null

/**
 * Makes a route handler: who asks, where a change comes from, and refusals as problem JSON. The handler
 * returns what is to be sent as JSON, a Response, undefined for "done", or null for "not found".
 */
export function route<P = Record<string, never>>(handle: (call: RouteCall<P>) => Answer | Promise<Answer>) {
  return async (
    request: Request,
    context: { params: Promise<P> },
    given?: Surroundings,
  ): Promise<Response> => {
    try {
      const { actor, ...here } = given ?? (await getSurroundings())
      if (!isOwnOrigin(request, here.settings)) {
        return answerProblem(makeProblem('refused', 403, 'This request came from another site.'))
      }
      if (!actor) return answerProblem(makeProblem('not-signed-in', 401, 'Please sign in again.'))
      return toResponse(await handle({ request, params: await context.params, actor, ...here }))
    } catch (error) {
      return answerProblem(toProblem(error))
    }
  }
}

async function getSurroundings(): Promise<Surroundings> {
  return { db: getDb(), settings: getSettings(), actor: await getActor(), now: Date.now() }
}

/** JSON that nobody stores; for an answer that may be null without being "not found". */
export function answerJson(value: unknown): Response {
  return Response.json(value, { headers: { 'Cache-Control': 'private, no-store' } })
}

function toResponse(answer: Answer): Response {
  if (answer === null) throw refuseUnknown()
  if (answer instanceof Response) return answer
  if (answer !== undefined) return answerJson(answer)
  return new Response(null, { status: 204, headers: { 'Cache-Control': 'private, no-store' } })
}

/** A browser names the site that a change comes from; a site other than this one may change nothing here. */
export function isOwnOrigin(request: Request, settings: Settings): boolean {
  if (request.method === 'GET' || request.method === 'HEAD') return true
  const origin = request.headers.get('origin')
  if (origin === null || !URL.canParse(origin)) return false
  const from = new URL(origin)
  return from.origin === new URL(settings.url).origin || from.host === request.headers.get('host')
}
