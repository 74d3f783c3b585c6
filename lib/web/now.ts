import { cache } from 'react'

/** The moment of the request, milliseconds UTC; the same wherever its page asks. */
export const getNow = cache((): number => Date.now())
