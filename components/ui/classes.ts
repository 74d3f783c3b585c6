/** Joins class names; what is false, null or empty is left out. */
export function classes(...names: (string | false | null | undefined)[]): string {
  return names.filter(Boolean).join(' ')
}
