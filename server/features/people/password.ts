import { hash, verify } from '@node-rs/argon2'

/** argon2id with m = 46 MiB, t = 1, p = 1: OWASP ASVS 5.0 appendix C. */
const settings = { memoryCost: 47_104, timeCost: 1, parallelism: 1 }

export function hashPassword(password: string): Promise<string> {
  return hash(password, settings)
}

let decoy: Promise<string> | undefined

/** Compares with the kept hash; without one the same work is done and the answer is no, so that the time tells nothing. */
export async function passwordFits(kept: string | null | undefined, password: string): Promise<boolean> {
  decoy ??= hashPassword('no account has this password')
  const fits = await verify(kept ?? (await decoy), password)
  return fits && kept != null
}
