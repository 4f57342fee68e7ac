import { describe, expect, it } from 'vitest'
import { presetNames, presetRig, shotOf } from '@/tests/support/drawing/engines'
import { colourAt, count, drawn, inkAt, partAt } from '@/tests/support/drawing/picture'
import { slate, vellum } from '@/tests/support/drawing/small-rig'

describe.each(presetNames)('paint(raster, frame): %s', (name) => {
  const rig = presetRig(name)
  const size = { width: 480, height: 270, scale: 0.5 }

  it.each([
    ['vellum', vellum],
    ['slate', slate],
  ] as const)('fills with the two tones of %s and inks with its ink, and nothing else', (_, theme) => {
    const raster = drawn(rig, shotOf(rig), { ...size, theme })
    const fills = new Set([theme.paper, theme.part, theme.metal])
    expect(count(raster, (x, y) => inkAt(raster, x, y) === 0 && !fills.has(colourAt(raster, x, y)))).toBe(0)
    const covered = count(raster, (x, y) => partAt(raster, x, y) >= 0)
    expect(covered).toBeGreaterThan(0.05 * 480 * 270)
    let ink = 0
    for (let y = 0; y < 270; y++) for (let x = 0; x < 480; x++) ink += inkAt(raster, x, y) / 255
    expect(ink / covered).toBeGreaterThan(0.03)
    expect(ink / covered).toBeLessThan(0.4)
  })

  it('shows no paper through the engine: its closed solids leave no pin holes', () => {
    const raster = drawn(rig, shotOf(rig), size)
    const lone = count(raster, (x, y) => {
      if (x < 1 || y < 1 || x > 478 || y > 268 || partAt(raster, x, y) >= 0) return false
      return (
        partAt(raster, x - 1, y) >= 0 &&
        partAt(raster, x + 1, y) >= 0 &&
        partAt(raster, x, y - 1) >= 0 &&
        partAt(raster, x, y + 1) >= 0
      )
    })
    // A real gap between two parts may be one pixel wide.
    expect(lone).toBeLessThan(12)
  })
})
