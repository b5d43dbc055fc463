import { randomBytes } from 'node:crypto'
import { chmodSync, mkdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

const fileName = 'session-secret'
const bytes = 32

/**
 * The key that signs session cookies, made at the first start. It lies in the data folder, readable by its
 * owner only, outside the database: a copy of the database or a back-up is no key to the works.
 * @throws Error when the file holds no such key
 */
export const sessionSecret = (dataDir: string): string => {
  mkdirSync(dataDir, { recursive: true, mode: 0o700 })
  const path = join(dataDir, fileName)
  try {
    writeFileSync(path, `${randomBytes(bytes).toString('base64url')}\n`, { flag: 'wx', mode: 0o600 })
  } catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'EEXIST')) throw error
  }
  if ((statSync(path).mode & 0o077) !== 0) chmodSync(path, 0o600)
  const secret = readFileSync(path, 'utf8').trim()
  if (Buffer.from(secret, 'base64url').length < bytes)
    throw new Error(
      `${path} holds no session secret. Move it away; a new one is made, and everyone signs in again.`,
    )
  return secret
}
