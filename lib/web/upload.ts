import { refuse } from '@/lib/rules/refusal'

/** The name of an uploaded file, percent-encoded in its header so that it may be of any script. */
export function getFileName(request: Request): string {
  try {
    return decodeURIComponent(request.headers.get('x-file-name') ?? '')
  } catch (cause) {
    throw Object.assign(refuse('invalid', 'The file’s name could not be read; please rename the file.'), {
      cause,
    })
  }
}

/** How long the sender says the body is; null where it does not say. */
export function getDeclaredBytes(request: Request): number | null {
  const declared = request.headers.get('content-length')
  // Digits alone.
  return declared !== null && /^\d{1,15}$/.test(declared) ? Number(declared) : null
}

/** A request's body piece by piece. */
export async function* readBody(request: Request): AsyncGenerator<Uint8Array> {
  if (request.body) yield* request.body
}
