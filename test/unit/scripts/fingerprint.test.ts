import { mkdirSync, mkdtempSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { fingerprint } from '@/scripts/lib/fingerprint.mjs'

let root = ''
beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'ledgerline-test-'))
  mkdirSync(join(root, 'app/lots'), { recursive: true })
  writeFileSync(join(root, 'app/page.tsx'), 'one')
  writeFileSync(join(root, 'app/lots/page.tsx'), 'two')
})
afterEach(() => rmSync(root, { recursive: true }))

const paths = ['app', 'missing.ts']

describe('fingerprint(root, paths)', () => {
  it('is the same for the same files, wherever they lie', () => {
    const before = fingerprint(root, paths)
    const moved = `${root}-moved`
    renameSync(root, moved)
    const after = fingerprint(moved, paths)
    renameSync(moved, root)
    expect(after).toBe(before)
  })

  it.each([
    ['a changed letter', () => writeFileSync(join(root, 'app/page.tsx'), 'onE')],
    ['a new file', () => writeFileSync(join(root, 'app/empty.ts'), '')],
    ['a file under another name', () => renameSync(join(root, 'app/page.tsx'), join(root, 'app/pane.tsx'))],
    ['a file that is gone', () => rmSync(join(root, 'app/lots/page.tsx'))],
    ['a file that was missing', () => writeFileSync(join(root, 'missing.ts'), '')],
  ])('differs after %s', (_, change) => {
    const before = fingerprint(root, paths)
    change()
    expect(fingerprint(root, paths)).not.toBe(before)
  })

  it('differs by salt, and leaves out what is skipped', () => {
    expect(fingerprint(root, paths, { salt: 'v20' })).not.toBe(fingerprint(root, paths, { salt: 'v22' }))
    const skip = (path: string) => path.includes('lots')
    const before = fingerprint(root, paths, { skip })
    writeFileSync(join(root, 'app/lots/page.tsx'), 'three')
    expect(fingerprint(root, paths, { skip })).toBe(before)
  })
})
