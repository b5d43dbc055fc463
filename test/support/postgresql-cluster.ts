/**
 * A PostgreSQL cluster of the test run's own: made, started once, and gone afterwards however the run ends.
 * Hands its address and the name of a migrated template database to the test files.
 */
import { execFileSync, spawn } from 'node:child_process'
import { chownSync, existsSync, mkdtempSync, readdirSync, realpathSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { delimiter, dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import pg from 'pg'
import type { TestProject } from 'vitest/node'
import { migrate } from '../../lib/data/migrate'
import { readMigrationSet } from '../../lib/data/migration-files'

declare module 'vitest' {
  interface ProvidedContext {
    /** Address of the template database; its server holds those of the test files, too. */
    postgresqlTemplate: string
  }
}

const debianHome = '/usr/lib/postgresql'

/** The folder of PostgreSQL's programs, the newest version first; undefined where there is none. */
export const postgresqlPrograms = (): string | undefined => {
  const onPath = (process.env.PATH ?? '').split(delimiter).map((folder) => join(folder, 'initdb'))
  const versions = existsSync(debianHome) ? readdirSync(debianHome).sort((a, b) => Number(b) - Number(a)) : []
  const found = [...versions.map((version) => join(debianHome, version, 'bin/initdb')), ...onPath].find(
    (path) => existsSync(path),
  )
  return found === undefined ? undefined : dirname(realpathSync(found))
}

/** The server refuses to run as root: it runs as the account that the package made for it. */
const serverAccount = (): { readonly uid: number; readonly gid: number } | undefined => {
  if (process.getuid?.() !== 0) return undefined
  const idOf = (flag: string) => Number(execFileSync('id', [flag, 'postgres'], { encoding: 'utf8' }))
  return { uid: idOf('-u'), gid: idOf('-g') }
}

const freePort = (): Promise<number> =>
  new Promise((resolve, reject) => {
    const probe = createServer()
    probe.once('error', reject)
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address()
      probe.close(() =>
        typeof address === 'object' && address !== null
          ? resolve(address.port)
          : reject(new Error('no free port')),
      )
    })
  })

export interface Cluster {
  /** Address of a database of this name. */
  addressOf(database: string): string
  stop(): Promise<void>
}

/** @throws Error when PostgreSQL is not installed or does not start */
export const startCluster = async (): Promise<Cluster> => {
  const programs = postgresqlPrograms()
  if (programs === undefined) throw new Error('PostgreSQL is not installed: there is no initdb.')
  const account = serverAccount()
  const folder = mkdtempSync(join(tmpdir(), 'ledgerline-postgresql-'))
  if (account) chownSync(folder, account.uid, account.gid)
  const home = join(folder, 'data')
  const options = { ...account, cwd: folder, stdio: 'pipe', encoding: 'utf8' } as const
  execFileSync(
    join(programs, 'initdb'),
    ['-D', home, '-U', 'postgres', '-A', 'trust', '-E', 'UTF8', '--locale=C.UTF-8', '--no-sync'],
    options,
  )
  const port = await freePort()
  const settings = [
    `-p ${port}`,
    '-c listen_addresses=127.0.0.1',
    `-c unix_socket_directories=${folder}`,
    // The cluster is thrown away: it need not survive a power failure.
    '-c fsync=off -c full_page_writes=off -c max_connections=200 -c shared_buffers=64MB',
  ].join(' ')
  const control = join(programs, 'pg_ctl')
  execFileSync(control, ['-D', home, '-w', '-t', '60', '-l', join(folder, 'log'), '-o', settings, 'start'], {
    ...options,
    stdio: 'ignore',
  })
  // Ends the server when this process does, even by a signal: the pipe to it closes then.
  const warden = spawn('sh', ['-c', 'cat > /dev/null; "$0" -D "$1" -m immediate -w stop', control, home], {
    ...account,
    cwd: folder,
    stdio: ['pipe', 'ignore', 'ignore'],
    detached: true,
  })
  const ended = new Promise<void>((resolve) => warden.once('close', () => resolve()))
  return {
    addressOf: (database) => `postgresql://postgres@127.0.0.1:${port}/${database}`,
    stop: async () => {
      warden.stdin?.end()
      await ended
      rmSync(folder, { recursive: true, force: true })
    },
  }
}

const templateName = 'ledgerline_template'

/** Runs statements on the cluster, outside any transaction. */
export const onCluster = async (address: string, ...statements: readonly string[]): Promise<void> => {
  const client = new pg.Client({ connectionString: address })
  await client.connect()
  try {
    for (const statement of statements) await client.query(statement)
  } finally {
    await client.end()
  }
}

export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const cluster = await startCluster()
  try {
    await onCluster(cluster.addressOf('postgres'), `create database ${templateName}`)
    const databaseUrl = cluster.addressOf(templateName)
    const prisma = fileURLToPath(new URL('../../prisma', import.meta.url))
    await migrate({ engine: 'postgresql', databaseUrl }, readMigrationSet('postgresql', prisma))
    project.provide('postgresqlTemplate', databaseUrl)
  } catch (error) {
    await cluster.stop()
    throw error
  }
  return () => cluster.stop()
}
