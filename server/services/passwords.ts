import { hash, verify } from '@node-rs/argon2'

/** Argon2id as OWASP asks at least: 19 MiB, two passes, one lane. The library's default algorithm is argon2id. */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 }

/** @returns the encoded hash with its salt and cost */
export const hashPassword = (password: string): Promise<string> => hash(password, cost)

let decoy: Promise<string> | undefined

/** Whether a password is right. Without a hash it works as long as with one, so that time does not tell who has an account. */
export async function verifyPassword(passwordHash: string | null, password: string): Promise<boolean> {
  decoy ??= hashPassword('nobody has this password')
  const right = await verify(passwordHash ?? (await decoy), password)
  return passwordHash !== null && right
}
