import { createHash, randomInt, timingSafeEqual } from 'node:crypto'
import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

const fileName = 'first-account-code'
/** Without letters and digits that are read for each other. */
const alphabet = '23456789ABCDEFGHJKMNPQRSTUVWXYZ'
/** 12 of 31 signs: 59 bits. */
const groups = 3
const groupLength = 4

const plain = (code: string): string => code.toUpperCase().replace(/[^A-Z0-9]/g, '')

const digest = (code: string): Buffer => createHash('sha256').update(plain(code)).digest()

/**
 * Makes the one-time code for the first account; any code made before stops counting. Only its hash is kept,
 * in the data folder.
 * @returns the code to print: `K7QP-2MXD-9RTA`
 */
export const issueFirstAccountCode = (dataDir: string): string => {
  const group = () => Array.from({ length: groupLength }, () => alphabet[randomInt(alphabet.length)]).join('')
  const code = Array.from({ length: groups }, group).join('-')
  mkdirSync(dataDir, { recursive: true, mode: 0o700 })
  writeFileSync(join(dataDir, fileName), digest(code).toString('hex'), { mode: 0o600 })
  return code
}

/** Whether this is the code last made. Dashes, spaces and small letters do not matter. */
export const isFirstAccountCode = (dataDir: string, typed: string): boolean => {
  let stored: string
  try {
    stored = readFileSync(join(dataDir, fileName), 'utf8').trim()
  } catch {
    return false
  }
  const kept = Buffer.from(stored, 'hex')
  const given = digest(typed)
  return kept.length === given.length && timingSafeEqual(kept, given)
}

/** The code has served. */
export const spendFirstAccountCode = (dataDir: string): void =>
  rmSync(join(dataDir, fileName), { force: true })
