import { fileURLToPath } from 'node:url'
import { expect, test } from '@playwright/test'
import { build } from 'esbuild'
import { evaluateMany } from '../support/live-page'

const root = fileURLToPath(new URL('../..', import.meta.url))

test('the browser finds what the server stores for 1,000 random specimens, to the last bit', async ({
  page,
}) => {
  const { outputFiles } = await build({
    entryPoints: [`${root}/test/support/live-page.ts`],
    bundle: true,
    write: false,
    format: 'iife',
    globalName: 'live',
    platform: 'browser',
    minify: true,
    alias: { '@': root.replace(/\/$/, '') },
  })
  await page.setContent('<title>live</title>')
  await page.addScriptTag({ content: outputFiles[0]?.text ?? '' })
  const inBrowser = await page.evaluate(() =>
    (
      window as unknown as { live: { evaluateMany(count: number, seed: number): string[] } }
    ).live.evaluateMany(1000, 2026),
  )
  const onServer = evaluateMany(1000, 2026)
  expect(inBrowser).toHaveLength(1000)
  expect(new Set(inBrowser).size).toBe(1000)
  expect(inBrowser.filter((one, index) => one !== onServer[index])).toEqual([])
})
