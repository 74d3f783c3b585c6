import { NextResponse, type NextRequest } from 'next/server'

const isDevelopment = process.env.NODE_ENV === 'development'

/**
 * The content policy of a page: own scripts by nonce, own styles, own pictures. Reading a PDF in the browser
 * takes a worker and WebAssembly for its pictures' decoders; development takes eval for stack traces.
 */
function contentPolicy(nonce: string): string {
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic' 'wasm-unsafe-eval'${isDevelopment ? " 'unsafe-eval'" : ''}`,
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' blob: data:",
    "font-src 'self' blob: data:",
    `connect-src 'self' blob:${isDevelopment ? ' ws:' : ''}`,
    "worker-src 'self' blob:",
    "frame-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ')
}

/** Gives each page its own nonce; Next.js reads it from the request and puts it on its scripts. */
export function proxy(request: NextRequest): NextResponse {
  const policy = contentPolicy(btoa(crypto.randomUUID()))
  const headers = new Headers(request.headers)
  headers.set('Content-Security-Policy', policy)
  const response = NextResponse.next({ request: { headers } })
  response.headers.set('Content-Security-Policy', policy)
  return response
}

/** Pages only: a route handler's body must stream past, and files need no nonce. */
export const config = { matcher: ['/((?!api/|_next/|pdfjs/|.*\\.svg$).*)'] }
