import { hash, verify } from '@node-rs/argon2'

/** Argon2id with 19 MiB, two passes, one lane: the library's own defaults, stated because hashes depend on them.
 *  Source: OWASP Password Storage Cheat Sheet, Argon2id. */
const cost = { algorithm: 2, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const

export const hashPassword = (password: string): Promise<string> => hash(password, cost)

/** Hash of a password that nobody has, so that an unknown e-mail takes as long as a wrong password. */
let decoy: Promise<string> | undefined

/** Whether a password is the one that was hashed; without a hash it is not, and that takes equally long. */
export async function isPassword(password: string, hashed: string | null): Promise<boolean> {
  decoy ??= hashPassword(crypto.randomUUID())
  const right = await verify(hashed ?? (await decoy), password)
  return hashed !== null && right
}
