/** One hash over files and folders, to tell whether anything changed since a step was last done. */
import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs'
import { join, relative, sep } from 'node:path'

/** Every file under `path` (or the file itself), in an order that does not depend on the file system. */
export const filesUnder = (path, skip = () => false) => {
  if (!existsSync(path) || skip(path)) return []
  if (statSync(path).isFile()) return [path]
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesUnder(join(path, name), skip))
}

/**
 * SHA-256 over names and contents. Names count relative to `root`, so that a moved project keeps its hash.
 * @param {string} root
 * @param {string[]} paths files or folders below root; missing ones count as empty
 * @param {{ skip?: (path: string) => boolean, salt?: string }} [options]
 */
export const fingerprint = (root, paths, { skip, salt = '' } = {}) => {
  const hash = createHash('sha256').update(`${salt}\0`)
  for (const file of paths.flatMap((path) => filesUnder(join(root, path), skip))) {
    const content = readFileSync(file)
    hash.update(`${relative(root, file).split(sep).join('/')}\0${content.length}\0`).update(content)
  }
  return hash.digest('hex')
}
