/**
 * A lock between processes: a file that only one can create, with the holder's process id in it. A lock whose
 * holder is gone is taken over.
 */
import { closeSync, openSync, readFileSync, renameSync, rmSync, writeSync } from 'node:fs'

const alive = (pid) => {
  try {
    process.kill(pid, 0)
    return true
  } catch (error) {
    return error.code === 'EPERM'
  }
}

const tryCreate = (path) => {
  try {
    const file = openSync(path, 'wx')
    writeSync(file, `${process.pid}\n`)
    closeSync(file)
    return true
  } catch (error) {
    if (error.code === 'EEXIST') return false
    throw error
  }
}

/** Moves a dead holder's lock aside. The rename succeeds for one process only. */
const clearStale = (path) => {
  let holder
  try {
    holder = Number.parseInt(readFileSync(path, 'utf8'), 10)
  } catch {
    return
  }
  // An empty file is a lock that is just being written.
  if (!Number.isInteger(holder) || alive(holder)) return
  const aside = `${path}.${process.pid}.stale`
  try {
    renameSync(path, aside)
    rmSync(aside, { force: true })
  } catch {
    // Another process was quicker.
  }
}

/**
 * Runs `work` while holding the lock at `path`, waiting for another process that holds it.
 * @throws Error with a sentence when the lock can't be had within `patience` milliseconds
 */
export const withLockFile = async (path, work, patience = 120_000) => {
  const until = Date.now() + patience
  while (!tryCreate(path)) {
    clearStale(path)
    if (Date.now() > until)
      throw new Error(`Another process has held ${path} for too long. If none is running, remove that file.`)
    await new Promise((done) => setTimeout(done, 50))
  }
  try {
    return await work()
  } finally {
    rmSync(path, { force: true })
  }
}
