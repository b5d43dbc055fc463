import { hash, verify } from '@node-rs/argon2'

/** Argon2id with 19 MiB and two passes: OWASP Password Storage Cheat Sheet, minimum configuration. */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const

export const leastPasswordLength = 10
export const mostPasswordLength = 128

/** Hashes off the main thread. */
export const hashPassword = (password: string): Promise<string> => hash(password.normalize('NFC'), cost)

export const isPassword = ({
  hash: stored,
  password,
}: {
  hash: string
  password: string
}): Promise<boolean> => verify(stored, password.normalize('NFC'))
