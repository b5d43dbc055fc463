/** Programs that the tests need and npm does not bring: taken from Debian's packages when this account may. */
import { existsSync, readdirSync } from 'node:fs'
import { delimiter, join } from 'node:path'
import { run } from './child.mjs'

const onPath = (name) =>
  (process.env.PATH ?? '').split(delimiter).some((folder) => folder !== '' && existsSync(join(folder, name)))

const isRoot = () => process.getuid?.() === 0

const aptInstall = async (...packages) => {
  const env = { DEBIAN_FRONTEND: 'noninteractive' }
  const install = () =>
    run('apt-get', ['install', '-y', '--no-install-recommends', ...packages], {
      env,
      stdio: ['ignore', 'ignore', 'inherit'],
    })
  if ((await install()) === 0) return true
  await run('apt-get', ['update'], { env, stdio: ['ignore', 'ignore', 'inherit'] })
  return (await install()) === 0
}

/** Debian's Chromium, else the browser that the test tool downloads. */
export const provideChromium = async (root) => {
  if (existsSync('/usr/bin/chromium')) return true
  if (isRoot() && onPath('apt-get')) {
    process.stdout.write('Installing Chromium (apt-get): a minute or two the first time.\n')
    if (await aptInstall('chromium')) return true
  }
  process.stdout.write('Fetching the test tool’s Chromium.\n')
  return (
    (await run(process.execPath, [
      join(root, 'node_modules/@playwright/test/cli.js'),
      'install',
      'chromium',
    ])) === 0
  )
}

const hasPostgresql = () => {
  const home = '/usr/lib/postgresql'
  const versions = existsSync(home) ? readdirSync(home) : []
  return onPath('initdb') || versions.some((version) => existsSync(join(home, version, 'bin/initdb')))
}

/** PostgreSQL's programs; a cluster of the tests' own is made from them, and no server is left running. */
export const providePostgresql = async () => {
  if (hasPostgresql()) return true
  if (!isRoot() || !onPath('apt-get')) return false
  process.stdout.write('Installing PostgreSQL (apt-get): a minute the first time.\n')
  // Without this the package would make and start a cluster of its own.
  return (await aptInstall('postgresql-common')) && (await withoutCluster()) && hasPostgresql()
}

const withoutCluster = async () => {
  const { mkdirSync, writeFileSync } = await import('node:fs')
  mkdirSync('/etc/postgresql-common/createcluster.d', { recursive: true })
  writeFileSync('/etc/postgresql-common/createcluster.d/ledgerline.conf', 'create_main_cluster = false\n')
  return aptInstall('postgresql')
}
