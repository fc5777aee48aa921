import { hash, verify } from '@node-rs/argon2'

/** The package's default algorithm is argon2id; m 19456 KiB, t 2, p 1 (published: OWASP Password Storage Cheat Sheet). */
const options = { memoryCost: 19_456, timeCost: 2, parallelism: 1 }

export async function hashPassword(password: string): Promise<string> {
  return hash(password, options)
}

// A hash of nothing anyone can type: an unknown address costs the same time as a known one.
let nobody: Promise<string> | undefined

export async function passwordMatches(passwordHash: string | null | undefined, password: string): Promise<boolean> {
  nobody ??= hashPassword(`nobody-${Math.random()}`)
  const matches = await verify(passwordHash ?? (await nobody), password)
  return matches && Boolean(passwordHash)
}
