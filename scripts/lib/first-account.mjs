/** What a start says while nobody has an account yet. */
import { join } from 'node:path'
import { runNode } from './child.mjs'

/**
 * Prints where the first account is made and, when others can reach the server, the one-time code that is asked
 * for there. In a process of its own: the server keeps its modules to itself.
 */
export const announceFirstAccount = (root, settings, address) =>
  runNode([join(root, 'scripts/first-account.mjs'), address], 'The accounts could not be looked at.', {
    cwd: root,
    env: {
      DATA_DIR: settings.dataDir,
      DATABASE_URL: settings.databaseUrl,
      HOST: settings.host,
      TRUST_PROXY: settings.trustProxy ? 'yes' : 'no',
    },
  })
