import { z } from 'zod'
import { refuse } from '@/lib/rules/refusal'

const maxJsonBytes = 1024 * 1024

/** The value as the schema has it, or a refusal that names each field and what is wrong with it. */
export function parse<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const result = schema.safeParse(value)
  if (result.success) return result.data
  const fields: Record<string, string> = {}
  for (const issue of result.error.issues) fields[issue.path.map(String).join('.')] ??= issue.message
  const only = result.error.issues.length === 1 ? result.error.issues[0] : undefined
  throw refuse('invalid', only ? sayOne(only) : 'Please check the marked fields.', fields)
}

function sayOne(issue: { path: PropertyKey[]; message: string }): string {
  return issue.path.length === 0 ? issue.message : `${issue.path.map(String).join('.')}: ${issue.message}`
}

/** Reads a JSON body of at most 1 MB; an empty body reads as {}. */
export async function readJson(request: Request): Promise<unknown> {
  const chunks: Uint8Array[] = []
  let bytes = 0
  for await (const chunk of request.body ?? []) {
    bytes += chunk.byteLength
    if (bytes > maxJsonBytes) throw refuse('too-large', 'The request is larger than 1 MB.')
    chunks.push(chunk)
  }
  const text = Buffer.concat(chunks).toString('utf8')
  if (text.trim() === '') return {}
  try {
    return JSON.parse(text)
  } catch (cause) {
    throw Object.assign(refuse('invalid', 'The request is not valid JSON.'), { cause })
  }
}

/** A JSON body that is an object. */
export async function readObject(request: Request): Promise<Record<string, unknown>> {
  const body = await readJson(request)
  if (typeof body !== 'object' || body === null || Array.isArray(body)) {
    throw refuse('invalid', 'The request is not a JSON object.')
  }
  return { ...body }
}

/** A JSON body by the command's schema; what the address says (`fixed`) goes before what the body says. */
export async function readInput<S extends z.ZodType>(
  request: Request,
  schema: S,
  fixed: Record<string, string> = {},
): Promise<z.output<S>> {
  return parse(schema, { ...(await readObject(request)), ...fixed })
}

const roundQuery = z.object({ round: z.coerce.number().int().min(1).optional() })

/** The round that the address asks for; undefined for the current one. */
export function getRound(request: Request): number | undefined {
  return parse(roundQuery, readQuery(request)).round
}

/** The query string as an object; a name that is given more than once becomes a list. */
export function readQuery(request: Request): Record<string, string | string[]> {
  return toObject(new URL(request.url).searchParams)
}

export function readForm(form: FormData): Record<string, FormDataEntryValue | FormDataEntryValue[]> {
  return toObject(form)
}

function toObject<T>(given: { entries: () => Iterable<[string, T]> }): Record<string, T | T[]> {
  const lists = new Map<string, T[]>()
  for (const [name, value] of given.entries()) {
    // Next.js's own fields of a form, such as $ACTION_ID_….
    if (name.startsWith('$ACTION')) continue
    lists.set(name, [...(lists.get(name) ?? []), value])
  }
  return Object.fromEntries([...lists].map(([name, [first, ...more]]) => [name, one(first as T, more)]))
}

function one<T>(first: T, more: T[]): T | T[] {
  return more.length === 0 ? first : [first, ...more]
}
