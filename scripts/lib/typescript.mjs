/** Lets a command use the project's own TypeScript, once packages are installed. */
import { join } from 'node:path'
import { pathToFileURL } from 'node:url'

/**
 * Imports a module of the project, `@/` paths included.
 * @param {string} root
 * @param {string} path below root
 */
export const importTypeScript = async (root, path) => {
  const { tsImport } = await import('tsx/esm/api')
  const from = pathToFileURL(join(root, 'package.json')).href
  return tsImport(`./${path}`, { parentURL: from, tsconfig: join(root, 'tsconfig.json') })
}
