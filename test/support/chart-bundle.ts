import { readFileSync } from 'node:fs'
import { build } from 'esbuild'

/** The chart page as one document: no server, no network, the works' own tokens and chart styles. */
export async function chartPage(): Promise<string> {
  const { outputFiles } = await build({
    entryPoints: ['test/support/chart-page.tsx'],
    bundle: true,
    write: false,
    format: 'iife',
    jsx: 'automatic',
    define: { 'process.env.NODE_ENV': '"production"' },
    logLevel: 'silent',
  })
  const styles = ['app/tokens.css', 'app/_ui/charts/charts.css']
    .map((file) => readFileSync(file, 'utf8'))
    .join('\n')
  const script = outputFiles[0]?.text.replaceAll('</script', '<\\/script') ?? ''
  return `<!doctype html><html lang="en"><title>Staff chart</title><style>body{margin:16px;background:var(--paper)}svg text{fill:var(--ink);font:400 11px var(--sans)}${styles}</style><main><div id="chart"></div><div id="file"></div></main><script>${script}</script></html>`
}
