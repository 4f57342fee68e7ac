import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { build } from 'vite'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'

const root = fileURLToPath(new URL('../../../', import.meta.url))

describe('paint(raster, frame): memory, over 1,000 frames of a running V8', () => {
  const folder = mkdtempSync(join(tmpdir(), 'allocation-'))
  let figures: { madeAFrame: number; kept: number; keptInBuffers: number; sameBuffers: boolean }

  // Bundled as a browser gets it: the test runner's own module wrappers box numbers at every import.
  beforeAll(async () => {
    await build({
      root,
      configFile: false,
      logLevel: 'silent',
      resolve: { alias: [{ find: /^@\//, replacement: root }] },
      build: {
        ssr: 'tests/support/drawing/allocation-probe.ts',
        outDir: folder,
        minify: false,
        rollupOptions: { output: { entryFileNames: 'probe.mjs' } },
      },
      ssr: { noExternal: true },
    })
    figures = JSON.parse(
      execFileSync(process.execPath, ['--expose-gc', join(folder, 'probe.mjs')], { encoding: 'utf8' }),
    )
  })
  afterAll(() => rmSync(folder, { recursive: true, force: true }))

  it('makes no more than a handful of numbers a frame', () => {
    expect(figures.madeAFrame).toBeLessThan(4096)
  })

  it('keeps nothing', () => {
    expect(figures.kept).toBeLessThan(100_000)
    expect(figures.keptInBuffers).toBeLessThanOrEqual(0)
    expect(figures.sameBuffers).toBe(true)
  })
})
