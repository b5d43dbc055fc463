/** Packages as the lock file names them: installed when that file changed, and only then. */
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { CommandFailed, run } from './child.mjs'
import { fingerprint } from './fingerprint.mjs'
import { withLockFile } from './lock-file.mjs'

const stampName = 'node_modules/.ledgerline-stamp'

/** What the installed folder depends on: the lock, and what native parts are compiled for. */
const wanted = (root) =>
  fingerprint(root, ['package-lock.json'], {
    salt: `${process.platform} ${process.arch} ${process.versions.modules}`,
  })

const readJson = (path) => JSON.parse(readFileSync(path, 'utf8'))

/**
 * Whether the folder holds exactly what the lock asks for, by npm's own record of what it put there: then an
 * installation by hand is accepted. Packages the lock calls optional may be absent (other platforms').
 */
export const installedAsLocked = (root) => {
  const record = join(root, 'node_modules/.package-lock.json')
  if (!existsSync(record)) return false
  const there = readJson(record).packages ?? {}
  const asked = readJson(join(root, 'package-lock.json')).packages ?? {}
  return Object.entries(asked).every(([name, entry]) => {
    if (name === '') return true
    const found = there[name]
    if (found === undefined) return entry.optional === true
    return found.version === entry.version && found.integrity === entry.integrity
  })
}

/** npm as it was started, or as the path finds it. */
const npm = () =>
  process.env.npm_execpath?.endsWith('.js')
    ? [process.execPath, process.env.npm_execpath]
    : [process.platform === 'win32' ? 'npm.cmd' : 'npm']

/**
 * Installs if needed. Two commands started at once install once; the other waits.
 * @returns {Promise<'installed' | 'there'>}
 */
export const installPackages = async (root) => {
  const stamp = join(root, stampName)
  const hash = wanted(root)
  const fresh = () => existsSync(stamp) && readFileSync(stamp, 'utf8') === hash
  if (fresh()) return 'there'
  mkdirSync(join(root, 'build'), { recursive: true })
  return withLockFile(
    join(root, 'build/install.lock'),
    async () => {
      if (fresh()) return 'there'
      if (existsSync(stamp) || !installedAsLocked(root)) {
        process.stdout.write('Installing packages (npm ci): a minute or two the first time.\n')
        const [program, ...before] = npm()
        const args = [...before, 'ci', '--include=dev', '--no-audit', '--no-fund']
        const code = await run(program, args, { cwd: root })
        if (code !== 0)
          throw new CommandFailed(
            'The packages could not be installed; what npm said stands above. It needs a package registry, and for ' +
              'the SQLite engine either a network (for its ready-made binary) or a C++ toolchain (make, g++, python3).',
          )
      }
      writeFileSync(stamp, hash)
      return 'installed'
    },
    900_000,
  )
}
