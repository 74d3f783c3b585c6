import { z } from 'zod'

/** A list that may come as one value, as a form or an address gives it when there is only one. */
export function listOf<T extends z.ZodType>(item: T) {
  return z.preprocess(
    (value) => (value === undefined || value === '' ? [] : Array.isArray(value) ? value : [value]),
    z.array(item),
  )
}
