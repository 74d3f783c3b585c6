import { join } from 'node:path'

/** Where a stored file lies: by its content's hash, so that a name never becomes a path. */
export function getStoredPath(uploads: string, sha256: string): string {
  // A SHA-256 in 64 hexadecimal digits.
  if (!/^[0-9a-f]{64}$/.test(sha256)) throw new RangeError('not a SHA-256')
  return join(/* turbopackIgnore: true */ uploads, sha256.slice(0, 2), sha256.slice(2))
}

export function getTemporaryFolder(uploads: string): string {
  return join(/* turbopackIgnore: true */ uploads, '.tmp')
}
