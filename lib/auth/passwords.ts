import { hash, verify, type Options } from '@node-rs/argon2'
import { newToken } from './tokens'

// Argon2id (the library's default algorithm) with 19 MiB and two passes
const cost: Options = { memoryCost: 19_456, timeCost: 2, parallelism: 1 }

export const hashPassword = (password: string) => hash(password, cost)

let nobodys: Promise<string> | undefined

/** Takes as long for an address that nobody has as for one that somebody has. */
export async function verifyPassword(passwordHash: string | undefined, password: string): Promise<boolean> {
  nobodys ??= hashPassword(newToken())
  const matches = await verify(passwordHash ?? (await nobodys), password)
  return passwordHash !== undefined && matches
}
