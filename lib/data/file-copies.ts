/** Copies of database files that are on the disk, and equal, before anyone relies on them. */
import { createHash } from 'node:crypto'
import { closeSync, copyFileSync, fsyncSync, openSync, readSync, renameSync, rmSync } from 'node:fs'
import { dirname } from 'node:path'

const blockBytes = 1024 * 1024

/** SHA-256 of a file's bytes, in hexadecimal digits. */
export const hashOfFile = (path: string): string => {
  const hash = createHash('sha256')
  const file = openSync(path, 'r')
  try {
    const block = Buffer.alloc(blockBytes)
    for (;;) {
      const count = readSync(file, block)
      if (count === 0) return hash.digest('hex')
      hash.update(block.subarray(0, count))
    }
  } finally {
    closeSync(file)
  }
}

/** Has the system write a file, or a folder's list of names, to the disk. */
export const flushToDisk = (path: string): void => {
  const file = openSync(path, 'r')
  try {
    fsyncSync(file)
  } finally {
    closeSync(file)
  }
}

/**
 * Copies a file that nobody writes to. The copy appears under its name only when it is whole, equal and on the
 * disk.
 * @throws Error when the copy differs
 */
export const copyExactly = (from: string, to: string): void => {
  const part = `${to}.part`
  copyFileSync(from, part)
  flushToDisk(part)
  if (hashOfFile(from) !== hashOfFile(part)) {
    rmSync(part, { force: true })
    throw new Error(`The copy of ${from} differs from it.`)
  }
  renameSync(part, to)
  flushToDisk(dirname(to))
}

/** Removes the log beside a database file that no process has open. */
export const removeLogFiles = (path: string): void => {
  for (const ending of ['-wal', '-shm', '-journal']) rmSync(`${path}${ending}`, { force: true })
}

export const removeDatabaseFiles = (path: string): void => {
  removeLogFiles(path)
  rmSync(path, { force: true })
}
