/**
 * `node scripts/screenshots.mjs`: makes the pictures of the README anew, from the demo works on the built app, into
 * public/pictures. Takes about four minutes; needs Chromium (`npm test` installs it).
 */
import { existsSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { requireNode } from './lib/node-version.mjs'

requireNode()

const root = dirname(dirname(fileURLToPath(import.meta.url)))
const { setUp } = await import('./setup.mjs')
const { fail } = await import('./lib/child.mjs')
const { spawn } = await import('node:child_process')

/** What is seen, by whom, and what is done before the picture is taken. */
const pictures = [
  { name: 'today', path: '/today', username: 'orrin' },
  { name: 'bench', path: '/bench/LC-060', username: 'aldous', act: measure },
  { name: 'lot', path: '/lots/LC-059', username: 'orrin' },
  { name: 'release', path: '/lots/LC-059/release', username: 'orrin' },
  { name: 'drift', path: '/drift?product=LARCH-254&lot=LA-139', username: 'orrin', wait: '.staff-plot' },
  { name: 'machine', path: '/drift?machine=BW-1', username: 'orrin', wait: '.staff-plot' },
  { name: 'lots', path: '/lots', username: 'orrin' },
  { name: 'import', path: '/lots/import', username: 'orrin', act: sendFile },
  { name: 'datasheet', path: '/datasheets/new?productCode=LARCH-254', username: 'pell' },
  {
    name: 'drift-dark',
    path: '/drift?product=LARCH-279',
    username: 'orrin',
    wait: '.staff-plot',
    dark: true,
  },
]

/** A file with a foreign header and a wrong number, as its preview shows it. */
async function sendFile(page) {
  const rows = [
    'lot;product;made_at;machine;specimen;D1A [mm];d1b_mm;cut_length_mm;cut_mass_mg;frequency_hz;colour',
    'LA-901;Larch 254;2026-11-27T07:10;DM-1;1;0,2540;0,2541;500,0;198,92;330,54;bright',
    'LA-901;Larch 254;2026-11-27T07:10;DM-1;2;0,2542;0,2541;500,0;199,11;330,41;bright',
    'LA-901;Larch 254;2026-11-27T07:10;DM-1;3;thick;0,2540;500,0;198,97;330,49;dull',
  ]
  await page.locator('input[type=file]').setInputFiles({
    name: 'november.csv',
    mimeType: 'text/csv',
    buffer: Buffer.from(rows.join('\r\n')),
  })
  await page.waitForURL(/\/lots\/import\/\d+/)
}

async function measure(page) {
  for (const typed of ['.2795', '.2791', '.2794', '.2789', '.2792', '.2790', '.2796', '.2793'])
    for (const key of [...typed, 'Enter']) await page.keyboard.press(key)
}

const serve = (dataDir) =>
  new Promise((resolve, reject) => {
    const child = spawn(process.execPath, ['scripts/start.mjs', '--demo'], {
      cwd: root,
      stdio: ['ignore', 'pipe', 'inherit'],
      env: { ...process.env, PORT: '0', DATA_DIR: dataDir, DATABASE_URL: '' },
    })
    let output = ''
    child.stdout.on('data', (part) => {
      output += part
      process.stdout.write(part)
      const address = /serves (http\S+)/.exec(output)?.[1]
      if (address) resolve({ address, child })
    })
    child.once('exit', () => reject(new Error('the server ended before it served')))
  })

const folder = join(root, 'public/pictures')
const dataDir = mkdtempSync(join(tmpdir(), 'ledgerline-pictures-'))
let server
try {
  await setUp()
  const { chromium } = await import('@playwright/test')
  mkdirSync(folder, { recursive: true })
  server = await serve(dataDir)
  const debian = '/usr/bin/chromium'
  const browser = await chromium.launch({
    ...(existsSync(debian) ? { executablePath: debian } : {}),
    chromiumSandbox: process.getuid?.() !== 0,
  })
  for (const { act, dark, name, path, username, wait } of pictures) {
    const context = await browser.newContext({
      baseURL: server.address,
      colorScheme: dark ? 'dark' : 'light',
      viewport: { width: 1440, height: 900 },
      locale: 'en-GB',
    })
    const page = await context.newPage()
    await page.goto('/sign-in')
    await page.getByLabel('Sign-in name').fill(username)
    await page.getByLabel('Password').fill(`tarnbeck-${username}`)
    await page.getByRole('button', { name: 'Sign in' }).click()
    await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'))
    await page.goto(path, { waitUntil: 'networkidle' })
    if (wait) await page.locator(wait).waitFor()
    await act?.(page)
    await page.screenshot({ path: join(folder, `${name}.png`), animations: 'disabled' })
    process.stdout.write(`${name}.png\n`)
    await context.close()
  }
  await browser.close()
} catch (error) {
  server?.child.kill()
  fail(error)
} finally {
  server?.child.removeAllListeners('exit')
  server?.child.kill('SIGTERM')
  rmSync(dataDir, { recursive: true, force: true })
}
