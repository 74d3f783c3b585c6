import { randomBytes } from 'node:crypto'
import { hash, verify } from '@node-rs/argon2'
import { z } from 'zod'
import { refuse } from '@/lib/rules/refusal'

/** Argon2id, the default of the library; memory in KiB and passes: about a tenth of a second on a small server. */
const cost = { memoryCost: 32_768, timeCost: 3, parallelism: 1 }

export const newPassword = z
  .string()
  .min(12, 'Please take at least 12 characters.')
  .max(200, 'Please take at most 200 characters.')

export function hashPassword(password: string): Promise<string> {
  return hash(password.normalize('NFKC'), cost)
}

let nobodysHash: Promise<string> | undefined

/** True when the password is right. Where there is none to compare with, it takes as long and says no. */
export async function isPasswordRight(stored: string | null, password: string): Promise<boolean> {
  const against = stored ?? (await (nobodysHash ??= hashPassword(randomBytes(16).toString('hex'))))
  const right = await verify(against, password.normalize('NFKC'))
  return right && stored !== null
}

export function requireUnlikeEmail(password: string, email: string): void {
  const [name = ''] = email.split('@')
  const given = password.trim().toLowerCase()
  if (given === email.toLowerCase() || given === name.toLowerCase()) {
    throw refuse('invalid', 'Please take a password that is not your e-mail address.', {
      password: 'This is your e-mail address.',
    })
  }
}
