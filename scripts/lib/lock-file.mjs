/**
 * A lock between processes: a file that only one can create, with the holder's process in it. A lock whose
 * holder is gone is taken over.
 */
import { closeSync, openSync, readFileSync, rmSync, statSync, writeSync } from 'node:fs'

/** When a process began, in the system's ticks: tells it from a later one with the same number. Linux only. */
const beginningOf = (pid) => {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    // The name before it may hold spaces and brackets: count from the last bracket.
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19] ?? ''
  } catch {
    return ''
  }
}

const identity = (pid) => `${pid} ${beginningOf(pid)}`

const isAlive = (holder) => {
  const pid = Number.parseInt(holder, 10)
  try {
    process.kill(pid, 0)
  } catch (error) {
    if (error.code !== 'EPERM') return false
  }
  return holder.trim() === identity(pid).trim()
}

const tryCreate = (path) => {
  let file
  try {
    file = openSync(path, 'wx', 0o600)
  } catch (error) {
    if (error.code === 'EEXIST') return false
    throw error
  }
  writeSync(file, identity(process.pid))
  closeSync(file)
  return true
}

const isOlder = (path, milliseconds) => {
  try {
    return Date.now() - statSync(path).mtimeMs > milliseconds
  } catch {
    return false
  }
}

const holderOf = (path) => {
  try {
    return readFileSync(path, 'utf8')
  } catch {
    return undefined
  }
}

/** Longer than it takes to write one line into a new file, or to look at one and remove it. */
const momentMilliseconds = 5_000

const isStale = (path) => {
  const holder = holderOf(path)
  if (holder === undefined) return false
  // An empty file is a lock that is just being written, unless its writer died right then.
  return holder === '' ? isOlder(path, momentMilliseconds) : !isAlive(holder)
}

/** Removes a dead holder's lock. One process at a time looks and removes, or a fresh lock could be taken for the old. */
const clearStale = (path) => {
  if (!isStale(path)) return
  const clearing = `${path}.clearing`
  if (!tryCreate(clearing)) {
    if (isOlder(clearing, momentMilliseconds)) rmSync(clearing, { force: true })
    return
  }
  try {
    if (isStale(path)) rmSync(path, { force: true })
  } finally {
    rmSync(clearing, { force: true })
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
